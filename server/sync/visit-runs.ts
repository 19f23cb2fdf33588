import { In, MoreThan, type EntityManager } from 'typeorm';
import type { RunEvent, RunHeader } from '../../procedures/engine';
import { Tablet } from '../access/access.entity';
import { mainBranch } from './event-place';
import { Run } from './sync.entity';
import type { VisitRun } from './sync.dto';

/** Runs that came longer ago are no longer told to tablets: nobody begins the same half of such a visit again. */
const toldForMs = 30 * 24 * 3_600_000;

/** The runs that tablets are told of, so that nobody begins a half twice unknowingly; or those of these ids. */
export async function runsForPull(
  manager: EntityManager,
  now: Date,
  ids?: readonly string[],
): Promise<readonly VisitRun[]> {
  if (ids?.length === 0) return [];
  const where =
    ids === undefined ? { receivedAt: MoreThan(new Date(now.getTime() - toldForMs)) } : { runId: In([...ids]) };
  return told(manager, await manager.find(Run, { where, order: { runId: 'ASC' } }));
}

/** The runs of the same half of the same visit (of the whole procedure where it is no pair), the first begun first. */
export async function runsOfSameHalf(manager: EntityManager, header: RunHeader): Promise<readonly VisitRun[]> {
  const { visitId, procedureId, half } = header;
  const runs = await manager.find(Run, { where: { visitId, procedureId }, order: { openedAt: 'ASC', runId: 'ASC' } });
  return (await told(manager, runs)).filter((run) => run.half === half);
}

async function told(manager: EntityManager, runs: readonly Run[]): Promise<VisitRun[]> {
  const firsts = await manager.query<{ run_id: string; event: string }[]>(
    'SELECT run_id, event FROM run_event WHERE branch = $1 AND seq = 1 AND run_id = ANY($2::uuid[])',
    [mainBranch, runs.map(({ runId }) => runId)],
  );
  const opened = new Map(firsts.map(({ run_id: runId, event }) => [runId, JSON.parse(event) as RunEvent]));
  const tablets = await manager.find(Tablet, { select: { id: true, label: true } });
  return runs.map((run) => {
    const { half, pairId } = JSON.parse(run.header) as RunHeader;
    const first = opened.get(run.runId);
    const tabletLabel = tablets.find(({ id }) => id === first?.device)?.label;
    const again = first?.type === 'opened' ? first.data.again : undefined;
    return {
      runId: run.runId,
      visitId: run.visitId,
      procedureId: run.procedureId,
      procedureTitle: run.procedureTitle,
      personName: run.personName,
      openedAt: Number(run.openedAt),
      status: run.status,
      ...(half === undefined ? {} : { half }),
      ...(pairId === undefined ? {} : { pairId }),
      ...(tabletLabel === undefined ? {} : { tabletLabel }),
      ...(run.verdict === null ? {} : { verdict: run.verdict }),
      ...(run.result === null ? {} : { result: run.result }),
      ...(again === undefined ? {} : { again }),
    };
  });
}
