import { inject, Injectable, type Signal } from '@angular/core';
import { liveRows } from './live-rows';
import { OfflineStore } from './offline-store';
import type { OutboxRow } from './stored-rows';
import { nothingWaiting, type WaitingCounts } from './sync-view';

/** What waits on this tablet to be sent. */
@Injectable({ providedIn: 'root' })
export class Outbox {
  private readonly store = inject(OfflineStore);

  /** How much waits; undefined until it has been counted once. */
  readonly waiting: Signal<WaitingCounts | undefined> = liveRows(async () =>
    countWaiting(await this.store.outbox.toArray()),
  );

  /** What the server refused is offered again: one run's, one document's, or all of it. */
  async offerAgain(id?: string): Promise<void> {
    await this.store.outbox.toCollection().modify((row) => {
      if (id === undefined || nameOf(row) === id) delete (row as { refused?: string }).refused;
    });
  }
}

/** Counts what waits. */
export function countWaiting(rows: readonly OutboxRow[]): WaitingCounts {
  const counts = rows.reduce(
    (sum, row) => ({
      ...sum,
      events: sum.events + (row.kind === 'events' ? row.toSeq - row.fromSeq + 1 : 0),
      evidence: sum.evidence + (row.kind === 'blob' ? 1 : 0),
      documents: sum.documents + (row.kind === 'document' ? 1 : 0),
      oldestSince: Math.min(sum.oldestSince ?? row.since, row.since),
    }),
    nothingWaiting,
  );
  const runs = new Set(rows.flatMap((row) => (row.kind === 'events' ? [row.runId] : [])));
  const refused = new Set(rows.filter((row) => row.refused !== undefined).map(nameOf));
  return { ...counts, runs: runs.size, refused: refused.size };
}

const nameOf = (row: OutboxRow): string =>
  row.kind === 'events' ? row.runId : row.kind === 'document' ? row.documentId : row.sha256;
