import { HttpClient } from '@angular/common/http';
import { inject, Injectable } from '@angular/core';
import { firstValueFrom } from 'rxjs';
import { ApiProblem } from './api-problem';
import { OfflineStore } from './offline-store';
import { nextBatch, pushBody, type PushItem } from './push-batch';
import { refuse, takeAnswer } from './push-receipts';
import { SettingsBook } from './settings-book';
import { Tablet } from './tablet';
import { clock } from './time-and-ids';
import type { PushAnswer } from './wire';

/** Statuses that another try of the same item cannot change. */
const finalStatuses: readonly number[] = [400, 409, 413, 422];

/**
 * Sends what waits, signed by the tablet, in batches. At least once on the wire: a lost answer only means that the
 * same events go again. A batch that the server refuses as a whole is halved until the one item at fault stands alone;
 * the others are unharmed.
 */
@Injectable({ providedIn: 'root' })
export class PushSender {
  private readonly http = inject(HttpClient);
  private readonly store = inject(OfflineStore);
  private readonly tablet = inject(Tablet);
  private readonly settings = inject(SettingsBook);
  private readonly now = inject(clock);

  /**
   * Sends everything that waits. Gives the attachments that the server said it lacks and those it said it has, by run.
   * Throws `ApiProblem` when the server cannot be reached or wants another sign-in.
   */
  async sendAll(onSent: (items: number) => void): Promise<ReadonlyMap<string, readonly string[]>> {
    const missing = new Map<string, readonly string[]>();
    let before: string | undefined;
    for (;;) {
      const batch = await nextBatch(this.store);
      const fingerprint = JSON.stringify(batch.map((item) => [item.id, item.rowIds, sizeOf(item)]));
      // A batch that comes back unchanged was accepted by nobody: leave it for the next sync rather than spin.
      if (batch.length === 0 || fingerprint === before) return missing;
      before = fingerprint;
      await this.send(batch, missing);
      onSent(batch.length);
    }
  }

  private async send(items: readonly PushItem[], missing: Map<string, readonly string[]>): Promise<void> {
    const device = await this.tablet.registeredId();
    if (device === undefined) throw new Error('An unregistered tablet sends nothing');
    const body = new TextEncoder().encode(pushBody(device, items));
    try {
      const answer = await this.post(body);
      for (const run of answer.runs) missing.set(run.runId, run.missingAttachments);
      const cursor = await this.settings.read<string>('pull-cursor');
      await takeAnswer(this.store, items, answer, { now: this.now(), epoch: cursor?.split('.')[0] });
    } catch (error) {
      if (!(error instanceof ApiProblem) || !finalStatuses.includes(error.status)) throw error;
      await this.sendHalves(items, missing, error);
    }
  }

  private async sendHalves(
    items: readonly PushItem[],
    missing: Map<string, readonly string[]>,
    problem: ApiProblem,
  ): Promise<void> {
    const [only] = items;
    if (items.length === 1 && only) {
      const half = problem.status === 413 ? halved(only) : undefined;
      if (half) await this.send([half], missing);
      else await refuse(this.store, only.kind, only.id, problem.message);
      return;
    }
    const middle = Math.ceil(items.length / 2);
    await this.send(items.slice(0, middle), missing);
    await this.send(items.slice(middle), missing);
  }

  private async post(body: Uint8Array<ArrayBuffer>): Promise<PushAnswer> {
    const headers = {
      'content-type': 'application/json',
      'x-bayhand-signature': await this.tablet.sign(body),
    };
    return firstValueFrom(this.http.post<PushAnswer>('/api/sync/push', new Blob([body]), { headers }));
  }
}

/** The first half of a run's events; the rest goes with the next batch. */
function halved(item: PushItem): PushItem | undefined {
  if (item.kind !== 'run' || item.events.length < 2) return undefined;
  return { ...item, events: item.events.slice(0, Math.ceil(item.events.length / 2)) };
}

const sizeOf = (item: PushItem): string =>
  item.kind === 'run' ? `${item.events[0]?.seq}-${item.events.at(-1)?.seq}` : String(item.document.changedAt);
