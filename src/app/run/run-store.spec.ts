import 'fake-indexeddb/auto';
import { TestBed } from '@angular/core/testing';
import { openRun, type EventDraft, type RunHeader } from '../../../procedures/engine';
import { openingFacts } from '../../../procedures/engine/testing/run-walk';
import { contentHash } from '../../../procedures/engine';
import { OfflineStore } from '../core/offline-store';
import { RunJournal } from '../core/run-journal';
import type { Person } from '../core/wire';
import {
  closeStores,
  coreForSpecs,
  type HeldTime,
  registeredTablet,
  workOffline,
} from '../core/testing/core-for-specs';
import { RunStore } from './run-store';
import { tapGuardMs } from './tap-guard';
import { RampQueue } from './ramp-queue';
import { instruments, valveSeal, walkedTo } from './testing/run-for-specs';

const header: RunHeader = {
  runId: '018f0000-0000-7000-8000-00000000aaaa',
  procedureId: valveSeal.document.id,
  version: 4,
  contentHash: contentHash(valveSeal.document),
  visitId: 'v-1',
  siteId: 's-ossenholt',
  kind: 'real',
  half: 'cold',
};

async function openedRun(person?: Person): Promise<{ store: RunStore; time: HeldTime; journal: RunJournal }> {
  const { server, time } = coreForSpecs([RunStore]);
  await registeredTablet();
  await workOffline(server, person);
  await TestBed.inject(OfflineStore).procedures.put({
    id: header.procedureId,
    version: header.version,
    status: 'published',
    contentHash: header.contentHash,
    publishedAt: '2026-11-12T09:00:00Z',
    publishedBy: 'R. Adeyemi',
    document: valveSeal.document,
  });
  const journal = TestBed.inject(RunJournal);
  const opening = openRun(valveSeal, openingFacts);
  if (!opening.ok) throw new Error(opening.message);
  await journal.open(header, opening.drafts);
  journal.release(header.runId);
  return { store: TestBed.inject(RunStore), time, journal };
}

/** Loads the run, then does one command after the other, each after the guard time. */
async function loaded(): Promise<Awaited<ReturnType<typeof openedRun>>> {
  const run = await openedRun();
  await run.store.load(header.runId);
  run.time.pass(tapGuardMs);
  return run;
}

