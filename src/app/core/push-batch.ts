import type { RunEvent, RunHeader } from '../../../procedures/engine/showing';
import type { OfflineStore } from './offline-store';
import type { OutboxDocument, OutboxEvents, OutboxRow } from './stored-rows';
import type { Visit } from './wire';

/** One run's events or one document, with the outbox rows that asked for it. */
export type PushItem = PushRun | PushDocument;

export interface PushRun {
  readonly kind: 'run';
  readonly id: string;
  readonly header: RunHeader;
  readonly events: readonly RunEvent[];
  readonly rowIds: readonly number[];
}

export interface PushDocument {
  readonly kind: 'document';
  readonly id: string;
  readonly documentKind: 'visit';
  readonly document: Visit;
  readonly rowIds: readonly number[];
}

/** A push stays well under what a server takes in one body. */
const mostEvents = 400;

/** What one push sends next: documents first, since a run names its visit; then runs, oldest first, up to the limit. */
export async function nextBatch(store: OfflineStore): Promise<readonly PushItem[]> {
  const rows = (await store.outbox.toArray()).filter((row) => row.refused === undefined);
  const documents = await documentItems(store, rows.filter(isDocument));
  const runs: PushRun[] = [];
  let room = mostEvents;
  for (const group of groupByRun(rows.filter(isEvents))) {
    if (room <= 0) break;
    const item = await runItem(store, group, room);
    if (!item) continue;
    runs.push(item);
    room -= item.events.length;
  }
  return [...documents, ...runs];
}

/** The body of a push, as the server takes it. */
export function pushBody(device: string, items: readonly PushItem[]): string {
  return JSON.stringify({
    device,
    runs: items.flatMap((item) => (item.kind === 'run' ? [{ header: item.header, events: item.events }] : [])),
    documents: items.flatMap((item) =>
      item.kind === 'document' ? [{ kind: item.documentKind, document: item.document }] : [],
    ),
  });
}

async function documentItems(store: OfflineStore, rows: readonly OutboxDocument[]): Promise<readonly PushDocument[]> {
  const ids = [...new Set(rows.map(({ documentId }) => documentId))];
  const visits = await store.visits.bulkGet(ids);
  return visits.flatMap((document, index) => {
    const id = ids[index];
    if (!document || id === undefined) return [];
    const rowIds = rows.filter(({ documentId }) => documentId === id).map(rowId);
    return [{ kind: 'document' as const, id, documentKind: 'visit' as const, document, rowIds }];
  });
}

async function runItem(store: OfflineStore, rows: readonly OutboxEvents[], room: number): Promise<PushRun | undefined> {
  const runId = rows[0]?.runId;
  const run = runId === undefined ? undefined : await store.runs.get(runId);
  if (!run) return undefined;
  const from = Math.min(...rows.map(({ fromSeq }) => fromSeq));
  const through = Math.min(Math.max(...rows.map(({ toSeq }) => toSeq)), from + room - 1);
  const events = await store.events
    .where('[runId+seq]')
    .between([run.runId, from], [run.runId, through], true, true)
    .toArray();
  return { kind: 'run', id: run.runId, header: run.header, events, rowIds: rows.map(rowId) };
}

function groupByRun(rows: readonly OutboxEvents[]): readonly (readonly OutboxEvents[])[] {
  const groups = new Map<string, OutboxEvents[]>();
  for (const row of rows) groups.set(row.runId, [...(groups.get(row.runId) ?? []), row]);
  return [...groups.values()];
}

const isDocument = (row: OutboxRow): row is OutboxDocument => row.kind === 'document';
const isEvents = (row: OutboxRow): row is OutboxEvents => row.kind === 'events';
/** The database gives every stored row its id. */
const rowId = (row: OutboxRow): number => row.id ?? 0;
