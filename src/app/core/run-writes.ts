import { Dexie } from '#dexie';
import type { RunEvent } from '../../../procedures/engine/showing';
import type { OfflineStore, PracticeStore, RunTables } from './offline-store';
import type { BlobRow, RunRow } from './stored-rows';

/** What one append puts into the store, all or nothing. */
export interface RunWrite {
  readonly row: RunRow;
  readonly events: readonly RunEvent[];
  readonly blobs: readonly BlobRow[];
}

/** One transaction: events, the run's row, the evidence, and what waits to be sent. */
export async function writeWork(store: OfflineStore, { row, events, blobs }: RunWrite): Promise<void> {
  const { runId } = row;
  const since = row.changedAt;
  const fromSeq = row.seq - events.length + 1;
  const tables = [store.runs, store.events, store.outbox, ...(blobs.length > 0 ? [store.blobs] : [])];
  await store.transaction('rw', tables, async () => {
    await store.events.bulkAdd(events);
    await store.runs.put(row);
    await store.outbox.add({ kind: 'events', runId, fromSeq, toSeq: row.seq, since });
    if (blobs.length === 0) return;
    await store.blobs.bulkPut(blobs);
    await store.outbox.bulkAdd(
      blobs.map(({ sha256, bytes }) => ({ kind: 'blob' as const, sha256, runId, bytes: bytes.length, since })),
    );
  });
}

/** The same for practice, which is never sent. */
export async function writePractice(store: PracticeStore, { row, events, blobs }: RunWrite): Promise<void> {
  await store.transaction('rw', [store.runs, store.events, store.blobs], async () => {
    await store.events.bulkAdd(events);
    await store.runs.put(row);
    if (blobs.length > 0) await store.blobs.bulkPut(blobs);
  });
}

/** A run's events in order. */
export function eventsOf(tables: RunTables, runId: string): Promise<RunEvent[]> {
  return tables.events.where('[runId+seq]').between([runId, Dexie.minKey], [runId, Dexie.maxKey]).toArray();
}

/** Whether a write failed because the place of an event is taken. */
export function isPlaceTaken(error: unknown): boolean {
  if (error instanceof Dexie.BulkError) return error.failures.some(({ name }) => name === 'ConstraintError');
  return error instanceof Dexie.ConstraintError;
}
