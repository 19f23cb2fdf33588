import { randomBytes } from 'node:crypto';
import { Client } from 'pg';
import { prepare } from '../../server/database/prepare';

// Making the template and starting a server take their time where other work goes on beside.
jest.setTimeout(60_000);

/** A database of one spec file: a copy of the migrated and seeded one. */
export interface TestDatabase {
  readonly name: string;
  /** As the superuser, who may look at everything. */
  readonly superUrl: string;
  /** As the role that owns the tables. */
  readonly ownerUrl: string;
  /** As the role that serves. */
  readonly appUrl: string;
  readonly appRole: string;
  readonly drop: () => Promise<void>;
}

const run = process.env['BAYHAND_TEST_RUN'] ?? 'alone';
const owner = `bayhand_owner_${run}`;
const app = `bayhand_app_${run}`;
const template = `bayhand_template_${run}`;
const password = 'only-for-tests';
/** When the demo of the template was seeded. */
export const seededAt = new Date('2026-11-12T08:00:00Z');

/** Any number that no other advisory lock of the tests has. */
const templateLock = 77_041;

/** A fresh copy of the prepared database. */
export async function createTestDatabase(): Promise<TestDatabase> {
  await ensureTemplate();
  return createFrom(template);
}

/** A database with nothing in it, owned by the owner's role. */
export async function createEmptyDatabase(): Promise<TestDatabase> {
  await ensureTemplate();
  return createFrom('template0');
}

async function createFrom(source: string): Promise<TestDatabase> {
  const name = `bayhand_spec_${randomBytes(6).toString('hex')}`;
  await asSuperuser((client) => client.query(`CREATE DATABASE ${name} OWNER ${owner} TEMPLATE ${source}`));
  return {
    name,
    superUrl: urlOf(name),
    ownerUrl: urlOf(name, owner),
    appUrl: urlOf(name, app),
    appRole: app,
    drop: async () => {
      await asSuperuser((client) => client.query(`DROP DATABASE IF EXISTS ${name} WITH (FORCE)`));
    },
  };
}

/** Makes the roles and the template, once for all spec files of a run, whichever comes first. */
async function ensureTemplate(): Promise<void> {
  await asSuperuser(async (client) => {
    await client.query('SELECT pg_advisory_lock($1)', [templateLock]);
    const { rowCount } = await client.query('SELECT FROM pg_database WHERE datname = $1', [template]);
    if (rowCount === 1) return;
    await client.query(`CREATE ROLE ${owner} LOGIN PASSWORD '${password}'`);
    await client.query(`CREATE ROLE ${app} LOGIN PASSWORD '${password}'`);
    // Under another name until it is ready: a run that was ended half-way leaves nothing that looks like it.
    const making = `${template}_making`;
    await client.query(`CREATE DATABASE ${making} OWNER ${owner} TEMPLATE template0`);
    await prepare({ ownerUrl: urlOf(making, owner), appRole: app, isDemo: true }, seededAt);
    await client.query(`ALTER DATABASE ${making} RENAME TO ${template}`);
  });
}

async function asSuperuser<T>(work: (client: Client) => Promise<T>): Promise<T> {
  const client = new Client({ connectionString: superUrl() });
  await client.connect();
  try {
    return await work(client);
  } finally {
    await client.end();
  }
}

function superUrl(): string {
  const url = process.env['BAYHAND_TEST_DATABASE_URL'];
  if (!url) throw new Error('BAYHAND_TEST_DATABASE_URL is not set: run the specs by the project in jest.config.cjs.');
  return url;
}

function urlOf(database: string, role?: string): string {
  const url = new URL(superUrl());
  url.pathname = `/${database}`;
  if (role !== undefined) {
    url.username = role;
    url.password = password;
  }
  return url.href;
}
