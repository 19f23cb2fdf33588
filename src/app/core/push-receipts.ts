import type { OfflineStore } from './offline-store';
import type { PushItem } from './push-batch';
import type { PushAnswer, PushProblem } from './wire';

/** When and against which database an answer came. */
export interface AnswerMoment {
  readonly now: number;
  readonly epoch: string | undefined;
}

/**
 * Takes the server's answer in: in one transaction the receipt is stored and only what it covers leaves the queue.
 * What was refused stays, with the reason. An item that the answer does not mention stays as it is.
 */
export async function takeAnswer(
  store: OfflineStore,
  items: readonly PushItem[],
  answer: PushAnswer,
  { now, epoch }: AnswerMoment,
): Promise<void> {
  await store.transaction('rw', [store.outbox, store.receipts, store.runs], async () => {
    for (const { runId, acceptedThrough, countersigned, problem } of answer.runs) {
      if (!items.some((item) => item.kind === 'run' && item.id === runId)) continue;
      const said = problem === undefined ? {} : { problem: wordsOf(problem) };
      await store.receipts.put({ runId, acceptedThrough, countersigned, receivedAt: now, epoch, ...said });
      await giveUpThrough(store, runId, acceptedThrough);
      if (isGap(problem)) await offerFrom(store, runId, acceptedThrough + 1, now);
      else if (problem !== undefined) await refuse(store, 'run', runId, wordsOf(problem));
    }
    for (const { id, problem } of answer.documents) {
      const item = items.find((candidate) => candidate.kind === 'document' && candidate.id === id);
      if (item?.kind !== 'document') continue;
      if (problem === undefined) await store.outbox.bulkDelete([...item.rowIds]);
      else await refuse(store, 'document', id, wordsOf(problem));
    }
  });
}

/** Marks one item as refused for good: it stays on the tablet, visible, and can be offered again. */
export async function refuse(store: OfflineStore, kind: PushItem['kind'], id: string, reason: string): Promise<void> {
  await store.outbox
    .filter((row) =>
      kind === 'run' ? row.kind === 'events' && row.runId === id : row.kind === 'document' && row.documentId === id,
    )
    .modify({ refused: reason });
}

async function giveUpThrough(store: OfflineStore, runId: string, acceptedThrough: number): Promise<void> {
  const rows = await store.outbox.where('runId').equals(runId).toArray();
  for (const row of rows) {
    if (row.kind !== 'events' || row.id === undefined || row.fromSeq > acceptedThrough) continue;
    if (row.toSeq <= acceptedThrough) await store.outbox.delete(row.id);
    else await store.outbox.put({ ...row, fromSeq: acceptedThrough + 1 });
  }
}

/** The server lacks earlier events than the ones it was sent: they are all on this tablet, so they go again. */
async function offerFrom(store: OfflineStore, runId: string, fromSeq: number, now: number): Promise<void> {
  const run = await store.runs.get(runId);
  const rows = await store.outbox.where('runId').equals(runId).toArray();
  await store.outbox.bulkDelete(rows.flatMap((row) => (row.kind === 'events' ? [row.id ?? 0] : [])));
  if (run && run.seq >= fromSeq) {
    await store.outbox.add({ kind: 'events', runId, fromSeq, toSeq: run.seq, since: rows[0]?.since ?? now });
  }
}

const isGap = (problem: PushProblem | string | undefined): boolean =>
  typeof problem === 'object' && problem.code === 'gap';

/** What a refusal says, in whichever shape it came. */
export const wordsOf = (problem: PushProblem | string): string =>
  typeof problem === 'string' ? problem : (problem.detail ?? problem.title ?? 'refused');
