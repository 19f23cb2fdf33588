import { Client } from 'pg';
import { appendOnlyTables } from '../../server/database/append-only';
import { closedRun, continued, openedRun, publishSmallProcedure } from '../support/test-run';
import { TestServer } from '../support/test-server';
import { TestTablet } from '../support/test-tablet';
import { lindqvistId } from '../support/test-run';

let server: TestServer;
let app: Client;
let owner: Client;
let superuser: Client;

beforeAll(async () => {
  server = await TestServer.start();
  const tablet = await TestTablet.enrol(server);
  const version = await publishSmallProcedure(server);
  const opened = openedRun({ device: tablet.id });
  const note = { type: 'margin-note-written', data: { step: 'start', text: 'x' } } as const;
  await tablet.push({ runs: [closedRun({ device: tablet.id })] });
  await tablet.push({ runs: [continued(opened, note, { device: tablet.id, actor: lindqvistId })] });
  const bytes = Buffer.from('evidence');
  const sha256 = (await import('node:crypto')).createHash('sha256').update(bytes).digest('hex');
  await server.ask('PUT', `/api/attachments/${sha256}`, { as: 'okafor', bytes });
  await server.ask('POST', `/api/procedures/small-check/versions/${version}/withdrawal`, {
    as: 'adeyemi',
    json: { reason: 'So that there is one.' },
  });
  app = await connected(server.data.appUrl);
  owner = await connected(server.data.ownerUrl);
  superuser = await connected(server.data.superUrl);
  await owner.query(
    `INSERT INTO discrepancy SELECT run_id, 'main', 1, 'x', 'a', 'b', '1', '2', now() FROM run LIMIT 1`,
  );
});
afterAll(async () => {
  for (const client of [app, owner, superuser]) await client.end();
  await server.stop();
});

async function connected(connectionString: string): Promise<Client> {
  const client = new Client({ connectionString });
  await client.connect();
  return client;
}

async function refusal(client: Client, sql: string): Promise<string> {
  return client.query(sql).then(
    () => 'done',
    (error: { code: string; message: string }) => `${error.code} ${error.message}`,
  );
}

async function columnOf(table: string): Promise<string> {
  const { rows } = await owner.query<{ name: string }>(
    `SELECT column_name AS name FROM information_schema.columns WHERE table_name = $1 ORDER BY ordinal_position LIMIT 1`,
    [table],
  );
  return rows[0]!.name;
}

describe.each(appendOnlyTables.map((table) => [table]))('%s', (table) => {
  it('has a row that could be changed', async () => {
    expect((await owner.query(`SELECT FROM ${table}`)).rowCount).toBeGreaterThan(0);
  });

  it('refuses the serving role every change, for want of the right', async () => {
    const column = await columnOf(table);
    for (const sql of [
      `UPDATE ${table} SET ${column} = ${column}`,
      `UPDATE ${table} SET ${column} = ${column} WHERE false`,
      `DELETE FROM ${table}`,
      `TRUNCATE ${table} CASCADE`,
      `SELECT * FROM ${table} FOR UPDATE`,
      `DROP TABLE ${table} CASCADE`,
      `DROP TRIGGER refuse_change ON ${table}`,
      `DROP TRIGGER refuse_row_change ON ${table}`,
      `ALTER TABLE ${table} DISABLE TRIGGER ALL`,
      `ALTER TABLE ${table} RENAME TO other`,
      `CREATE RULE swallow AS ON INSERT TO ${table} DO INSTEAD NOTHING`,
    ]) {
      expect([sql, await refusal(app, sql)]).toEqual([sql, expect.stringMatching(/^42501 /)]);
    }
  });

  it('refuses even a role that was granted the right by mistake, by its triggers', async () => {
    const column = await columnOf(table);
    await owner.query(`GRANT UPDATE, DELETE, TRUNCATE ON ${table} TO ${server.data.appRole}`);
    for (const sql of [
      `UPDATE ${table} SET ${column} = ${column}`,
      `UPDATE ${table} SET ${column} = ${column} WHERE false`,
      `DELETE FROM ${table}`,
      `DELETE FROM ${table} WHERE false`,
    ]) {
      expect([sql, await refusal(app, sql)]).toEqual([sql, expect.stringMatching(`^42501 ${table} is append-only`)]);
    }
    // What refers to it would be emptied too, and of that the serving role may not empty everything.
    expect(await refusal(app, `TRUNCATE ${table} CASCADE`)).toMatch(/^42501 /);
    expect(await refusal(superuser, `TRUNCATE ${table} CASCADE`)).toMatch(/^42501 \w+ is append-only: TRUNCATE/);
    await owner.query(`REVOKE UPDATE, DELETE, TRUNCATE ON ${table} FROM ${server.data.appRole}`);
  });

  it('lets the owner do what retention needs', async () => {
    await owner.query('BEGIN');
    const { rowCount } = await owner.query(`UPDATE ${table} SET ${await columnOf(table)} = ${await columnOf(table)}`);
    expect(rowCount).toBeGreaterThan(0);
    await owner.query('ROLLBACK');
  });
});

it('gives the serving role no way to switch the triggers off or to make tables', async () => {
  expect(await refusal(app, `SET session_replication_role = replica`)).toMatch(/^42501 /);
  expect(await refusal(app, `CREATE TABLE mine (id integer)`)).toMatch(/^42501 /);
  expect(
    await refusal(
      app,
      `CREATE OR REPLACE FUNCTION refuse_change() RETURNS trigger LANGUAGE plpgsql AS $$ BEGIN RETURN NEW; END $$`,
    ),
  ).toMatch(/^42501 /);
  expect(
    await refusal(app, `SET ROLE ${(await owner.query<{ me: string }>('SELECT current_user AS me')).rows[0]!.me}`),
  ).toMatch(/^42501 /);
});
