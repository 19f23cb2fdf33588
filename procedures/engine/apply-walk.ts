import type { CompiledProcedure, Step } from '../document';
import { calledTruths, calledValues, destinationOf, dueAt, withoutCountsOf } from './called';
import { own } from './environment';
import { evaluateResult } from './measure-quantity';
import { waitsForSomebody } from './waits-for-somebody';
import { endStaleReadings } from './validity';
import { noiseTruthsOf, resultsOf } from './quantities';
import { RefusedEvent } from './refusal';
import type { EventOf } from './run-event';
import type { CurrentStep, RunState, WalkedStep } from './run-state';
import { added, countedUp, draftOf, entriesOfStep, lastChanged, withEntry, withoutStep } from './state-changes';
import { exitNamed, wayOn, type NamedExit } from './ways-on';
import { worstOf } from './worst-result';

/** A step is now the current one. Claiming it again supersedes what it gave before. */
export function claimStep(procedure: CompiledProcedure, state: RunState, event: EventOf<'step-claimed'>): RunState {
  const step = requireStep(procedure, event.data.step);
  const isAgain = state.current?.id === step.id && !state.current.isDone;
  if (step.id !== state.due && !isAgain) {
    throw new RefusedEvent('not-due', `step ${step.number} was claimed, to which no way led`);
  }
  if (step.kind === 'finding') throw new RefusedEvent('not-due', 'a finding is reached, not claimed');
  const current: CurrentStep = {
    id: step.id,
    claimedSeq: event.seq,
    claimedAt: event.at,
    claimedBy: event.actor,
    acknowledged: [],
    takes: {},
    timer: undefined,
    isDone: false,
  };
  const claim: WalkedStep = {
    step: step.id,
    claimedSeq: event.seq,
    claimedAt: event.at,
    ...(state.verdict === undefined ? {} : { verdictBefore: state.verdict }),
  };
  const next = draftOf(state);
  next.current = current;
  next.due = undefined;
  next.walked = added(state.walked, claim);
  next.values = withoutStep(state.values, step.id);
  next.truths = withoutStep(state.truths, step.id);
  next.choices = withoutStep(state.choices, step.id);
  next.codes = withoutStep(state.codes, step.id);
  next.series = withoutStep(state.series, step.id);
  next.photos = withoutStep(state.photos, step.id);
  return endStaleReadings(procedure, next, event);
}

/** The step's action is done: its results follow, and what was judged in it makes its bead. */
export function finishStep(procedure: CompiledProcedure, state: RunState, event: EventOf<'step-done'>): RunState {
  const current = requireCurrent(state, event.data.step);
  const step = requireStep(procedure, current.id);
  if (step.kind === 'restore' && dueAt(procedure, state, step.id).length > 0) {
    throw new RefusedEvent('still-disturbed', 'something disturbed is not put back yet');
  }
  const waits = waitsForSomebody(step, current);
  if (waits !== undefined) throw new RefusedEvent('not-done', `step ${step.number} still waits for its ${waits}`);
  const provenance = { step: step.id, seq: event.seq, at: event.at };
  const done = draftOf(state);
  done.current = { ...current, isDone: true };
  done.truths = withNoiseTruths(state, step, event.seq);
  for (const [name, truth] of Object.entries(calledTruths(state, step, event.seq))) {
    done.truths = withEntry(done.truths, name, truth);
  }
  const next = draftOf(endStaleReadings(procedure, done, { seq: event.seq, at: event.at, done: step.id }));
  for (const value of calledValues(procedure, next, step, event.seq)) {
    next.values = withEntry(next.values, value.name, value);
  }
  for (const result of resultsOf(step)) {
    const value = evaluateResult(procedure, next, result, provenance);
    if (value !== undefined) next.values = withEntry(next.values, value.name, value);
  }
  const result = worstOf(
    entriesOfStep(next.values, step.id).flatMap(({ judgement }) =>
      judgement?.result === undefined ? [] : [judgement.result],
    ),
  );
  next.walked = lastChanged(next.walked, (claim) => {
    claim.doneSeq = event.seq;
    claim.doneAt = event.at;
    if (step.kind === 'hold' && current.timer?.ended === true && current.timer.certain)
      claim.heldSeconds = current.timer.seconds;
    if (result !== undefined) claim.result = result;
  });
  return next;
}

