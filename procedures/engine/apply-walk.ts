import type { CompiledProcedure, Exit, Step } from '../document';
import { evaluateResult } from './measure-quantity';
import { noiseTruthsOf, resultsOf } from './quantities';
import { RefusedEvent } from './refusal';
import type { EventOf } from './run-event';
import type { CurrentStep, NamedValue, RunState, WalkedStep } from './run-state';
import { exitsOf, wayOn } from './ways-on';
import { worstOf } from './worst-result';

/** A step is now the current one. Claiming it again supersedes what it gave before. */
export function claimStep(procedure: CompiledProcedure, state: RunState, event: EventOf<'step-claimed'>): RunState {
  const step = requireStep(procedure, event.data.step);
  if (state.current !== undefined && !state.current.isDone && state.current.id !== step.id) {
    throw new RefusedEvent('not-done', `step ${step.number} was claimed before the current one was done`);
  }
  const current: CurrentStep = {
    id: step.id,
    claimedSeq: event.seq,
    claimedAt: event.at,
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
  return {
    ...state,
    current,
    walked: [...state.walked, claim],
    values: without(state.values, step.id),
    truths: without(state.truths, step.id),
    choices: without(state.choices, step.id),
    codes: without(state.codes, step.id),
    series: without(state.series, step.id),
  };
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
  const provenance = { step: step.id, seq: event.seq, at: event.at };
  let next: RunState = {
    ...state,
    current: { ...current, isDone: true },
    truths: { ...state.truths, ...noiseTruths(state, step, event.seq) },
  };
  for (const result of resultsOf(step)) {
    const value = evaluateResult(procedure, next, result, provenance);
    if (value !== undefined) next = { ...next, values: { ...next.values, [value.name]: value } };
  }
  const own = Object.values(next.values).filter((value: NamedValue) => value.step === step.id);
  const result = worstOf(
    own.flatMap((value) => (value.judgement?.result === undefined ? [] : [value.judgement.result])),
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
  const marks = state.series[step.name]?.marks ?? {};
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
  const authored: Exit | undefined = exitsOf(procedure, step).find((candidate) => candidate.exit === exit);
  if (authored === undefined) throw new RefusedEvent('unknown-exit', `step ${step.number} has no exit ${exit}`);
  const heading = authored.verdict ?? state.verdict;
  const target = authored.to === 'verdict' ? heading : authored.to;
  if (to !== target)
    throw new RefusedEvent('unknown-exit', `exit ${exit} of step ${step.number} leads to ${target}, not ${to}`);
  if (verdict !== undefined && verdict !== authored.verdict) {
    throw new RefusedEvent('unknown-exit', `exit ${exit} of step ${step.number} does not head for ${verdict}`);
  }
  const isStop = exit === 'stop';
  if (!isStop && state.current?.id !== stepId && state.overruled !== stepId) {
    throw new RefusedEvent('not-current', `step ${step.number} is not the current one`);
  }
  const expected =
    isStop || exit === 'cannot-measure' || state.overruled === stepId ? undefined : wayOn(procedure, state, step);
  const discrepancies =
    expected === undefined || expected.exit === exit
      ? state.discrepancies
      : [
          ...state.discrepancies,
          { seq: event.seq, what: `way on from step ${step.number}`, recorded: exit, computed: expected.exit },
        ];
  const counted = exit.startsWith('next-') ? `${step.id}/${exit}` : undefined;
  const way = { seq: event.seq, ...event.data };
  const next: RunState = {
    ...state,
    status: isStop ? 'open' : state.status,
    pause: isStop ? undefined : state.pause,
    verdict: heading,
    overruled: undefined,
    discrepancies,
    branchCounts:
      counted === undefined
        ? state.branchCounts
        : { ...state.branchCounts, [counted]: (state.branchCounts[counted] ?? 0) + 1 },
    current: state.current === undefined ? undefined : { ...state.current, isDone: true },
  };
  return amendClaim(next, { way });
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
  return state.current;
}
