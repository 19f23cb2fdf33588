import type { DataSource } from 'typeorm';
import { appendOnlyTables } from './append-only';

interface Named {
  readonly name: string;
}

/** Refuses a database that `prepare` has not brought up to this build, or in which the serving role could change records. */
export async function refuseUnpreparedDatabase(database: DataSource): Promise<void> {
  const [found] = await database.query<{ exists: boolean }[]>(
    `SELECT to_regclass('public.migration') IS NOT NULL AS exists`,
  );
  if (found?.exists !== true) throw notPrepared('it is empty');
  const done = await database.query<Named[]>('SELECT name FROM migration');
  const names = new Set(done.map(({ name }) => name));
  const missing = database.migrations.filter(({ name, constructor }) => !names.has(name ?? constructor.name));
  if (missing.length > 0) throw notPrepared(`${missing.length} migrations have not been run`);
  const changeable = await database.query<Named[]>(
    `SELECT name FROM unnest($1::text[]) AS name WHERE has_table_privilege(name, 'UPDATE, DELETE, TRUNCATE')`,
    [appendOnlyTables],
  );
  if (changeable.length > 0) {
    throw new Error(
      `The role of DATABASE_URL could change records (${changeable.map(({ name }) => name).join(', ')}): ` +
        'serve with a role of its own that owns nothing, and run prepare again.',
    );
  }
}

function notPrepared(why: string): Error {
  return new Error(`The database is not prepared (${why}): run prepare with DATABASE_OWNER_URL set.`);
}
