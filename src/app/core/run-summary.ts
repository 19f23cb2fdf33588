import type { ProcedureDocument, Step } from '../../../procedures/document';
import type { RunState } from '../../../procedures/engine/showing';
import type { RunSummary } from './stored-rows';

/** What the Bench shows of a run, from its state. Store it with the events that led there. */
export function summariseRun(document: ProcedureDocument, state: RunState): RunSummary {
  const steps = new Map(document.steps.map((step) => [step.id, step]));
  const current = state.current && steps.get(state.current.id);
  return {
    procedureTitle: document.title,
    status: state.status,
    car: state.visit.car,
    repairOrder: state.visit.repairOrder,
    codes: state.visit.codes,
    concern: state.visit.concern,
    personName: state.personName,
    openedAt: state.openedAt,
    current: current && { number: current.number, title: current.title, action: current.action },
    walked: state.walked
      .filter(({ claimedSeq }) => claimedSeq !== state.current?.claimedSeq)
      .map(({ step, result, notMeasured }) => ({
        label: numberOf(steps, step),
        ...(notMeasured === true ? { result: 'not-measured' as const } : result === undefined ? {} : { result }),
      })),
    disturbed: state.disturbed.map(({ label }) => label),
    pause: state.pause && { at: state.pause.at, reason: state.pause.reason },
    verdict: state.finding === undefined ? undefined : steps.get(state.finding)?.title,
    half: state.header.half,
    ...(state.again === undefined ? {} : { again: state.again }),
  };
}

const numberOf = (steps: ReadonlyMap<string, Step>, id: string): string => steps.get(id)?.number ?? id;
