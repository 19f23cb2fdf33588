import type { DataSource, EntityManager } from 'typeorm';
import { replay, type RunHeader } from '../../procedures/engine';
import { publishedVersion, type CompiledProcedures } from '../procedures/procedures.service';
import { mainBranch } from './event-place';
import { updateRun } from './run-row';
import { RunRows } from './run-rows';

/** Computes the projections of all runs anew from their events, each in a transaction of its own. Gives their number. */
export async function rebuildRuns(database: DataSource, compiled: CompiledProcedures, build: string): Promise<number> {
  const runs = await database.query<{ run_id: string }[]>('SELECT run_id FROM run ORDER BY run_id');
  for (const { run_id: runId } of runs) {
    await database.transaction((manager) => rebuildRun(manager, compiled, build, runId));
  }
  return runs.length;
}

async function rebuildRun(
  manager: EntityManager,
  compiled: CompiledProcedures,
  build: string,
  runId: string,
): Promise<void> {
  const rows = new RunRows(manager, runId);
  const text = await rows.lockedHeader();
  if (text === undefined) return;
  const header = JSON.parse(text) as RunHeader;
  const version = await publishedVersion(manager, compiled, header);
  if (version === undefined) throw new Error(`run ${runId} has no procedure`);
  const branches = await rows.branches();
  for (const ends of branches) {
    const events = await rows.lineage(branches, ends.branch, ends.headSeq);
    const result = replay(version.procedure, header, events);
    if (!result.ok) throw new Error(`run ${runId}, branch ${ends.branch}: ${result.refusal.what}`);
    await rows.putBranch(ends, result.state, build);
    if (ends.branch === mainBranch) await updateRun(manager, version.procedure, result.state, events, true);
  }
}
