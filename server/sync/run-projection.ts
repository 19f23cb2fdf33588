import type { CompiledProcedure } from '../../procedures/document';
import type { RunEvent, RunState } from '../../procedures/engine';
import { withoutNul } from '../http/plain-text';
import type { Run } from './sync.entity';

/** The columns of a run that its events give. */
export type RunProjection = Pick<
  Run,
  | 'status'
  | 'repairOrder'
  | 'car'
  | 'vin'
  | 'personName'
  | 'openedAt'
  | 'closedAt'
  | 'finding'
  | 'verdict'
  | 'result'
  | 'searched'
>;

/**
 * What the list of records shows of a run. Follows from the state and the events since the projection before (all of
 * them when there is none).
 */
export function projectRun(
  procedure: CompiledProcedure,
  state: RunState,
  events: readonly RunEvent[],
  before: Pick<RunProjection, 'verdict' | 'closedAt'> | undefined,
): RunProjection {
  const { visit, personName } = state;
  const closedAt = closingOf(events) ?? before?.closedAt ?? null;
  const verdict = verdictOf(events) ?? before?.verdict ?? null;
  const step = state.finding === undefined ? undefined : procedure.step(state.finding);
  const shown = {
    repairOrder: withoutNul(visit.repairOrder),
    car: withoutNul(visit.car),
    vin: withoutNul(visit.vin),
    personName: withoutNul(personName),
    verdict: state.finding === undefined ? null : verdict,
  };
  return {
    ...shown,
    status: state.status,
    openedAt: String(state.openedAt),
    closedAt: state.status === 'closed' || state.status === 'signed' ? closedAt : null,
    finding: state.finding ?? null,
    result: step?.kind === 'finding' ? step.result : null,
    searched: [
      procedure.document.title,
      `RO ${shown.repairOrder}`,
      shown.car,
      shown.vin,
      shown.personName,
      shown.verdict ?? '',
      withoutNul(visit.concern),
    ]
      .join(' \n ')
      .toLowerCase(),
  };
}

function closingOf(events: readonly RunEvent[]): string | undefined {
  const closed = events.findLast(({ type }) => type === 'closed');
  return closed === undefined ? undefined : String(closed.at);
}

function verdictOf(events: readonly RunEvent[]): string | undefined {
  const reached = events.findLast((event) => event.type === 'finding-reached');
  return reached?.type === 'finding-reached' ? withoutNul(reached.data.verdict) : undefined;
}
