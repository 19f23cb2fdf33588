import { createDataSource } from '../../server/database/data-source';
import { migrations } from '../../server/database/migrations/migrations';
import { prepare } from '../../server/database/prepare';
import { refuseUnpreparedDatabase } from '../../server/database/readiness';
import { createEmptyDatabase, createTestDatabase, type TestDatabase } from '../support/test-database';

const now = new Date('2026-11-12T08:00:00Z');
let data: TestDatabase;

beforeEach(async () => {
  data = await createEmptyDatabase();
});
afterEach(() => data.drop());

async function withOwner<T>(work: (owner: ReturnType<typeof createDataSource>) => Promise<T>): Promise<T> {
  const owner = await createDataSource(data.ownerUrl).initialize();
  try {
    return await work(owner);
  } finally {
    await owner.destroy();
  }
}

/** Every column, constraint, index and trigger of the database, as PostgreSQL itself says them. */
async function schema(owner: ReturnType<typeof createDataSource>): Promise<unknown> {
  return {
    columns: await owner.query(
      `SELECT table_name, column_name, data_type, is_nullable, column_default FROM information_schema.columns
       WHERE table_schema = 'public' AND table_name <> 'migration' ORDER BY 1, 2`,
    ),
    constraints: await owner.query(
      `SELECT conrelid::regclass::text AS of, pg_get_constraintdef(oid) AS says FROM pg_constraint
       WHERE connamespace = 'public'::regnamespace AND conrelid::regclass::text <> 'migration' ORDER BY 1, 2`,
    ),
    indexes: await owner.query(`SELECT indexdef FROM pg_indexes WHERE schemaname = 'public' ORDER BY 1`),
    triggers: await owner.query(
      'SELECT pg_get_triggerdef(oid) AS says FROM pg_trigger WHERE NOT tgisinternal ORDER BY 1',
    ),
  };
}

it('migrates an empty database all the way up, and a second time does nothing', async () => {
  const config = { ownerUrl: data.ownerUrl, appRole: data.appRole, isDemo: true };
  const first = await prepare(config, now);
  expect(first.migrated).toEqual(migrations.map(({ name }) => name));
  expect(first.isSeeded).toBe(true);
  expect(first.publishedProcedures).toContain('crankcase-valve-seal');
  expect(await prepare(config, now)).toEqual({ migrated: [], isSeeded: false, publishedProcedures: [] });
});

it('lets two that prepare at the same time follow each other', async () => {
  const config = { ownerUrl: data.ownerUrl, appRole: data.appRole, isDemo: true };
  const done = await Promise.all([prepare(config, now), prepare(config, now)]);
  expect(done.map(({ migrated }) => migrated.length).sort()).toEqual([0, migrations.length]);
  expect(done.filter(({ isSeeded }) => isSeeded)).toHaveLength(1);
});

it('seeds nothing outside of the demo', async () => {
  const done = await prepare({ ownerUrl: data.ownerUrl, appRole: data.appRole, isDemo: false }, now);
  expect(done).toMatchObject({ isSeeded: false, publishedProcedures: [] });
  await withOwner(async (owner) => {
    expect(await owner.query('SELECT count(*)::int AS people FROM person')).toEqual([{ people: 0 }]);
  });
});

it('agrees with the entities: nothing is left to change', async () => {
  await withOwner(async (owner) => {
    await owner.runMigrations();
    const { upQueries } = await owner.driver.createSchemaBuilder().log();
    expect(upQueries.map(({ query }) => query)).toEqual([]);
  });
});

it('would notice a drift', async () => {
  await withOwner(async (owner) => {
    await owner.runMigrations();
    await owner.query('ALTER TABLE visit DROP COLUMN changed_at');
    const { upQueries } = await owner.driver.createSchemaBuilder().log();
    expect(upQueries).not.toEqual([]);
  });
});

it('gives every table a primary key', async () => {
  await withOwner(async (owner) => {
    await owner.runMigrations();
    const without = await owner.query(
      `SELECT relname FROM pg_class WHERE relnamespace = 'public'::regnamespace AND relkind = 'r'
       AND NOT EXISTS (SELECT FROM pg_constraint WHERE conrelid = pg_class.oid AND contype = 'p')`,
    );
    expect(without).toEqual([]);
  });
});

it('goes down again step by step to nothing, and up to the same', async () => {
  await withOwner(async (owner) => {
    await owner.runMigrations();
    const before = await schema(owner);
    for (let left = migrations.length; left > 0; left -= 1) await owner.undoLastMigration();
    const left = await owner.query(
      `SELECT tablename FROM pg_tables WHERE schemaname = 'public' AND tablename <> 'migration'`,
    );
    expect(left).toEqual([]);
    await owner.runMigrations();
    expect(await schema(owner)).toEqual(before);
  });
});

describe('the check before serving', () => {
  it('takes a prepared database', async () => {
    const prepared = await createTestDatabase();
    const app = await createDataSource(prepared.appUrl).initialize();
    await expect(refuseUnpreparedDatabase(app)).resolves.toBeUndefined();
    await app.destroy();
    await prepared.drop();
  });

  it('refuses an empty one, one that is behind, and a role that could change records', async () => {
    await withOwner((owner) => expect(refuseUnpreparedDatabase(owner)).rejects.toThrow(/not prepared \(it is empty\)/));
    await prepare({ ownerUrl: data.ownerUrl, appRole: data.appRole, isDemo: false }, now);
    await withOwner(async (owner) => {
      await expect(refuseUnpreparedDatabase(owner)).rejects.toThrow(/could change records \(run_event, /);
      await owner.query(`DELETE FROM migration WHERE name = $1`, [migrations.at(-1)!.name]);
    });
    const app = await createDataSource(data.appUrl).initialize();
    await expect(refuseUnpreparedDatabase(app)).rejects.toThrow(/1 migrations have not been run/);
    await app.destroy();
  });
});

it('says in a sentence what is wrong when it can not prepare', async () => {
  const { databaseSentence } = await import('../../server/database/database-sentence');
  const wrongs: readonly [string, string, RegExp][] = [
    [data.ownerUrl.replace(data.name, 'no_such_database'), data.appRole, /no database of that name/],
    [data.ownerUrl.replace('only-for-tests', 'wrong'), data.appRole, /refuses the role or its password/],
    [data.ownerUrl, 'no_such_role', /create the role that DATABASE_URL names/],
    ['postgres://a:b@127.0.0.1:1/x', data.appRole, /does not answer/],
  ];
  for (const [ownerUrl, appRole, says] of wrongs) {
    const failure = await prepare({ ownerUrl, appRole, isDemo: false }, now).catch((error: Error) => error);
    expect(databaseSentence(failure as Error)).toMatch(says);
    expect(databaseSentence(failure as Error)).not.toContain('only-for-tests');
  }
});
