import type { CompiledProcedure } from '../document';
import { isSeriesStep } from '../document/step-parts';
import { dropLastTake } from './apply-readings';
import { requireCurrent, requireStep } from './apply-walk';
import { RefusedEvent } from './refusal';
import type { EventOf } from './run-event';
import type { RunState } from './run-state';
import { added, changedFrom, withoutStep } from './state-changes';

export function overrule(procedure: CompiledProcedure, state: RunState, event: EventOf<'branch-overruled'>): RunState {
  requireStep(procedure, event.data.step);
  const at = state.walked.findLastIndex((claim) => claim.step === event.data.step && claim.way !== undefined);
  if (at < 0) throw new RefusedEvent('not-done', 'no way was taken from that step');
  const overruled = state.walked[at];
  const walked = changedFrom(state.walked, at + 1, (claim) => ({ ...claim, isLeft: true }));
  return {
    ...state,
    walked:
      overruled === undefined ? walked : added(walked, { ...overruled, claimedSeq: event.seq, claimedAt: event.at }),
    overruled: event.data.step,
    verdict: overruled?.verdictBefore,
    finding: undefined,
    current: undefined,
    due: undefined,
  };
}

export function redo(procedure: CompiledProcedure, state: RunState, event: EventOf<'step-redone'>): RunState {
  const step = requireStep(procedure, event.data.step);
  if (step.kind === 'finding') throw new RefusedEvent('not-done', 'a finding is reached, not taken again');
  const at = state.walked.findLastIndex((claim) => claim.step === event.data.step);
  const earlier = state.walked[at];
  if (earlier === undefined) throw new RefusedEvent('not-done', 'that step was never walked');
  return {
    ...state,
    walked: changedFrom(state.walked, state.walked.length - 1, (claim) =>
      claim.doneSeq === undefined ? { ...claim, isLeft: true } : claim,
    ),
    verdict: earlier.verdictBefore,
    finding: undefined,
    current: undefined,
    due: step.id,
    overruled: undefined,
  };
}

export function exceedLimit(procedure: CompiledProcedure, state: RunState, event: EventOf<'limit-exceeded'>): RunState {
  const limit = procedure.document.limits.find((candidate) => candidate.id === event.data.limit);
  if (limit === undefined) throw new RefusedEvent('unknown-name', `the procedure has no limit ${event.data.limit}`);
  const { step: stepId, name, figure } = event.data;
  requireCurrent(state, stepId);
  const alarm = { seq: event.seq, step: stepId, limit: limit.id, name, figure, says: limit.says, then: limit.then };
  return {
    ...(isSeriesStep(requireStep(procedure, stepId)) ? withoutRamp(state, stepId) : dropLastTake(state, name)),
    alarm,
    exceeded: added(state.exceeded, alarm),
  };
}

/** A ramp that went over a limit is evidence, but nothing of it counts, neither point nor mark: it is taken again. */
function withoutRamp(state: RunState, stepId: string): RunState {
  const current = requireCurrent(state, stepId);
  return { ...state, series: withoutStep(state.series, stepId), current: { ...current, takes: {} } };
}

export function reachFinding(
  procedure: CompiledProcedure,
  state: RunState,
  event: EventOf<'finding-reached'>,
): RunState {
  const finding = requireStep(procedure, event.data.finding);
  if (finding.kind !== 'finding') throw new RefusedEvent('unknown-step', `step ${finding.number} is no finding`);
  if (state.due !== finding.id) throw new RefusedEvent('not-due', `no way led to the finding ${finding.id}`);
  const claim = {
    step: finding.id,
    claimedSeq: event.seq,
    claimedAt: event.at,
    doneSeq: event.seq,
    doneAt: event.at,
    result: finding.result,
  };
  return {
    ...state,
    current: undefined,
    due: undefined,
    verdict: finding.id,
    finding: finding.id,
    walked: added(state.walked, claim),
  };
}
