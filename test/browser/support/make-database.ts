import { randomBytes } from 'node:crypto';
import { Client } from 'pg';

/** A fresh database with the two roles that the product wants, in the tests' own PostgreSQL. */
export interface FreshDatabase {
  /** The role that owns the database and its tables. */
  readonly ownerUrl: string;
  /** The role that serves: it is granted what the migrations grant, nothing else. */
  readonly appUrl: string;
  drop(): Promise<void>;
}

/** Makes one in the PostgreSQL that BAYHAND_TEST_DATABASE_URL (a superuser's URL) leads to. */
export async function makeDatabase(): Promise<FreshDatabase> {
  const superUrl = process.env['BAYHAND_TEST_DATABASE_URL'];
  if (!superUrl) throw new Error('BAYHAND_TEST_DATABASE_URL is not set: run this through npm test or npm run browser.');
  // Roles belong to the whole cluster: names of their own keep side-by-side workers apart.
  const name = `browser_${randomBytes(6).toString('hex')}`;
  const password = randomBytes(16).toString('hex');
  await asSuperuser(superUrl, [
    `CREATE ROLE ${name}_owner LOGIN PASSWORD '${password}'`,
    `CREATE ROLE ${name}_app LOGIN PASSWORD '${password}'`,
    `CREATE DATABASE ${name} OWNER ${name}_owner TEMPLATE template0`,
  ]);
  const urlAs = (role: string) => {
    const url = new URL(superUrl);
    url.username = role;
    url.password = password;
    url.pathname = name;
    return url.href;
  };
  return {
    ownerUrl: urlAs(`${name}_owner`),
    appUrl: urlAs(`${name}_app`),
    drop: () =>
      asSuperuser(superUrl, [`DROP DATABASE ${name} WITH (FORCE)`, `DROP ROLE ${name}_app`, `DROP ROLE ${name}_owner`]),
  };
}

async function asSuperuser(url: string, statements: readonly string[]): Promise<void> {
  const client = new Client({ connectionString: url });
  await client.connect();
  try {
    for (const statement of statements) await client.query(statement);
  } finally {
    await client.end();
  }
}
