import { inject, Injectable } from '@angular/core';
import {
  headerHash,
  sealEvent,
  type EventDraft,
  type RunEvent,
  type RunHeader,
} from '../../../procedures/engine/showing';
import { buildId } from './build-id';
import { OfflineStore, PracticeStore, type RunTables } from './offline-store';
import { RunLocks } from './run-locks';
import { eventsOf, isPlaceTaken, writePractice, writeWork } from './run-writes';
import { Session } from './session';
import type { BlobRow, RunRow, RunSummary } from './stored-rows';
import { Tablet } from './tablet';
import { clock, monotonicClock, newId } from './time-and-ids';

/** Evidence that goes in with the events that name it. */
export type NewBlob = Pick<BlobRow, 'sha256' | 'bytes' | 'mediaType'>;

/** What an append may bring besides the drafts. */
export interface AppendExtras {
  readonly blobs?: readonly NewBlob[];
  /**
   * Called with the sealed events before they are stored; what it gives is what the Bench shows of the run from then
   * on. Apply the events here and throw when they do not fit: then nothing is stored.
   */
  readonly summarise?: (events: readonly RunEvent[]) => RunSummary;
}

/** A run as it is stored. */
export interface StoredRun {
  readonly header: RunHeader;
  readonly events: readonly RunEvent[];
  readonly row: RunRow;
  /** By how much the device's clock stands before the last event's; 0 when it goes on as it should. */
  readonly clockBackMs: number;
}

/** Another tab or another device's copy wrote the run meanwhile; nothing of this append was stored. */
export class RunWrittenElsewhere extends Error {
  override readonly name = 'RunWrittenElsewhere';

  constructor(readonly runId: string) {
    super(`The run ${runId} is being written in another window`);
  }
}

/** Real work needs a registered tablet and a person; nothing was stored. */
export class NobodyToSign extends Error {
  override readonly name = 'NobodyToSign';
}

/** Where the next event of a run goes. */
interface Place {
  readonly tables: RunTables;
  readonly header: RunHeader;
  readonly openedBy: string;
  readonly seq: number;
  readonly head: string;
  /** The monotonic clock's reading that stands for `elapsed` 0. */
  readonly elapsedOrigin: number;
  readonly summary: RunSummary | undefined;
}

/**
 * Writes runs: gives drafts their place in the chain (hashed before the transaction opens, since awaiting inside one
 * ends it), then stores events, the outbox's row and the evidence in one strict transaction. Only then does the caller
 * go on. Practice goes to a store of its own, without an outbox.
 */
@Injectable({ providedIn: 'root' })
export class RunJournal {
  private readonly work = inject(OfflineStore);
  private readonly practice = inject(PracticeStore);
  private readonly locks = inject(RunLocks);
  private readonly session = inject(Session);
  private readonly tablet = inject(Tablet);
  private readonly build = inject(buildId);
  private readonly now = inject(clock);
  private readonly monotonic = inject(monotonicClock);
  private readonly makeId = inject(newId);

  private readonly places = new Map<string, Place>();
  /** Per run the last append under way: appends of one run go one after another. */
  private readonly queues = new Map<string, Promise<unknown>>();

  /** Begins a run: its header and first events. */
  open(header: RunHeader, drafts: readonly EventDraft[], extras: AppendExtras = {}): Promise<readonly RunEvent[]> {
    const { runId } = header;
    return this.inTurn(runId, async () => {
      const { actor } = await this.signers(header);
      const place: Place = {
        tables: header.kind === 'practice' ? this.practice : this.work,
        header,
        openedBy: actor,
        seq: 0,
        head: headerHash(header),
        elapsedOrigin: this.monotonic(),
        summary: undefined,
      };
      return this.write(place, drafts, extras);
    });
  }

  /** Adds events to a run. Throws `RunWrittenElsewhere` when another window has it. */
  append(runId: string, drafts: readonly EventDraft[], extras: AppendExtras = {}): Promise<readonly RunEvent[]> {
    return this.inTurn(runId, async () => {
      const place = this.places.get(runId) ?? (await this.findPlace(runId));
      return this.write(place, drafts, extras);
    });
  }

  /** A stored run with all its events in order; undefined when this tablet does not have it. */
  async load(runId: string): Promise<StoredRun | undefined> {
    for (const tables of [this.work, this.practice]) {
      const row = await tables.runs.get(runId);
      if (!row) continue;
      const events = await eventsOf(tables, runId);
      const last = events.at(-1);
      const place = this.placeAfter(tables, row, last);
      if (!this.places.has(runId)) this.places.set(runId, place);
      return {
        header: row.header,
        events,
        row,
        clockBackMs: last === undefined ? 0 : Math.max(0, last.at - this.now()),
      };
    }
    return undefined;
  }

