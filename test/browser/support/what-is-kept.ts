import type { Page } from '@playwright/test';
import { Client } from 'pg';

/** What the tablet's own store holds of a run, read past the app. */
export async function eventsOnTablet(page: Page, runId: string): Promise<readonly Record<string, unknown>[]> {
  return page.evaluate(
    async ({ database, id }) => {
      const open = indexedDB.open(database);
      const store = await new Promise<IDBDatabase>((resolve, reject) => {
        open.onsuccess = () => resolve(open.result);
        open.onerror = () => reject(open.error);
      });
      const range = IDBKeyRange.bound([id, 0], [id, Number.MAX_SAFE_INTEGER]);
      const request = store.transaction('events').objectStore('events').getAll(range);
      const rows = await new Promise<Record<string, unknown>[]>((resolve, reject) => {
        request.onsuccess = () => resolve(request.result as Record<string, unknown>[]);
        request.onerror = () => reject(request.error);
      });
      store.close();
      return rows;
    },
    { database: 'bayhand', id: runId },
  );
}

/** Rows of a query on the product's database. */
export async function rowsOf<T>(databaseUrl: string, query: string, parameters: readonly unknown[] = []): Promise<T[]> {
  const client = new Client({ connectionString: databaseUrl });
  await client.connect();
  try {
    return (await client.query(query, [...parameters])).rows as T[];
  } finally {
    await client.end();
  }
}

/** What PostgreSQL holds of a run: each event's text as it was taken in. */
export async function eventsInDatabase(databaseUrl: string, runId: string): Promise<readonly string[]> {
  const rows = await rowsOf<{ event: string }>(
    databaseUrl,
    `SELECT event FROM run_event WHERE run_id = $1 AND branch = 'main' ORDER BY seq`,
    [runId],
  );
  return rows.map(({ event }) => event);
}
