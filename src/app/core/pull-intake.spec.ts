import 'fake-indexeddb/auto';
import { TestBed } from '@angular/core/testing';
import { OfflineStore } from './offline-store';
import { PullIntake } from './pull-intake';
import type { RunRow } from './stored-rows';
import { asked, closeStores, coreForSpecs, startOfDay } from './testing/core-for-specs';
import type { GearItem, PublishedProcedure, PullAnswer, Site, Visit, VisitRun } from './wire';

const answer = (change: Partial<PullAnswer>): PullAnswer => ({
  cursor: 'e1.1',
  procedures: [],
  sites: [],
  gear: [],
  people: [],
  visits: [],
  runs: [],
  notices: [],
  ...change,
});
const gear = (id: string) => ({ id, siteId: 's-1', label: id }) as GearItem;
const procedure = (id: string, version: number, calls: readonly string[] = []) => {
  const steps = calls.map((called) => ({ kind: 'call', procedure: called, version: 1 }));
  return { id, version, status: 'published', document: { steps } } as unknown as PublishedProcedure;
};
const visit = (id: string, changedAt: number, concern: string) => ({ id, changedAt, concern }) as Visit;

async function pulls(...answers: PullAnswer[]): Promise<OfflineStore> {
  const { server } = coreForSpecs();
  return pullsFrom(server, answers);
}

async function pullsFrom(server: ReturnType<typeof coreForSpecs>['server'], answers: PullAnswer[]) {
  const intake = TestBed.inject(PullIntake);
  let since = '';
  for (const each of answers) {
    const done = intake.pull();
    (await asked(server, 'GET', `/api/sync/pull${since}`)).flush(each);
    await done;
    since = `?since=${each.cursor}`;
  }
  return TestBed.inject(OfflineStore);
}

describe('PullIntake', () => {
  afterEach(() => closeStores());

  it('puts what is new beside what is here, and asks from there the next time', async () => {
    const store = await pulls(
      answer({ gear: [gear('g-1')], sites: [{ id: 's-1', name: 'Ossenholt', elevationM: 640 } as Site] }),
      answer({ cursor: 'e1.2', gear: [gear('g-2')] }),
    );
    expect((await store.gear.toArray()).map(({ id }) => id)).toEqual(['g-1', 'g-2']);
    expect((await store.settings.get('pull-cursor'))?.value).toBe('e1.2');
  });

  it('replaces what is here when the database there is another one', async () => {
    const store = await pulls(answer({ gear: [gear('g-1')] }), answer({ cursor: 'e2.1', gear: [gear('g-2')] }));
    expect((await store.gear.toArray()).map(({ id }) => id)).toEqual(['g-2']);
  });

  it('keeps the version that a run of this tablet was begun under', async () => {
    const { server } = coreForSpecs();
    const store = TestBed.inject(OfflineStore);
    await store.runs.put({ runId: 'r-1', header: { procedureId: 'seal', version: 1 } } as RunRow);
    await pullsFrom(server, [
      answer({ procedures: [procedure('seal', 1), procedure('drop', 1)] }),
      answer({ cursor: 'e2.1', procedures: [procedure('seal', 2)] }),
    ]);
    expect((await store.procedures.toArray()).map(({ id, version }) => `${id} ${version}`)).toEqual([
      'seal 1',
      'seal 2',
    ]);
  });

  it('keeps what that version calls too, at every depth', async () => {
    const { server } = coreForSpecs();
    const store = TestBed.inject(OfflineStore);
    await store.runs.put({ runId: 'r-1', header: { procedureId: 'seal', version: 1 } } as RunRow);
    await pullsFrom(server, [
      answer({ procedures: [procedure('seal', 1, ['plug']), procedure('plug', 1, ['vent']), procedure('vent', 1)] }),
      answer({ cursor: 'e2.1', procedures: [procedure('seal', 2)] }),
    ]);
    expect((await store.procedures.toArray()).map(({ id, version }) => `${id} ${version}`)).toEqual([
      'plug 1',
      'seal 1',
      'seal 2',
      'vent 1',
    ]);
  });

  it('knows the runs of all tablets as they were told last', async () => {
    const told = (runId: string, status: string) => ({ runId, visitId: 'v-1', status }) as VisitRun;
    const store = await pulls(
      answer({ runs: [told('r-1', 'open'), told('r-2', 'open')] }),
      answer({ cursor: 'e1.2', runs: [told('r-1', 'closed')] }),
    );
    expect((await store.toldRuns.toArray()).map(({ status }) => status)).toEqual(['closed', 'open']);
  });

  it('lets the later writer of a visit win', async () => {
    const { server } = coreForSpecs();
    const store = TestBed.inject(OfflineStore);
    await store.visits.bulkPut([visit('v-1', 20, 'here'), visit('v-2', 5, 'here')]);
    await pullsFrom(server, [answer({ visits: [visit('v-1', 10, 'there'), visit('v-2', 10, 'there')] })]);
    expect((await store.visits.toArray()).map(({ concern }) => concern)).toEqual(['here', 'there']);
  });

  it('offers again what another database once confirmed', async () => {
    const { server } = coreForSpecs();
    const store = TestBed.inject(OfflineStore);
    await store.runs.put({
      runId: 'r-1',
      seq: 9,
      visitId: 'v-1',
      header: { procedureId: 'seal', version: 1 },
    } as RunRow);
    await store.visits.put(visit('v-1', 1, 'x'));
    await store.blobs.put({ sha256: 'aa', runId: 'r-1', bytes: Uint8Array.of(1, 2, 3), mediaType: 'x' });
    const receipt = { acceptedThrough: 9, countersigned: undefined, epoch: 'e1' };
    await store.receipts.bulkPut([
      { ...receipt, runId: 'r-1', receivedAt: startOfDay },
      { ...receipt, runId: 'r-old', receivedAt: startOfDay - 31 * 24 * 3_600_000 },
    ]);
    await pullsFrom(server, [answer({})]);
    expect(await store.outbox.count()).toBe(0);
    expect((await store.receipts.toArray()).map(({ runId }) => runId)).toEqual(['r-1']);

    const restored = TestBed.inject(PullIntake).pull();
    (await asked(server, 'GET', '/api/sync/pull?since=e1.1')).flush(answer({ cursor: 'e2.1' }));
    await restored;
    expect(await store.outbox.toArray()).toMatchObject([
      { kind: 'events', runId: 'r-1', fromSeq: 1, toSeq: 9 },
      { kind: 'blob', sha256: 'aa', bytes: 3 },
      { kind: 'document', documentId: 'v-1' },
    ]);
  });
});
