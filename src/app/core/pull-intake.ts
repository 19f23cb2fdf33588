import { HttpClient } from '@angular/common/http';
import { inject, Injectable } from '@angular/core';
import { firstValueFrom } from 'rxjs';
import { OfflineStore } from './offline-store';
import { SettingsBook } from './settings-book';
import { clock } from './time-and-ids';
import type { PullAnswer, Visit } from './wire';

/** Receipts are kept this long: after a restore of the server's database the tablet offers those runs again. */
const receiptsKeptMs = 30 * 24 * 3_600_000;

const cursorKey = 'pull-cursor';

/** Fetches what is new on the server and puts it on the tablet, all in one transaction with the cursor. */
@Injectable({ providedIn: 'root' })
export class PullIntake {
  private readonly http = inject(HttpClient);
  private readonly store = inject(OfflineStore);
  private readonly settings = inject(SettingsBook);
  private readonly now = inject(clock);

  /** Throws `ApiProblem` when the server cannot be reached. */
  async pull(): Promise<void> {
    const since = await this.settings.read<string>(cursorKey);
    const answer = await firstValueFrom(
      this.http.get<PullAnswer>('/api/sync/pull', { params: since === undefined ? {} : { since } }),
    );
    const isWhole = since === undefined || epochOf(since) !== epochOf(answer.cursor);
    await this.take(answer, isWhole, since !== undefined && isWhole);
  }

  private async take(answer: PullAnswer, isWhole: boolean, isRestored: boolean): Promise<void> {
    const { store } = this;
    await store.transaction('rw', store.tables, async () => {
      if (isWhole) await this.clearOutdated(answer);
      await store.sites.bulkPut([...answer.sites]);
      await store.gear.bulkPut([...answer.gear]);
      await store.people.bulkPut([...answer.people]);
      await store.procedures.bulkPut([...answer.procedures]);
      await store.visits.bulkPut(await this.newerVisits(answer.visits));
      await store.toldRuns.bulkPut([...answer.runs]);
      await store.receipts.where('runId').notEqual('').and(this.isOld).delete();
      if (isRestored) await this.offerAgain(epochOf(answer.cursor));
      await store.settings.put({ key: cursorKey, value: answer.cursor });
    });
  }

  private readonly isOld = ({ receivedAt }: { receivedAt: number }): boolean =>
    receivedAt < this.now() - receiptsKeptMs;

  /** A whole answer replaces what is here, but for what a run of this tablet still needs. */
  private async clearOutdated({ procedures }: PullAnswer): Promise<void> {
    const { store } = this;
    await Promise.all([store.sites.clear(), store.gear.clear(), store.people.clear(), store.toldRuns.clear()]);
    const kept = new Set(procedures.map(({ id, version }) => `${id}@${version}`));
    const here = new Map((await store.procedures.toArray()).map((row) => [`${row.id}@${row.version}`, row]));
    const keep = (key: string): void => {
      const row = here.get(key);
      if (kept.has(key) || row === undefined) return;
      kept.add(key);
      // A run cannot be replayed without what its procedure calls.
      for (const step of row.document.steps) if (step.kind === 'call') keep(`${step.procedure}@${step.version}`);
    };
    for (const { header } of await store.runs.toArray()) keep(`${header.procedureId}@${header.version}`);
    const outdated = (await store.procedures.toCollection().primaryKeys()).filter(
      ([id, version]) => !kept.has(`${id}@${version}`),
    );
    await store.procedures.bulkDelete(outdated);
  }

  /** The later writer wins; what was changed here and not yet sent is later. */
  private async newerVisits(visits: readonly Visit[]): Promise<Visit[]> {
    const here = await this.store.visits.bulkGet(visits.map(({ id }) => id));
    return visits.filter((visit, index) => (here[index]?.changedAt ?? 0) <= visit.changedAt);
  }

  /** The server's database is another one, restored from a copy: it may lack what it once confirmed. */
  private async offerAgain(epoch: string): Promise<void> {
    const { store } = this;
    const since = this.now();
    for (const receipt of await store.receipts.toArray()) {
      if (receipt.epoch === epoch) continue;
      const run = await store.runs.get(receipt.runId);
      if (!run) continue;
      const { runId } = run;
      const waiting = await store.outbox.where('runId').equals(runId).toArray();
      await store.outbox.bulkDelete(waiting.flatMap((row) => (row.kind === 'events' ? [row.id ?? 0] : [])));
      await store.outbox.add({ kind: 'events', runId, fromSeq: 1, toSeq: run.seq, since });
      const blobs = await store.blobs.where('runId').equals(runId).toArray();
      const queued = new Set(waiting.flatMap((row) => (row.kind === 'blob' ? [row.sha256] : [])));
      for (const { sha256, bytes } of blobs) {
        if (!queued.has(sha256)) await store.outbox.add({ kind: 'blob', sha256, runId, bytes: bytes.length, since });
      }
      const visit = await store.visits.get(run.visitId);
      if (visit) {
        await store.outbox.add({
          kind: 'document',
          documentKind: 'visit',
          documentId: visit.id,
          changedAt: visit.changedAt,
          since,
        });
      }
    }
  }
}

const epochOf = (cursor: string): string => cursor.split('.')[0] ?? '';