describe('RunStore', () => {
  afterEach(() => closeStores());

  it('opens a run that was just begun, without a resume card', async () => {
    const { store } = await loaded();
    expect(store.phase()).toBe('ready');
    expect(store.state()?.current?.id).toBe('start');
    expect(store.needsResume()).toBe(false);
  });

  it.each(['apprentice', 'manager'] as const)('keeps the %s out of a real run, and writes nothing', async (role) => {
    const person: Person = { id: 'p-other', name: 'other', displayName: 'T. Brandt', role, siteId: 's-ossenholt' };
    const { store, journal } = await openedRun(person);
    await store.load(header.runId);
    expect(store.phase()).toBe('not-allowed');
    expect(await store.act({ do: 'acknowledge-caution', caution: 0 })).toBe(false);
    expect((await journal.load(header.runId))?.events).toHaveLength(2);
  });

  it('says that a run is not on this tablet', async () => {
    const { store } = await openedRun();
    await store.load('018f0000-0000-7000-8000-00000000bbbb');
    expect(store.phase()).toBe('missing');
  });

  it('says which version of the procedure is missing', async () => {
    const { store } = await openedRun();
    await TestBed.inject(OfflineStore).procedures.clear();
    await store.load(header.runId);
    expect(store.phase()).toBe('no-procedure');
    expect(store.phaseDetail()).toBe('crankcase-valve-seal, version 4');
  });

  it('goes on only once the events of a command are stored', async () => {
    const { store, journal } = await loaded();
    expect(await store.act({ do: 'acknowledge-caution', caution: 0 })).toBe(true);
    expect(store.state()?.current?.acknowledged).toEqual([0]);
    const kept = await journal.load(header.runId);
    expect(kept?.events.at(-1)).toMatchObject({ type: 'caution-acknowledged', data: { caution: 0 } });
    expect(kept?.row.summary).toMatchObject({ status: 'open', current: { number: '1' } });
  });

  it('refuses a double tap, whatever it is about', async () => {
    const { store, time } = await loaded();
    await store.act({ do: 'acknowledge-caution', caution: 0 });
    time.pass(tapGuardMs - 1);
    expect(await store.act({ do: 'acknowledge-caution', caution: 1 })).toBe(false);
    expect(store.problem()).toBeUndefined();
    time.pass(1);
    expect(await store.act({ do: 'acknowledge-caution', caution: 1 })).toBe(true);
    expect(store.state()?.current?.acknowledged).toEqual([0, 1]);
  });

  it('refuses a second command while the first one is being written', async () => {
    const { store, time } = await loaded();
    const first = store.act({ do: 'acknowledge-caution', caution: 0 });
    expect(store.busy()).toBe('acknowledge-caution');
    time.pass(tapGuardMs);
    expect(await store.act({ do: 'acknowledge-caution', caution: 1 })).toBe(false);
    expect(await first).toBe(true);
    expect(store.isBusy()).toBe(false);
  });

  it('says in words why a command is refused, and writes nothing', async () => {
    const { store, journal } = await loaded();
    expect(await store.act({ do: 'confirm' })).toBe(false);
    expect(store.problem()).toMatchObject({ code: 'caution-first', message: 'Read the caution first and say so.' });
    expect((await journal.load(header.runId))?.events).toHaveLength(2);
  });

  it('asks first whether to go on when a run with entries is opened again', async () => {
    const { store, time } = await loaded();
    await store.act({ do: 'acknowledge-caution', caution: 0 });
    store.leave();
    await store.load(header.runId);
    time.pass(tapGuardMs);

    expect(store.needsResume()).toBe(true);
    expect(await store.act({ do: 'acknowledge-caution', caution: 1 })).toBe(false);
    expect(store.problem()?.code).toBe('resume-first');
    time.pass(tapGuardMs);
    expect(await store.act({ do: 'resume' })).toBe(true);
    expect(store.needsResume()).toBe(false);
    expect(store.view()?.events.at(-1)).toMatchObject({ type: 'resumed', data: { from: 'reload' } });
    time.pass(tapGuardMs);
    expect(await store.act({ do: 'acknowledge-caution', caution: 1 })).toBe(true);
  });

  it('lets the test be stopped before the resume card is answered', async () => {
    const { store, time } = await loaded();
    await store.act({ do: 'acknowledge-caution', caution: 0 });
    store.askToResume();
    time.pass(tapGuardMs);
    expect(await store.act({ do: 'stop', reason: '' })).toBe(true);
    expect(store.state()?.status).toBe('stopped');
  });

  it('records nothing, and shows the run only, when another window has gone on with it', async () => {
    const { store, journal, time } = await loaded();
    // Another window's event at the very next place.
    const place = await journal.load(header.runId);
    await TestBed.inject(OfflineStore).events.put({ ...place!.events[1]!, seq: 3 });
    time.pass(tapGuardMs);
    expect(await store.act({ do: 'acknowledge-caution', caution: 0 })).toBe(false);
    expect(store.problem()?.code).toBe('elsewhere');
    expect(store.isElsewhere()).toBe(true);
    time.pass(tapGuardMs);
    expect(await store.act({ do: 'acknowledge-caution', caution: 0 })).toBe(false);
  });

  it('notes that the clock was set back, before the next event', async () => {
    const { store, time } = await loaded();
    time.now -= 3 * 3_600_000;
    await store.act({ do: 'acknowledge-caution', caution: 0 });
    expect(store.view()?.events.slice(-2)).toMatchObject([
      { type: 'clock-jumped', data: { byMs: -3 * 3_600_000 } },
      { type: 'caution-acknowledged' },
    ]);
  });

  it('counts the run\u2019s own time on over a reload', async () => {
    const { store, time } = await loaded();
    time.pass(5_000);
    await store.act({ do: 'acknowledge-caution', caution: 0 });
    const before = store.clocks().elapsed;
    store.leave();
    time.pass(20_000);
    await store.load(header.runId);
    expect(store.clocks().elapsed - before).toBe(20_000);
    expect(store.clocks()).toMatchObject({ clockBackMs: 0, loadedElapsed: before + 20_000 });
  });

  it('lets the taps that belong to one go through together', async () => {
    const { store } = await loaded();
    expect(await store.act({ do: 'acknowledge-caution', caution: 0 })).toBe(true);
    const instrument = instruments['gauge'];
    if (instrument === undefined) throw new Error('no gauge');
    expect(await store.act({ do: 'choose-gear', role: 'gauge', instrument }, { isFollowUp: true })).toBe(true);
  });

  describe('at a ramp', () => {
    const at = (timeS: number, text: string) => ({ do: 'record', name: 'gauge', text, unit: 'kPa', timeS }) as const;

    /** A run that stands at the ramp, gone on with. */
    async function atRamp() {
      const run = await openedRun();
      const rampHeader = { ...header, runId: '018f0000-0000-7000-8000-00000000cccc' };
      const { events } = walkedTo('raise-and-listen', { header: rampHeader });
      await run.journal.open(
        rampHeader,
        events.map(({ type, data }) => ({ type, data }) as EventDraft),
      );
      run.journal.release(rampHeader.runId);
      await run.store.load(rampHeader.runId);
      run.time.pass(tapGuardMs);
      expect(await run.store.act({ do: 'resume' })).toBe(true);
      run.time.pass(tapGuardMs);
      return run;
    }

    it('writes what is tapped while a point is being written, in its order, and nothing is disabled meanwhile', async () => {
      const { store, time } = await atRamp();
      const queue = TestBed.inject(RampQueue);
      const first = store.act(at(0, '0.0'));
      expect(store.busy()).toBe('record');
      expect(store.isBusy()).toBe(false);
      time.pass(10);
      const mark = store.act({ do: 'mark', mark: 'noise-begins', timeS: 0.1, by: 'tap' });
      const second = store.act(at(0.25, '0.5'));
      expect(queue.commands()).toHaveLength(3);
      expect(await Promise.all([first, mark, second])).toEqual([true, true, true]);
      expect(queue.commands()).toEqual([]);
      expect(store.view()?.events.slice(-3)).toMatchObject([
        { type: 'reading-recorded', data: { timeS: 0 } },
        { type: 'mark-placed', data: { timeS: 0.1 } },
        { type: 'reading-recorded', data: { timeS: 0.25 } },
      ]);
    });

    it('keeps a mark behind a point that is refused, and says why that was', async () => {
      const { store } = await atRamp();
      const point = store.act(at(0, 'not a figure'));
      const mark = store.act({ do: 'mark', mark: 'noise-begins', timeS: 0.1, by: 'tap' });
      expect(await Promise.all([point, mark])).toEqual([false, true]);
      expect(store.view()?.events.at(-1)?.type).toBe('mark-placed');
    });

    it('does not decide anything else meanwhile, but stops', async () => {
      const { store } = await atRamp();
      const point = store.act(at(0, '0.0'));
      expect(await store.act({ do: 'redo', step: 'raise-and-listen', reason: 'anew' })).toBe(false);
      const stop = store.act({ do: 'stop', reason: '' });
      const again = store.act({ do: 'stop', reason: '' });
      expect(await Promise.all([point, stop, again])).toEqual([true, true, false]);
      expect(store.state()?.status).toBe('stopped');
    });
  });
});
