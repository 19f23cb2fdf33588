import { ConfigProblem, loadPrepareConfig, type PrepareConfig } from '../config';
import { createDataSource } from './data-source';
import { seedDemo } from './demo/seed-demo';
import { seedLibrary } from './demo/seed-library';
import { grantToApp } from './grants';
import { databaseSentence } from './database-sentence';

/** Any number that no other advisory lock of ours has. */
const prepareLock = 4_310_002;

/** What `prepare` did. */
export interface Prepared {
  readonly migrated: readonly string[];
  readonly isSeeded: boolean;
  readonly publishedProcedures: readonly string[];
}

/** Brings the database to what this build needs, as its owner; gives the serving role its rights; seeds the demo once. */
export async function prepare(config: PrepareConfig, now: Date): Promise<Prepared> {
  const database = createDataSource(config.ownerUrl, { poolSize: 3, statementTimeoutMs: 0 });
  await database.initialize();
  // Two that prepare at once would both run the same migrations: the second waits for the first.
  const lock = database.createQueryRunner();
  try {
    await lock.query('SELECT pg_advisory_lock($1)', [prepareLock]);
    const migrated = await database.runMigrations();
    await grantToApp(database, config.appRole);
    const isSeeded = config.isDemo && (await seedDemo(database, now));
    const publishedProcedures = config.isDemo ? await seedLibrary(database, now) : [];
    return { migrated: migrated.map(({ name }) => name), isSeeded, publishedProcedures };
  } finally {
    // Ending the connection gives the lock back.
    await lock.release();
    await database.destroy();
  }
}

async function main(): Promise<void> {
  try {
    const { migrated, isSeeded, publishedProcedures } = await prepare(loadPrepareConfig(process.env), new Date());
    process.stdout.write(
      `The database is ready: ${migrated.length} migrations run, demo ${isSeeded ? 'seeded' : 'not seeded'}, ` +
        `${publishedProcedures.length} procedures published.\n`,
    );
  } catch (error) {
    if (!(error instanceof Error)) throw error;
    const sentence = error instanceof ConfigProblem ? error.message : databaseSentence(error);
    process.stderr.write(`The database can't be prepared. ${sentence}\n`);
    process.exitCode = 1;
  }
}

if (require.main === module) void main();
