import { randomBytes } from 'node:crypto';
import { mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join, resolve } from 'node:path';
import { prepareDatabase } from '../../../server/start/database.mjs';
import { freePort } from '../../../server/start/free-port.mjs';
import { startServer } from '../../../server/start/server-process.mjs';
import { makeDatabase } from './make-database';

const root = resolve(__dirname, '../../..');

/** The compiled product, served from one port over a database of its own with the demo in it. */
export interface Product {
  /** As `http://127.0.0.1:41873`, without a slash at the end. */
  readonly baseUrl: string;
  /** The database as its owner sees it, for looking at what the server kept. */
  readonly databaseUrl: string;
  /** The same database with the rights of the role that serves. */
  readonly servingUrl: string;
  /** Closes the port: to a tablet, the network is gone. */
  stop(): Promise<void>;
  /** Opens the same port again, over the same database. */
  start(): Promise<void>;
  /** Stops the server and drops the database. */
  remove(): Promise<void>;
}

/** Makes a fresh database, prepares it with the demo and starts the compiled server on a free port. */
export async function startProduct(): Promise<Product> {
  const database = await makeDatabase();
  await prepareDatabase(root, database, true);
  const port = await freePort();
  const baseUrl = `http://127.0.0.1:${port}`;
  const logs = mkdtempSync(join(tmpdir(), 'bayhand-browser-'));
  const env = {
    ...process.env,
    DATABASE_URL: database.appUrl,
    HOST: '127.0.0.1',
    PORT: String(port),
    NODE_ENV: 'production',
    BAYHAND_DEMO: '1',
    BAYHAND_APP_DIR: join(root, 'dist/app'),
    BAYHAND_TOKEN_SECRET: randomBytes(32).toString('base64url'),
  };
  let stopServer: (() => Promise<void>) | undefined;
  const start = async () => {
    const log = join(logs, 'server.log');
    const server = await startServer({ root, env, log, address: `${baseUrl}/`, isOfOurGroup: true });
    stopServer = server.stop;
  };
  const stop = async () => {
    await stopServer?.();
    stopServer = undefined;
  };
  await start();
  return {
    baseUrl,
    databaseUrl: database.ownerUrl,
    servingUrl: database.appUrl,
    start,
    stop,
    remove: async () => {
      await stop();
      await database.drop();
      rmSync(logs, { recursive: true });
    },
  };
}
