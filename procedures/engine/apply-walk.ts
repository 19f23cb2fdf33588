import type { CompiledProcedure, Step } from '../document';
import { calledTruths, calledValues, destinationOf, dueAt, withoutCountsOf } from './called';
import { own } from './environment';
import { evaluateResult } from './measure-quantity';
import { waitsForSomebody } from './waits-for-somebody';
import { endStaleReadings } from './validity';
import { noiseTruthsOf, resultsOf } from './quantities';
import { RefusedEvent } from './refusal';
import type { EventOf } from './run-event';
import type { CurrentStep, NamedValue, RunState, WalkedStep } from './run-state';
import { exitsOf, wayOn, type NamedExit } from './ways-on';
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
  return endStaleReadings(
    procedure,
    {
      ...state,
      current,
      due: undefined,
      walked: [...state.walked, claim],
      values: without(state.values, step.id),
      truths: without(state.truths, step.id),
      choices: without(state.choices, step.id),
      codes: without(state.codes, step.id),
      series: without(state.series, step.id),
      photos: without(state.photos, step.id),
    },
    event,
  );
}

function without<T extends { readonly step: string }>(
  record: Readonly<Record<string, T>>,
  step: string,
): Readonly<Record<string, T>> {
  return Object.fromEntries(Object.entries(record).filter(([, entry]) => entry.step !== step));
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
  let next: RunState = {
    ...state,
    current: { ...current, isDone: true },
    truths: {
      ...state.truths,
      ...noiseTruths(state, step, event.seq),
      ...calledTruths(state, step, event.seq),
    },
  };
  next = endStaleReadings(procedure, next, { ...event, done: step.id });
  for (const value of calledValues(procedure, next, step, event.seq)) {
    next = { ...next, values: { ...next.values, [value.name]: value } };
  }
  for (const result of resultsOf(step)) {
    const value = evaluateResult(procedure, next, result, provenance);
    if (value !== undefined) next = { ...next, values: { ...next.values, [value.name]: value } };
  }
  const given = Object.values(next.values).filter((value: NamedValue) => value.step === step.id);
  const result = worstOf(
    given.flatMap((value) => (value.judgement?.result === undefined ? [] : [value.judgement.result])),
  );
  return amendClaim(next, {
    doneSeq: event.seq,
    doneAt: event.at,
    ...(result === undefined ? {} : { result }),
  });
}

/** The marks of the step's series say whether there was a noise, and whether it stopped. */
function noiseTruths(state: RunState, step: Step, seq: number): RunState['truths'] {
  if (step.kind !== 'listen') return {};
  const marks = own(state.series, step.name)?.marks ?? {};
  const stopped = marks['noise-stops'] !== undefined;
  return Object.fromEntries(
    noiseTruthsOf(step).map((found) => {
      const holds = found.what === 'noise-stopped' ? stopped : stopped || marks['noise-begins'] !== undefined;
      return [found.name, { holds, step: step.id, seq }];
    }),
  );
}

/** The way that was taken. A way that this build would not take is kept and noted as a discrepancy. */
export function takeBranch(procedure: CompiledProcedure, state: RunState, event: EventOf<'branch-taken'>): RunState {
  const { step: stepId, to, exit, verdict } = event.data;
  const step = requireStep(procedure, stepId);
  const authored = exitsOf(procedure, step).find((candidate) => candidate.exit === exit);
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
      : [
          ...state.discrepancies,
          { seq: event.seq, what: `way on from step ${step.number}`, recorded: exit, computed: expected.exit },
        ];
  const counts = step.kind === 'call' ? withoutCountsOf(state.branchCounts, procedure, step.id) : state.branchCounts;
  const counted = exit.startsWith('next-') ? `${step.id}/${exit}` : undefined;
  const next: RunState = {
    ...state,
    status: isStop ? 'open' : state.status,
    pause: isStop ? undefined : state.pause,
    verdict: heading,
    finding: undefined,
    due: target,
    overruled: undefined,
    discrepancies,
    branchCounts: counted === undefined ? counts : { ...counts, [counted]: (counts[counted] ?? 0) + 1 },
    current: state.current === undefined ? undefined : { ...state.current, isDone: true },
  };
  return amendClaim(next, { way: { seq: event.seq, ...event.data } });
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
  const last = state.walked.at(-1);
  return last === undefined ? state : { ...state, walked: [...state.walked.slice(0, -1), { ...last, ...change }] };
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
