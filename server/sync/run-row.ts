import type { EntityManager } from 'typeorm';
import type { CompiledProcedure } from '../../procedures/document';
import { canonicalJson, type RunEvent, type RunHeader, type RunState } from '../../procedures/engine';
import { projectRun } from './run-projection';
import { Run } from './sync.entity';

/** Makes the run's row, its projection still empty, unless it is there. Waits for another push of the same run. */
export async function insertRun(manager: EntityManager, header: RunHeader, title: string, at: Date): Promise<boolean> {
  const made: unknown[] = await manager.query(
    `INSERT INTO run (run_id, header, procedure_id, version, procedure_title, site_id, visit_id, received_at,
       status, repair_order, car, vin, person_name, opened_at, searched)
     VALUES ($1, $2, $3, $4, $5, $6, $7, $8, 'open', '', '', '', '', 0, '')
     ON CONFLICT (run_id) DO NOTHING RETURNING run_id`,
    [header.runId, canonicalJson(header), header.procedureId, header.version, title, header.siteId, header.visitId, at],
  );
  return made.length > 0;
}

/**
 * Brings the run's projection up to a state, by the events since the last time (`isWhole`: since its beginning). Gives
 * whether it is changed for those who are told of the run on other tablets.
 */
export async function updateRun(
  manager: EntityManager,
  procedure: CompiledProcedure,
  state: RunState,
  events: readonly RunEvent[],
  isWhole: boolean,
): Promise<boolean> {
  const { runId } = state.header;
  const before = isWhole
    ? null
    : await manager.findOne(Run, { select: { status: true, verdict: true, closedAt: true }, where: { runId } });
  const after = projectRun(procedure, state, events, before ?? undefined);
  await manager.update(Run, { runId }, after);
  return before?.status !== after.status || before.verdict !== after.verdict;
}
