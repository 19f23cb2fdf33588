import 'fake-indexeddb/auto';
import { TestBed, type ComponentFixture } from '@angular/core/testing';
import type { HttpTestingController, TestRequest } from '@angular/common/http/testing';
import { provideRouter } from '@angular/router';
import { asked, closeStores, coreForSpecs } from '../core/testing/core-for-specs';
import { coldMorning } from '../shared/practice/cold-morning';
import { allByRole, byRole, textOf } from '../shared/testing/by-role';
import { compiledLibraryProcedure, walkScenario } from '../shared/testing/walk-scenario';
import { RecordPage } from './record-page';

// The plot draws on a canvas, which jsdom has not.
jest.mock('uplot', () => ({ __esModule: true, default: jest.fn(() => ({ destroy: jest.fn() })) }));

const choices = {
  'where-it-comes-out': ['airAtValve'],
  look: ['carboned'],
  'clear-codes': ['codesCleared'],
  'other-half': ['otherHalfToCome'],
};

describe('the page of one record', () => {
  const run = walkScenario(compiledLibraryProcedure(), coldMorning, {
    kind: 'real',
    choices,
    before: (step, walk) => {
      if (step.id === 'clear-codes') walk.do({ do: 'note', text: 'customer waits' });
    },
  });
  const { header, events } = run;
  const last = events.at(-1)!;
  const detail = {
    header,
    events,
    branches: [],
    tablets: [{ id: 't-1', label: 'B2' }],
    countersigned: [{ branch: 'main', seq: last.seq, head: last.hash, at: last.at, signature: 'c2ln' }],
    receivedAt: '2026-12-02T10:00:00Z',
    procedure: {
      id: header.procedureId,
      version: 1,
      status: 'published',
      contentHash: header.contentHash,
      publishedAt: '2026-11-12T08:00:00Z',
      publishedBy: 'R. Adeyemi',
      document: run.procedure.document,
    },
    chain: { whole: true, events: events.length },
    discrepancies: [],
    refused: [],
  };
  let server: HttpTestingController;
  let fixture: ComponentFixture<RecordPage>;
  /** What the server has of the ramp. */
  let samples: Uint8Array | undefined;

  beforeEach(() => {
    samples = undefined;
    server = coreForSpecs([provideRouter([])]).server;
    fixture = TestBed.createComponent(RecordPage);
    fixture.componentRef.setInput('runId', header.runId);
  });
  afterEach(() => closeStores());

  const root = (): HTMLElement => fixture.nativeElement as HTMLElement;
  const isRecord = `/api/records/${header.runId}`;
  async function show(answer: object, status = 200): Promise<void> {
    fixture.autoDetectChanges();
    (await asked(server, 'GET', isRecord)).flush(answer, { status, statusText: String(status) });
    await settle();
  }

  /** The replay's chunk and its resource come after the answer: what is still under way says that it is busy. */
  async function settle(): Promise<void> {
    for (let turns = 0; turns < 500; turns += 1) {
      await new Promise((resolve) => setTimeout(resolve, 2));
      await fixture.whenStable();
      for (const request of server.match(({ url }) => url.startsWith('/api/attachments/'))) giveSamples(request);
      if (turns > 2 && root().querySelector('[aria-busy="true"]') === null) return;
    }
    throw new Error('The page stays busy');
  }
  function giveSamples(request: TestRequest): void {
    const body = new ArrayBuffer(samples?.length ?? 0);
    if (samples !== undefined) new Uint8Array(body).set(samples);
    const status = samples === undefined ? 404 : 200;
    request.flush(body, { status, statusText: String(status) });
  }

  it('says that the chain was computed here again and is whole', async () => {
    await show(detail);
    expect(textOf(root())).toContain(`Chain whole · ${events.length} events · countersigned`);
    expect(allByRole(root(), 'alert')).toEqual([]);
  });

  it('tells the finding, the car, the gear with its due dates and the version', async () => {
    await show(detail);
    const text = textOf(root());
    expect(text).toContain('Does not seal');
    expect(text).toContain('The manifold valve does not seal.');
    expect(text).toContain('1ZZBT4CK1MR118236');
    expect(text).toContain('tablet B2');
    expect(text).toContain('118,240 km');
    expect(text).toContain('G-12 due 10 Mar 2027');
    expect(text).toContain('published 12 Nov 2026 by R. Adeyemi');
  });

  it('tells each reading with its gauge, and the way on with its expression, inputs and reason', async () => {
    await show(detail);
    expect(allByRole(root(), 'img', '94.0 kPa, in band, band from 91.9 to 95.9 kPa').length).toBe(1);
    const text = textOf(root());
    expect(text).toContain('airAtValve');
    expect(text).toMatch(/Note\s*:\s*customer waits/);
    expect(text).toMatch(/Disturbed\s*:\s*dipstick/);
  });

  it('draws the ramp from its fetched bytes, with its marks, and tells it to those who do not see it', async () => {
    samples = run.bytes;
    await show(detail);
    const plot = byRole(root(), 'img', '421 samples over 105 s');
    expect(plot.getAttribute('aria-label')).toContain('noise begins at 11 s');
    expect(textOf(root())).toContain('No end of the noise was marked');
  });

  it('does not draw samples that are not those that the record names', async () => {
    samples = run.bytes.map((byte, index) => (index === 100 ? byte ^ 1 : byte));
    await show(detail);
    expect(textOf(root())).toContain('The samples are not those that the record names');
    expect(allByRole(root(), 'img', '421 samples')).toEqual([]);
  });

  it('says so when the tablet still has the samples', async () => {
    await show(detail);
    expect(textOf(root())).toContain('The samples are still on the tablet');
  });

  it('shows the write-up and what each part of it rests on', async () => {
    await show(detail);
    const rests = allByRole(root(), 'button', /^step /).map(textOf);
    expect(rests.length).toBeGreaterThan(3);
    expect(textOf(root())).toContain('For the customer');
  });

  it('lists all events, with hash and data of one on demand', async () => {
    await show(detail);
    byRole(root(), 'button', `Show all ${events.length} events`).click();
    await fixture.whenStable();
    const first = root().querySelector<HTMLDetailsElement>('bay-event-list details')!;
    expect(textOf(first)).not.toContain(events[0]!.hash);
    first.open = true;
    first.dispatchEvent(new Event('toggle'));
    await fixture.whenStable();
    expect(textOf(first)).toContain(events[0]!.hash);
  });

  it('warns loudly when an event was changed, and shows how far the replay came', async () => {
    const changed = events.map((event, index) => (index === 30 ? { ...event, at: event.at + 1 } : event));
    await show({ ...detail, events: changed });
    expect(textOf(root())).toContain('Chain broken at event 31');
    expect(allByRole(root(), 'alert').map(textOf).join(' ')).toContain('The replay ends before event 31');
    expect(textOf(root())).toContain('told up to event 30 only');
    expect(textOf(root())).not.toContain('No finding yet');
  });

  it('shows the runs of the same half side by side, with the reason for the second', async () => {
    const one = { runId: header.runId, visitId: header.visitId, procedureId: header.procedureId, half: 'cold' };
    const first = { ...one, procedureTitle: 'Seal', personName: 'I. Okafor', tabletLabel: 'B2', openedAt: 1 };
    const second = { ...first, runId: 'r-2', personName: 'R. Adeyemi', tabletLabel: 'Tablet B3', status: 'open' };
    const sameHalf = [{ ...first, status: 'closed', result: 'out', verdict: 'Does not seal' }, second];
    await show({ ...detail, sameHalf });
    const region = byRole(root(), 'region', '2 runs of the same cold half');
    expect(textOf(region)).toContain('without knowing of each other');
    expect(textOf(region)).toMatch(/Run 1, shown here\s*closed.*I\. Okafor\s*On\s*tablet B2\s*Finding\s*Does not seal/);
    expect(byRole(region, 'link', 'Run 2').getAttribute('href')).toBe('/records/r-2');
    expect(textOf(region)).toMatch(/Run 2\s*open.*R\. Adeyemi\s*On\s*Tablet B3\s*Finding\s*none yet$/);
  });

  it('does not say of runs that knew of each other that they did not', async () => {
    const one = { runId: header.runId, half: 'cold', personName: 'I. Okafor', openedAt: 1, status: 'closed' };
    const again = { because: 'Repaired since', besides: [header.runId] };
    await show({ ...detail, sameHalf: [one, { ...one, runId: 'r-2', again }] });
    const region = byRole(root(), 'region', '2 runs of the same cold half');
    expect(textOf(region)).not.toContain('without knowing');
    expect(textOf(region)).toMatch(/Begun again\s*Repaired since/);
  });

  it('refuses to replay on another procedure than the one that the run was opened on', async () => {
    const document = { ...run.procedure.document, title: 'Another one' };
    await show({ ...detail, procedure: { ...detail.procedure, document } });
    expect(textOf(root())).toContain('is not the one that the run was opened on');
    expect(byRole(root(), 'button', 'Show all').textContent).toContain(String(events.length));
  });

  it.each([
    [403, 'Not yours to see'],
    [404, 'Not found'],
    [503, 'No network'],
    [500, 'That did not work'],
  ])('has words for an answer of %s', async (status, words) => {
    await show({ title: 'Refused' }, status);
    expect(textOf(byRole(root(), 'alert'))).toContain(words);
  });
});
