import { randomBytes } from 'node:crypto';
import type { DataSource } from 'typeorm';
import { coreBuild } from '../build-identity';
import { ConfigProblem, loadPrepareConfig } from '../config';
import { CompiledProcedures } from '../procedures/procedures.service';
import { rebuildRuns } from '../sync/sync.service';
import { Epoch } from './change-log.entity';
import { createDataSource } from './data-source';
import { databaseSentence } from './database-sentence';

/**
 * Begins a new life of the database: every cursor of before is void, so tablets pull everything and offer again what
 * they hold receipts for. Needed after a restore, when positions are given out a second time.
 */
export async function beginEpoch(database: DataSource, now: Date): Promise<string> {
  const epoch = randomBytes(16).toString('hex');
  await database.getRepository(Epoch).update({ id: 1 }, { epoch, begunAt: now });
  return epoch;
}

async function main(): Promise<void> {
  try {
    const database = await createDataSource(loadPrepareConfig(process.env).ownerUrl, {
      poolSize: 2,
      statementTimeoutMs: 0,
    }).initialize();
    try {
      await beginEpoch(database, new Date());
      const runs = await rebuildRuns(database, new CompiledProcedures(), coreBuild());
      process.stdout.write(`A new epoch has begun, and ${runs} runs were computed anew from their events.\n`);
    } finally {
      await database.destroy();
    }
  } catch (error) {
    if (!(error instanceof Error)) throw error;
    const sentence = error instanceof ConfigProblem ? error.message : databaseSentence(error);
    process.stderr.write(`The restored database can't be taken into use. ${sentence}\n`);
    process.exitCode = 1;
  }
}

if (require.main === module) void main();
