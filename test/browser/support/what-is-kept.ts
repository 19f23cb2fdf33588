import type { Page } from '@playwright/test';
import { Client } from 'pg';

/** What the tablet's own store holds of a run, read past the app; a practice run is in `bayhand-practice`. */
export async function eventsOnTablet(
  page: Page,
  runId: string,
  database = 'bayhand',
): Promise<readonly Record<string, unknown>[]> {
  const events = await storedOnTablet(page, 'events', database);
  return events.filter((event) => event['runId'] === runId).sort((a, b) => Number(a['seq']) - Number(b['seq']));
}

/** Every row of one of the tablet's own stores, read past the app. */
export async function storedOnTablet(
  page: Page,
  store: string,
  database = 'bayhand',
): Promise<Record<string, unknown>[]> {
  return page.evaluate(
    async ({ database, store }) => {
      const open = indexedDB.open(database);
      const opened = await new Promise<IDBDatabase>((resolve, reject) => {
        open.onsuccess = () => resolve(open.result);
        open.onerror = () => reject(open.error);
      });
      const request = opened.transaction(store).objectStore(store).getAll();
      const rows = await new Promise<Record<string, unknown>[]>((resolve, reject) => {
        request.onsuccess = () => resolve(request.result as Record<string, unknown>[]);
        request.onerror = () => reject(request.error);
      });
      opened.close();
      return rows;
    },
    { database, store },
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
