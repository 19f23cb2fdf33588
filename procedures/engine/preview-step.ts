import type { CompiledProcedure, Quantity } from '../document';
import { calledValues } from './called';
import { environmentOf } from './environment';
import { readDecimals } from './instrument-uncertainty';
import { judgeQuantity } from './judge-quantity';
import { evaluateResult } from './measure-quantity';
import { resultsOf } from './quantities';
import type { Judgement, NamedValue, RunState } from './run-state';

/** A quantity's band as the run stands, before there is a value: its ends and where they come from. */
export function previewBand(
  procedure: CompiledProcedure,
  state: RunState,
  quantity: Quantity & { readonly gear?: string },
): Omit<Judgement, 'result'> | undefined {
  const judgement = judgeQuantity(
    procedure,
    quantity,
    { value: 0, uncertainty: 0, decimals: readDecimals(state, quantity) },
    environmentOf(state),
  );
  if (judgement === undefined) return undefined;
  const { result: _ofNothing, ...band } = judgement;
  return band;
}

/** What the current step would compute if it were done now: its results in order, those that can be evaluated. */
export function previewResults(procedure: CompiledProcedure, state: RunState): readonly NamedValue[] {
  const step = state.current === undefined ? undefined : procedure.step(state.current.id);
  if (step === undefined) return [];
  const provenance = { step: step.id, seq: state.seq, at: state.lastAt };
  let known = state;
  return resultsOf(step).flatMap((result) => {
    const value = evaluateResult(procedure, known, result, provenance);
    if (value === undefined) return [];
    known = { ...known, values: { ...known.values, [value.name]: value } };
    return [value];
  });
}

/** What the current step takes over from the procedure that it calls, judged here. Empty where it calls none. */
export function previewTaken(procedure: CompiledProcedure, state: RunState): readonly NamedValue[] {
  const step = state.current === undefined ? undefined : procedure.step(state.current.id);
  return step === undefined ? [] : calledValues(procedure, state, step, state.seq);
}
