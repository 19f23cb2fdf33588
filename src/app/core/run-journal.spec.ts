import 'fake-indexeddb/auto';
import { TestBed } from '@angular/core/testing';
import { verifyChain, type EventDraft, type RunHeader } from '../../../procedures/engine';
import { OfflineStore, PracticeStore } from './offline-store';
import { NobodyToSign, RunJournal, RunWrittenElsewhere } from './run-journal';
import { webLocks } from './run-locks';
import type { RunSummary } from './stored-rows';
import { closeStores, coreForSpecs, type HeldTime, registeredTablet, workOffline } from './testing/core-for-specs';

const header: RunHeader = {
  runId: '018f0000-0000-7000-8000-00000000aaaa',
  procedureId: 'crankcase-valve-seal',
  version: 1,
  contentHash: 'c'.repeat(64),
  visitId: 'v-1',
  siteId: 's-ossenholt',
  kind: 'real',
};
const claim = (step: string): EventDraft => ({ type: 'step-claimed', data: { step } });
const done = (step: string): EventDraft => ({ type: 'step-done', data: { step } });
const summary: RunSummary = {
  procedureTitle: 'Crankcase valve seal',
  status: 'open',
  car: 'Merrow Heron',
  repairOrder: '4417',
  codes: ['P0068'],
  concern: 'Whistle at idle',
  personName: 'I. Okafor',
  openedAt: 0,
  current: undefined,
  walked: [],
  disturbed: [],
  pause: undefined,
  verdict: undefined,
  half: undefined,
};

async function journalOf(person = true): Promise<{ journal: RunJournal; store: OfflineStore; time: HeldTime }> {
  const { server, time } = coreForSpecs();
  await registeredTablet();
  if (person) await workOffline(server);
  return { journal: TestBed.inject(RunJournal), store: TestBed.inject(OfflineStore), time };
}

describe('RunJournal', () => {
  afterEach(() => closeStores());

  it('seals drafts into a chain that verifies and stores them with their outbox row', async () => {
    const { journal, store, time } = await journalOf();
    await journal.open(header, [claim('start')]);
    time.pass(4200);
    const added = await journal.append(header.runId, [done('start'), claim('codes')]);

    const stored = await journal.load(header.runId);
    expect(verifyChain(header, stored!.events)).toEqual({ ok: true, head: added[1]!.hash });
    expect(stored!.events.map(({ seq, type, elapsed }) => [seq, type, elapsed])).toEqual([
      [1, 'step-claimed', 0],
      [2, 'step-done', 4200],
      [3, 'step-claimed', 4200],
    ]);
    expect(added[0]).toMatchObject({ actor: 'p-okafor', device: 't-1', build: '0.0.0+spec', at: time.now });
    expect(await store.outbox.toArray()).toEqual([
      { id: 1, kind: 'events', runId: header.runId, fromSeq: 1, toSeq: 1, since: time.now - 4200 },
      { id: 2, kind: 'events', runId: header.runId, fromSeq: 2, toSeq: 3, since: time.now },
    ]);
    expect(stored!.row).toMatchObject({ seq: 3, head: added[1]!.hash, openedBy: 'p-okafor' });
  });

  it('stores evidence and the summary in the same step', async () => {
    const { journal, store } = await journalOf();
    const seen: number[] = [];
    await journal.open(header, [claim('start')], {
      blobs: [{ sha256: 'ab', bytes: Uint8Array.of(1, 2, 3), mediaType: 'application/octet-stream' }],
      summarise: (events) => {
        seen.push(...events.map(({ seq }) => seq));
        return summary;
      },
    });
    expect(seen).toEqual([1]);
    expect(await journal.blob('ab')).toEqual(Uint8Array.of(1, 2, 3));
    expect((await store.outbox.toArray()).map(({ kind }) => kind)).toEqual(['events', 'blob']);
    expect((await store.runs.get(header.runId))!.summary).toEqual(summary);
  });

  it('stores nothing when the summary refuses the events', async () => {
    const { journal, store } = await journalOf();
    await journal.open(header, [claim('start')]);
    const refusing = journal.append(header.runId, [claim('nowhere')], {
      summarise: () => {
        throw new RangeError('nowhere is no step');
      },
    });
    await expect(refusing).rejects.toThrow('nowhere is no step');
    expect(await store.events.count()).toBe(1);
    await journal.append(header.runId, [done('start')]);
    expect((await journal.load(header.runId))!.events.map(({ seq }) => seq)).toEqual([1, 2]);
  });

  it('keeps appends that were asked for at once in order', async () => {
    const { journal } = await journalOf();
    await journal.open(header, [claim('start')]);
    await Promise.all(['a', 'b', 'c'].map((step) => journal.append(header.runId, [claim(step)])));
    const { events } = (await journal.load(header.runId))!;
    expect(events.map(({ data }) => (data as { step: string }).step)).toEqual(['start', 'a', 'b', 'c']);
    expect(verifyChain(header, events).ok).toBe(true);
  });

  it('refuses to write over what another window wrote, and stores nothing of the append', async () => {
    const { journal, store } = await journalOf();
    const [first] = await journal.open(header, [claim('start')]);
    await store.events.add({ ...first!, seq: 2 });
    await expect(journal.append(header.runId, [done('start')])).rejects.toBeInstanceOf(RunWrittenElsewhere);
    expect(await store.outbox.count()).toBe(1);
  });

  it('refuses a run that another window holds', async () => {
    const takenElsewhere = {
      request: (_n: string, _o: object, run: (lock: null) => unknown) => Promise.resolve(run(null)),
    };
    coreForSpecs([{ provide: webLocks, useValue: takenElsewhere }]);
    const other = TestBed.inject(RunJournal);
    expect(await other.hold(header.runId)).toBe(false);
    await expect(other.append(header.runId, [done('start')])).rejects.toBeInstanceOf(RunWrittenElsewhere);
  });

  it('keeps practice in its own database, with nothing to send', async () => {
    const { journal, store } = await journalOf();
    await journal.open({ ...header, kind: 'practice' }, [claim('start')]);
    await journal.append(header.runId, [done('start')]);
    expect(await TestBed.inject(PracticeStore).events.count()).toBe(2);
    expect([await store.events.count(), await store.runs.count(), await store.outbox.count()]).toEqual([0, 0, 0]);
  });

  it('lets elapsed time go on after a reload, and tells when the clock stands back', async () => {
    const { journal, time } = await journalOf();
    await journal.open(header, [claim('start')]);
    time.pass(60_000);
    await journal.append(header.runId, [done('start')]);
    journal.release(header.runId);
    time.monotonicMs = 5;
    time.now += 30_000;
    const [later] = await journal.append(header.runId, [claim('codes')]);
    expect(later!.elapsed).toBe(90_000);

    journal.release(header.runId);
    time.now -= 3_600_000;
    const stored = (await journal.load(header.runId))!;
    expect(stored.clockBackMs).toBe(3_600_000);
    const [last] = await journal.append(header.runId, [done('codes')]);
    expect(last!.elapsed).toBe(90_000);
  });

  it('writes nothing real without a person', async () => {
    const { journal, store } = await journalOf(false);
    await expect(journal.open(header, [claim('start')])).rejects.toBeInstanceOf(NobodyToSign);
    expect(await store.runs.count()).toBe(0);
  });

  it('does not know a run that was never opened here', async () => {
    const { journal } = await journalOf();
    expect(await journal.load('nothing')).toBeUndefined();
    await expect(journal.append('nothing', [claim('start')])).rejects.toBeInstanceOf(RangeError);
  });
});