  /** Takes the run for this window until `release`; false when another window has it. */
  hold(runId: string): Promise<boolean> {
    return this.locks.hold(runId);
  }

  /** Gives the run up, and forgets its place: the next one to append reads it anew. */
  release(runId: string): void {
    this.places.delete(runId);
    this.locks.release(runId);
  }

  /** Evidence by its hash; undefined when this tablet does not have it. */
  async blob(sha256: string): Promise<Uint8Array | undefined> {
    const row = (await this.work.blobs.get(sha256)) ?? (await this.practice.blobs.get(sha256));
    return row?.bytes;
  }

  private inTurn<T>(runId: string, write: () => Promise<T>): Promise<T> {
    const before = this.queues.get(runId) ?? Promise.resolve();
    const turn = before
      .catch(() => undefined)
      .then(() =>
        this.locks.during<T>(runId, write, () => {
          throw new RunWrittenElsewhere(runId);
        }),
      );
    this.queues.set(runId, turn);
    void turn.catch(() => undefined).finally(() => this.queues.get(runId) === turn && this.queues.delete(runId));
    return turn;
  }

  private async write(
    place: Place,
    drafts: readonly EventDraft[],
    { blobs = [], summarise }: AppendExtras,
  ): Promise<readonly RunEvent[]> {
    if (drafts.length === 0) return [];
    const { header, tables } = place;
    const { runId } = header;
    const events = await this.seal(place, drafts);
    const summary = summarise?.(events) ?? place.summary;
    const last = events[events.length - 1] as RunEvent;
    const row: RunRow = {
      runId,
      header,
      visitId: header.visitId,
      seq: last.seq,
      head: last.hash,
      changedAt: last.at,
      elapsed: last.elapsed,
      openedBy: place.openedBy,
      summary,
    };
    const write = { row, events, blobs: blobs.map((blob) => ({ ...blob, runId })) };
    try {
      await (tables === this.work ? writeWork(this.work, write) : writePractice(this.practice, write));
    } catch (error) {
      this.places.delete(runId);
      // The key [runId+seq] is taken: someone else wrote there first.
      if (isPlaceTaken(error)) throw new RunWrittenElsewhere(runId);
      throw error;
    }
    this.places.set(runId, { ...place, seq: row.seq, head: row.head, summary });
    return events;
  }

  private async seal(place: Place, drafts: readonly EventDraft[]): Promise<readonly RunEvent[]> {
    const { actor, device } = await this.signers(place.header);
    const events: RunEvent[] = [];
    let { head, seq } = place;
    for (const draft of drafts) {
      seq += 1;
      const event = sealEvent(draft, {
        runId: place.header.runId,
        seq,
        id: this.makeId(),
        at: this.now(),
        elapsed: Math.max(0, Math.round(this.monotonic() - place.elapsedOrigin)),
        actor,
        device,
        build: this.build,
        prev: head,
      });
      head = event.hash;
      events.push(event);
    }
    return events;
  }

  private async findPlace(runId: string): Promise<Place> {
    for (const tables of [this.work, this.practice]) {
      const row = await tables.runs.get(runId);
      if (row) return this.placeAfter(tables, row, await tables.events.get([runId, row.seq]));
    }
    throw new RangeError(`runId is ${runId}; allowed: a run on this tablet`);
  }

  /** Time goes on after a reload by the wall clock, never backwards. */
  private placeAfter(tables: RunTables, row: RunRow, last: RunEvent | undefined): Place {
    const away = last === undefined ? 0 : Math.max(0, this.now() - last.at);
    return {
      tables,
      header: row.header,
      openedBy: row.openedBy,
      seq: row.seq,
      head: row.head,
      elapsedOrigin: this.monotonic() - (last?.elapsed ?? 0) - away,
      summary: row.summary,
    };
  }

  private async signers({ kind }: RunHeader): Promise<{ actor: string; device: string }> {
    const actor = this.session.person()?.id;
    const device = (await this.tablet.registeredId()) ?? (kind === 'practice' ? 'unregistered' : undefined);
    if (actor === undefined) throw new NobodyToSign('Nobody is signed in');
    if (device === undefined) throw new NobodyToSign('This tablet is not registered yet');
    return { actor, device };
  }
}
