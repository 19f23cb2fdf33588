import { HttpClient } from '@angular/common/http';
import { inject, Injectable } from '@angular/core';
import { firstValueFrom } from 'rxjs';
import { ApiProblem } from './api-problem';
import { OfflineStore } from './offline-store';
import type { OutboxBlob } from './stored-rows';

const finalStatuses: readonly number[] = [400, 409, 413, 415, 422];

/** Sends evidence whose events the server already has; what it has too is not sent again. */
@Injectable({ providedIn: 'root' })
export class AttachmentSender {
  private readonly http = inject(HttpClient);
  private readonly store = inject(OfflineStore);

  /** `missing` says per run what the server lacks, as far as it was asked. Throws `ApiProblem` when it cannot be reached. */
  async sendAll(missing: ReadonlyMap<string, readonly string[]>, onSent: () => void): Promise<void> {
    const rows = await this.store.outbox.toArray();
    const unsentRuns = new Set(rows.flatMap((row) => (row.kind === 'events' ? [row.runId] : [])));
    const blobs = rows.filter((row) => row.kind === 'blob').filter((row) => row.refused === undefined);
    for (const row of blobs) {
      if (unsentRuns.has(row.runId)) continue;
      const lacks = missing.get(row.runId);
      // The upload is idempotent: without an answer for this run it is simply made.
      if (lacks === undefined || lacks.includes(row.sha256)) await this.send(row);
      else await this.done(row);
      onSent();
    }
  }

  private async send(row: OutboxBlob): Promise<void> {
    const blob = await this.store.blobs.get(row.sha256);
    if (!blob) return this.refuse(row, 'the bytes are no longer on this tablet');
    const body = new Blob([new Uint8Array(blob.bytes)], { type: 'application/octet-stream' });
    try {
      await firstValueFrom(
        this.http.put(`/api/attachments/${row.sha256}`, body, {
          headers: { 'content-type': 'application/octet-stream', 'ngsw-bypass': '1' },
          responseType: 'text',
        }),
      );
      await this.done(row);
    } catch (error) {
      if (!(error instanceof ApiProblem) || !finalStatuses.includes(error.status)) throw error;
      await this.refuse(row, error.message);
    }
  }

  private async done({ id }: OutboxBlob): Promise<void> {
    if (id !== undefined) await this.store.outbox.delete(id);
  }

  private async refuse({ id }: OutboxBlob, reason: string): Promise<void> {
    if (id !== undefined) await this.store.outbox.update(id, { refused: reason });
  }
}
