import { DOCUMENT, inject, Injectable } from '@angular/core';
import { liveRows } from '../core/live-rows';
import { OfflineStore } from '../core/offline-store';
import { Outbox } from '../core/outbox';
import type { OutboxRow } from '../core/stored-rows';

/** Something that the server refused, or took with a remark. */
export interface RefusedItem {
  /** The run's or the document's id, or the evidence's hash. */
  readonly id: string;
  readonly what: string;
  readonly reason: string;
  /** Whether it waits here and can be offered again; a remark on what was taken cannot. */
  readonly isWaiting: boolean;
  /** Whether it is a run, which can be saved as a file. */
  readonly isRun: boolean;
}

/** What the server refused: it stays on the tablet, can be seen, saved as a file and offered again. */
@Injectable({ providedIn: 'root' })
export class RefusedStore {
  private readonly store = inject(OfflineStore);
  private readonly outbox = inject(Outbox);
  private readonly document = inject(DOCUMENT);

  /** Undefined until it has been read once. */
  readonly items = liveRows(() => this.read());

  /** Offers it to the server again with the next sync. */
  offerAgain(id: string): Promise<void> {
    return this.outbox.offerAgain(id);
  }

  /** Saves a run with its header and all its events as a JSON file. */
  async save(runId: string): Promise<void> {
    const [run, events] = await Promise.all([
      this.store.runs.get(runId),
      this.store.events.where('[runId+seq]').between([runId, 0], [runId, Infinity]).toArray(),
    ]);
    const text = JSON.stringify({ header: run?.header, events }, undefined, 2);
    const url = URL.createObjectURL(new Blob([text], { type: 'application/json' }));
    const link = this.document.createElement('a');
    link.href = url;
    link.download = `run-${runId}.json`;
    link.click();
    URL.revokeObjectURL(url);
  }

  private async read(): Promise<readonly RefusedItem[]> {
    const rows = (await this.store.outbox.toArray()).filter(({ refused }) => refused !== undefined);
    const items = await Promise.all(rows.map((row) => this.itemOf(row)));
    const refused = new Map(items.map((item) => [item.id, item]));
    const remarks = (await this.store.receipts.toArray()).filter(
      ({ runId, problem }) => problem !== undefined && !refused.has(runId),
    );
    const remarked = remarks.map(async ({ runId, problem = '' }) => ({
      id: runId,
      what: await this.runWords(runId),
      reason: problem,
      isWaiting: false,
      isRun: true,
    }));
    return [...refused.values(), ...(await Promise.all(remarked))];
  }

  private async itemOf(row: OutboxRow): Promise<RefusedItem> {
    const reason = row.refused ?? '';
    if (row.kind === 'events') {
      return { id: row.runId, what: await this.runWords(row.runId), reason, isWaiting: true, isRun: true };
    }
    if (row.kind === 'blob') {
      const what = `Evidence of ${await this.runWords(row.runId)}`;
      return { id: row.sha256, what, reason, isWaiting: true, isRun: false };
    }
    const visit = await this.store.visits.get(row.documentId);
    const what = visit === undefined ? 'A visit' : `Visit, RO ${visit.repairOrder}`;
    return { id: row.documentId, what, reason, isWaiting: true, isRun: false };
  }

  private async runWords(runId: string): Promise<string> {
    const summary = (await this.store.runs.get(runId))?.summary;
    return summary === undefined ? `Run ${runId}` : `${summary.procedureTitle}, RO ${summary.repairOrder}`;
  }
}
