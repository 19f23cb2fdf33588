import { computed, inject, Injectable, signal, type Signal } from '@angular/core';
import { Subject } from 'rxjs';
import type { RunEvent } from '../../../procedures/engine/showing';
import { SettingsBook } from '../core/settings-book';
import { WriteAhead } from '../core/write-ahead';
import type { RunView } from './run-view';

/** What stands in one field, and the seq of the event since which it stands there. */
interface KeptField {
  readonly since: number;
  readonly value: unknown;
}

type KeptFields = Readonly<Record<string, KeptField>>;

interface KeptRow {
  readonly fields?: KeptFields;
}

/** A field of an entry: reads what stands in it, and takes what is entered. */
export interface EntryField<T> {
  (): T;
  set(value: T): void;
  update(change: (value: T) => T): void;
}

type EventType = RunEvent['type'];

/**
 * What records an entry, takes it back, or brings the run to another step or to the same one anew: then nothing of the
 * entry before stands any more. What only interrupts, a pause, a reload, new gear, is not among them.
 */
const endsEntry: ReadonlySet<EventType> = new Set<EventType>([
  'opened',
  'step-claimed',
  'step-redone',
  'branch-overruled',
  'reading-recorded',
  'undone',
  'choice-made',
  'codes-recorded',
  'series-recorded',
  'not-measurable',
  'finding-reached',
  'write-up-written',
  'closed',
]);

/**
 * What is entered in the current step and not recorded yet, kept on the tablet at every change, so that a reload, a
 * killed browser or a pause loses nothing. It is no part of the record. Provided by the run's page.
 */
@Injectable()
export class EntryDraft {
  private readonly settings = inject(SettingsBook);
  private readonly ahead = inject(WriteAhead);

  private readonly kept = signal<KeptFields>({});
  private runId: string | undefined;
  private recalled: Promise<void> = Promise.resolve();
  private isWriting = false;
  private isStale = false;

  /** Something was entered or taken out of a field: what was said about the entry before no longer holds. */
  readonly changed = new Subject<void>();

  /** Finds again what was entered in this run before a reload. */
  async recall(runId: string): Promise<void> {
    if (this.runId === runId) return this.recalled;
    this.runId = runId;
    this.kept.set({});
    this.recalled = this.read(runId);
    return this.recalled;
  }

  /**
   * A field by its name, which tells it from every other field that may be shown at a step. It is empty again after
   * whatever ends an entry, and after the events that are named beside that.
   */
  field<T>(run: Signal<RunView>, name: () => string, empty: T, alsoEndedBy: readonly EventType[]): EntryField<T> {
    const value = computed<T>(() => {
      const field = this.kept()[name()];
      const isHere = field !== undefined && field.since === since(run().events, alsoEndedBy);
      return isHere && isLike(field.value, empty) ? field.value : empty;
    });
    const set = (next: T): void => {
      const { header, events } = run();
      this.put(header.runId, name(), { since: since(events, alsoEndedBy), value: next });
    };
    return Object.assign(() => value(), { set, update: (change: (now: T) => T) => set(change(value())) });
  }

  /** Drops what stands in the fields of an entry that is over. */
  tidy({ header, events }: Pick<RunView, 'header' | 'events'>): void {
    const from = since(events, []);
    const kept = this.kept();
    const live = Object.entries(kept).filter(([, field]) => field.since >= from);
    if (header.runId !== this.runId || live.length === Object.keys(kept).length) return;
    this.kept.set(Object.fromEntries(live));
    void this.write();
  }

  private put(runId: string, name: string, field: KeptField): void {
    if (this.runId !== runId) void this.recall(runId);
    this.kept.update((kept) => ({ ...kept, [name]: field }));
    this.changed.next();
    void this.write();
  }

  private async read(runId: string): Promise<void> {
    const row = await this.settings.read<KeptRow>(keyOf(runId));
    const left = this.ahead.left<KeptRow>(keyOf(runId));
    // What was entered while it was being read is newer.
    if (this.runId !== runId) return;
    // What the page before could not finish writing is newer than what it wrote.
    this.kept.update((kept) => ({ ...row?.fields, ...left?.value?.fields, ...kept }));
  }

  /** One write at a time, each with what stands in the fields when it begins: nothing waits to be kept. */
  private async write(): Promise<void> {
    this.isStale = true;
    if (this.runId !== undefined) this.ahead.put(keyOf(this.runId), { fields: this.kept() });
    if (this.isWriting) return;
    this.isWriting = true;
    try {
      await this.recalled;
      while (this.isStale && this.runId !== undefined) {
        this.isStale = false;
        const fields = this.kept();
        if (Object.keys(fields).length === 0) await this.settings.forget(keyOf(this.runId));
        else await this.settings.write(keyOf(this.runId), { fields });
        if (!this.isStale) this.ahead.done(keyOf(this.runId));
      }
    } finally {
      this.isWriting = false;
    }
  }
}

/** A field of the entry at the run's current step, in a component's own fields. */
export function entryField<T>(
  run: Signal<RunView>,
  name: string | (() => string),
  empty: T,
  alsoEndedBy: readonly EventType[] = [],
): EntryField<T> {
  return inject(EntryDraft).field(run, typeof name === 'string' ? () => name : name, empty, alsoEndedBy);
}

/** The seq of the newest event that ended an entry. */
function since(events: readonly RunEvent[], alsoEndedBy: readonly EventType[]): number {
  for (let index = events.length - 1; index >= 0; index -= 1) {
    const event = events[index];
    if (event !== undefined && (endsEntry.has(event.type) || alsoEndedBy.includes(event.type))) return event.seq;
  }
  return 0;
}

/** Another build may have kept something else under the name. */
function isLike<T>(value: unknown, empty: T): value is T {
  return typeof value === typeof empty && Array.isArray(value) === Array.isArray(empty) && value !== null;
}

const keyOf = (runId: string): string => `entry-draft:${runId}`;