/** The marks of the step's series say whether there was a noise, and whether it stopped. */
function withNoiseTruths(state: RunState, step: Step, seq: number): RunState['truths'] {
  if (step.kind !== 'listen') return state.truths;
  const marks = own(state.series, step.name)?.marks ?? {};
  const stopped = marks['noise-stops'] !== undefined;
  return noiseTruthsOf(step).reduce((truths, found) => {
    const holds = found.what === 'noise-stopped' ? stopped : stopped || marks['noise-begins'] !== undefined;
    return withEntry(truths, found.name, { holds, step: step.id, seq });
  }, state.truths);
}

/** The way that was taken. A way that this build would not take is kept and noted as a discrepancy. */
export function takeBranch(procedure: CompiledProcedure, state: RunState, event: EventOf<'branch-taken'>): RunState {
  const { step: stepId, to, exit, verdict } = event.data;
  const step = requireStep(procedure, stepId);
  const authored = exitNamed(procedure, step, exit);
  if (authored === undefined) throw new RefusedEvent('unknown-exit', `step ${step.number} has no exit ${exit}`);
  requirePlaceForWay(state, step, authored);
  const { to: target, heading } = destinationOf(procedure, state, step, authored);
  if (target === undefined || to !== target) {
    const leads = target ?? 'no finding yet';
    throw new RefusedEvent('unknown-exit', `exit ${exit} of step ${step.number} leads to ${leads}, not ${to}`);
  }
  requireStep(procedure, target);
  if (verdict !== undefined && verdict !== authored.verdict) {
    throw new RefusedEvent('unknown-exit', `exit ${exit} of step ${step.number} does not head for ${verdict}`);
  }
  const isStop = exit === 'stop';
  const expected =
    isStop || exit === 'cannot-measure' || state.overruled === stepId ? undefined : wayOn(procedure, state, step);
  const discrepancies =
    expected === undefined || expected.exit === exit
      ? state.discrepancies
      : added(state.discrepancies, {
          seq: event.seq,
          what: `way on from step ${step.number}`,
          recorded: exit,
          computed: expected.exit,
        });
  const way = { seq: event.seq, ...event.data };
  const next = draftOf(state);
  if (isStop) {
    next.status = 'open';
    next.pause = undefined;
  }
  next.verdict = heading;
  next.finding = undefined;
  next.due = target;
  next.overruled = undefined;
  next.discrepancies = discrepancies;
  if (step.kind === 'call') next.branchCounts = withoutCountsOf(state.branchCounts, procedure, step.id);
  if (exit.startsWith('next-')) next.branchCounts = countedUp(next.branchCounts, `${step.id}/${exit}`);
  if (state.current?.isDone === false) next.current = { ...state.current, isDone: true };
  next.walked = lastChanged(state.walked, (claim) => {
    claim.way = way;
  });
  return next;
}

/** A way is taken once from the step that is done, from the one overruled, or out of a stop; a bound is a bound. */
function requirePlaceForWay(state: RunState, step: Step, { exit, atMost }: NamedExit): void {
  if (exit === 'stop') {
    if (state.status !== 'stopped')
      throw new RefusedEvent('not-open', 'the run is not stopped: no way leads out of it');
    if (state.walked.at(-1)?.step !== step.id) {
      throw new RefusedEvent('not-current', `the run was not stopped at step ${step.number}`);
    }
    return;
  }
  if (atMost !== undefined && (own(state.branchCounts, `${step.id}/${exit}`) ?? 0) >= atMost) {
    throw new RefusedEvent('unknown-exit', `exit ${exit} of step ${step.number} was taken ${atMost} times already`);
  }
  if (state.overruled === step.id) return;
  if (state.current?.id !== step.id || state.due !== undefined) {
    throw new RefusedEvent('not-current', `step ${step.number} is not the current one`);
  }
  if (!state.current.isDone) throw new RefusedEvent('not-done', `step ${step.number} is not done yet`);
}

/** Changes the newest claim. */
export function amendClaim(state: RunState, change: Partial<WalkedStep>): RunState {
  return { ...state, walked: lastChanged(state.walked, (claim) => Object.assign(claim, change)) };
}

export function requireStep(procedure: CompiledProcedure, id: string): Step {
  const step = procedure.step(id);
  if (step === undefined) throw new RefusedEvent('unknown-step', `the procedure has no step ${id}`);
  return step;
}

export function requireCurrent(state: RunState, id: string): CurrentStep {
  if (state.current?.id !== id) throw new RefusedEvent('not-current', `step ${id} is not the current one`);
  if (state.current.isDone) throw new RefusedEvent('not-current', `step ${id} is done already`);
  return state.current;
}
