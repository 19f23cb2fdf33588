import 'fake-indexeddb/auto';
import { TestBed } from '@angular/core/testing';
import { provideRouter } from '@angular/router';
import { OfflineStore } from '../core/offline-store';
import type { RunRow, RunSummary } from '../core/stored-rows';
import { coreForSpecs, eventually, okafor, startOfDay, workOffline } from '../core/testing/core-for-specs';
import type { GearItem, PublishedProcedure, Role, Visit, VisitRun } from '../core/wire';
import { BenchPage } from './bench-page';

const summary: RunSummary = {
  procedureTitle: 'Crankcase valve seal',
  status: 'open',
  car: 'Merrow Heron, silver',
  repairOrder: '4417',
  codes: ['P0068'],
  concern: 'Whistle at idle',
  personName: 'I. Okafor',
  openedAt: startOfDay,
  current: { number: '11', title: 'Listen', action: 'Raise the pressure slowly and listen in the intake hose.' },
  walked: [{ label: '9' }, { label: '10', result: 'in' }],
  disturbed: ['dipstick', 'intake duct'],
  pause: { at: startOfDay - 6 * 60_000, reason: 'phone call' },
  verdict: undefined,
  half: 'cold',
};
const run = (runId: string, change: Partial<RunRow> = {}): RunRow =>
  ({
    runId,
    header: { visitId: 'v-1', procedureId: 'seal', half: 'cold', pairId: 'pair-1' },
    visitId: 'v-1',
    seq: 1,
    changedAt: startOfDay,
    openedBy: okafor.id,
    summary: { ...summary, status: 'set-aside' },
    ...change,
  }) as RunRow;
const visit = (id: string, repairOrder: string): Visit =>
  ({
    id,
    repairOrder,
    concern: 'Whistle at idle',
    codes: ['P0068'],
    car: { make: 'Merrow', model: 'Heron' },
    changedAt: startOfDay,
  }) as unknown as Visit;
const told = (runId: string, change: Partial<VisitRun> = {}): VisitRun => ({
  runId,
  visitId: 'v-1',
  procedureId: 'seal',
  procedureTitle: 'Seal',
  half: 'cold',
  personName: 'R. Adeyemi',
  tabletLabel: 'B2',
  openedAt: startOfDay,
  status: 'open',
  ...change,
});
const procedure = {
  id: 'seal',
  version: 1,
  status: 'published',
  publishedAt: '2026-12-01T07:00:00Z',
  document: { title: 'Seal', steps: [], appliesTo: { codes: ['P0068'], symptoms: [], engine: [] } },
} as unknown as PublishedProcedure;

async function bench(role: Role, fillStore: (store: OfflineStore) => Promise<unknown> = () => Promise.resolve()) {
  const { server } = coreForSpecs([provideRouter([])]);
  const store = TestBed.inject(OfflineStore);
  await fillStore(store);
  await workOffline(server, { ...okafor, role });
  const fixture = TestBed.createComponent(BenchPage);
  const root = fixture.nativeElement as HTMLElement;
  const textOf = (element: Element): string => element.textContent?.replace(/\s+/g, ' ').trim() ?? '';
  return {
    text: () => textOf(root),
    links: () => [...root.querySelectorAll('main a')].map((link) => [textOf(link), link.getAttribute('href')]),
    primaries: () => [...root.querySelectorAll('.primary')].map(textOf),
  };
}

describe('BenchPage', () => {
  it('shows the open run with its step, what is disturbed and why it was set aside', async () => {
    const { text, links, primaries } = await bench('technician', (store) => store.runs.put(run('r-1')));
    await eventually(() => expect(primaries()).toEqual(['Go back to step 11']));
    expect(text()).toContain('Step 11: raise the pressure slowly and listen in the intake hose.');
    expect(text()).toContain('2 disturbed: dipstick, intake duct');
    expect(text()).toContain('set aside 6 min ago: phone call');
    expect(links()).toContainEqual(['Go back to step 11', '/run/r-1']);
  });

  it('has exactly one loud thing: the own run first, that of a colleague below', async () => {
    const { text, primaries } = await bench('technician', (store) =>
      store.runs.bulkPut([
        run('r-1', { changedAt: startOfDay - 1000 }),
        run('r-2', {
          visitId: 'v-2',
          openedBy: 'p-other',
          summary: { ...summary, personName: 'R. Adeyemi', repairOrder: '4409' },
        }),
      ]),
    );
    await eventually(() => expect(text()).toContain('begun by R. Adeyemi'));
    expect(primaries()).toEqual(['Go back to step 11']);
    expect(text().indexOf('RO 4417')).toBeLessThan(text().indexOf('RO 4409'));
  });

  it('makes the visit that waits the loud thing when no run is open', async () => {
    const { text, links, primaries } = await bench('technician', async (store) => {
      await store.visits.bulkPut([visit('v-8', '4421')]);
      await store.procedures.put(procedure);
    });
    await eventually(() => expect(primaries()).toEqual(['Take it: 1 procedure fits']));
    expect(links()).toContainEqual(['Take it: 1 procedure fits', '/visit/v-8']);
    expect(links()).toContainEqual(['New visit', '/visit/new']);
    expect(text()).toContain('1 procedure, newest from yesterday');
  });

  it('asks for the other half of a pair once one is closed', async () => {
    const { text } = await bench('technician', async (store) => {
      await store.visits.put(visit('v-1', '4402'));
      await store.runs.put(run('r-1', { summary: { ...summary, status: 'closed', verdict: 'Does not seal' } }));
    });
    await eventually(() => expect(text()).toContain('warm half not recorded yet'));
    expect(text()).toContain('Merrow Heron, silver: Does not seal');
  });

  it('says that the half on the car was begun on another tablet too, and where to see it', async () => {
    const { text, links } = await bench('technician', async (store) => {
      await store.visits.put(visit('v-1', '4417'));
      await store.runs.put(run('r-1'));
      await store.toldRuns.put(told('r-2'));
    });
    await eventually(() => expect(text()).toContain('RO 4417, Merrow Heron, silver: the cold half was begun twice.'));
    expect(text()).toMatch(/R\. Adeyemi, today \d+:\d+, on tablet B2: still open/);
    expect(links()).toContainEqual(['See the visit', '/visit/v-1']);
  });

  it.each<[string, Partial<VisitRun>]>([
    ['it is the other half', { half: 'warm' }],
    ['it was begun knowingly, with a reason', { again: { because: 'To compare', besides: ['r-1'] } }],
  ])('does not say so when %s', async (_why, change) => {
    const { text, primaries } = await bench('technician', async (store) => {
      await store.runs.put(run('r-1'));
      await store.toldRuns.put(told('r-2', change));
    });
    await eventually(() => expect(primaries()).toEqual(['Go back to step 11']));
    expect(text()).not.toContain('was begun twice');
  });

  it('says who has a visit on another tablet, and takes one that nobody has first', async () => {
    const { text, primaries } = await bench('technician', async (store) => {
      await store.visits.bulkPut([visit('v-1', '4417'), visit('v-0', '4410')]);
      await store.procedures.put(procedure);
      await store.toldRuns.put(told('r-2'));
    });
    await eventually(() => expect(primaries()).toEqual(['Take it: 1 procedure fits']));
    expect(text()).toContain('R. Adeyemi has it on tablet B2: still open');
    expect(text().indexOf('RO 4410')).toBeLessThan(text().indexOf('RO 4417'));
  });

  it('says which instrument is overdue, of this site alone', async () => {
    const gear = (id: string, siteId: string, dueOn: string) =>
      ({ id, label: id, siteId, dueOn, inUse: true }) as GearItem;
    const { text } = await bench('technician', (store) =>
      store.gear.bulkPut([gear('G-3', okafor.siteId, '2026-11-20'), gear('G-9', 'elsewhere', '2026-01-01')]),
    );
    await eventually(() => expect(text()).toContain('1 instrument, G-3 is overdue'));
  });

  it('counts what waits to be sent', async () => {
    const { text } = await bench('technician', (store) =>
      store.outbox.bulkAdd([
        { kind: 'events', runId: 'r-1', fromSeq: 1, toSeq: 4, since: startOfDay - 7_200_000 },
        { kind: 'blob', runId: 'r-1', sha256: 'aa', bytes: 3, since: startOfDay },
      ]),
    );
    await eventually(() => expect(text()).toContain('1 run and 1 photo or series wait to be sent, oldest 2 h'));
  });

  it.each<[Role, string[], string | undefined]>([
    ['technician', ['/visit/new', '/visit/new', '/gear', '/practice'], 'New visit'],
    ['lead', ['/visit/new', '/records', '/method', '/gear', '/practice'], 'New visit'],
    ['apprentice', ['/practice', '/practice'], 'Go to the Practice bay'],
    ['manager', ['/records', '/records', '/gear'], 'Go to the Record room'],
  ])('gives a %s the rooms of the role', async (role, hrefs, loud) => {
    const { links, primaries } = await bench(role);
    await eventually(() => expect(primaries()).toEqual([loud]));
    expect([...new Set(links().map(([, href]) => href))]).toEqual([...new Set(hrefs)]);
  });
});
