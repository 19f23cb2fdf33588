import type { CompiledProcedure, Exit, Step } from '../document';
import { environmentOf, own } from './environment';
import { decimalsOf } from './figures';
import { judgeQuantity } from './judge-quantity';
import type { NamedTruth, NamedValue, RunState } from './run-state';

/** Where an exit leads, and the finding that the run then heads for. */
export interface Destination {
  readonly to: string | undefined;
  readonly heading: string | undefined;
}

/**
 * Follows an exit. A finding of a called procedure is not the run's: it leads to the step that called, where its name
 * is still the one that was headed for. Leaving that step, the run heads again for what it did before the call.
 */
export function destinationOf(procedure: CompiledProcedure, state: RunState, step: Step, exit: Exit): Destination {
  const named = exit.verdict ?? headingFrom(procedure, state, step);
  const to = exit.to === 'verdict' ? named : exit.to;
  const block = to === undefined ? undefined : procedure.blockOf(to);
  const isCalledFinding = to !== undefined && block !== undefined && procedure.step(to)?.kind === 'finding';
  return isCalledFinding ? { to: block.call, heading: to } : { to, heading: named };
}

/** The finding that the run heads for on leaving a step that names none itself. */
export function headingFrom(procedure: CompiledProcedure, state: RunState, step: Step): string | undefined {
  return step.kind === 'call' ? headingBeforeCall(procedure, state, step.id) : state.verdict;
}

function headingBeforeCall(procedure: CompiledProcedure, state: RunState, call: string): string | undefined {
  // From the newest back: a call that was just gone through is near the end.
  for (let index = state.walked.length - 1; index >= 0; index -= 1) {
    const claim = state.walked[index];
    if (claim === undefined || claim.step === call) continue;
    if (procedure.blockOf(claim.step)?.call === call && isFirst(procedure, claim.step)) return claim.verdictBefore;
  }
  return state.verdict;
}

function isFirst(procedure: CompiledProcedure, step: string): boolean {
  return procedure.blockOf(step)?.first === step;
}

/** What a finished call gives: the results that are taken over, judged here, and which of its findings it came to. */
export function calledValues(
  procedure: CompiledProcedure,
  state: RunState,
  step: Step,
  seq: number,
): readonly NamedValue[] {
  if (step.kind !== 'call') return [];
  return step.takes.flatMap(({ from, name, label, band, unit, sense }): NamedValue[] => {
    const there = own(state.values, from);
    if (there === undefined) return [];
    const { judgement: _judgedThere, ...rest } = there;
    const value: NamedValue = { ...rest, name, label, step: step.id, seq };
    const quantity = {
      name,
      label,
      unit,
      ...(sense === undefined ? {} : { sense }),
      ...(band === undefined ? {} : { band }),
    };
    const environment = environmentOf(state, value);
    const judgement = judgeQuantity(
      procedure,
      quantity,
      { value: value.value, uncertainty: value.uncertainty, decimals: decimalsOf(value.text) },
      environment,
    );
    return [judgement === undefined ? value : { ...value, judgement }];
  });
}

export function calledTruths(state: RunState, step: Step, seq: number): Readonly<Record<string, NamedTruth>> {
  if (step.kind !== 'call') return {};
  return Object.fromEntries(
    step.finds.map(({ finding, name }) => [name, { holds: state.verdict === finding, step: step.id, seq }]),
  );
}

/** A block that is left may be gone through again: its bounds count anew. */
export function withoutCountsOf(
  counts: RunState['branchCounts'],
  procedure: CompiledProcedure,
  call: string,
): RunState['branchCounts'] {
  return Object.fromEntries(
    Object.entries(counts).filter(([key]) => !isInCall(procedure, key.slice(0, key.lastIndexOf('/')), call)),
  );
}

/** Whether a step belongs to what a call step calls, at any depth. */
function isInCall(procedure: CompiledProcedure, step: string, call: string): boolean {
  for (let block = procedure.blockOf(step); block !== undefined; block = procedure.blockOf(block.call)) {
    if (block.call === call) return true;
  }
  return false;
}

/** Whether a limit holds at a step: a called procedure's own hold in its steps alone. */
export function limitHoldsAt(procedure: CompiledProcedure, limit: string, step: string | undefined): boolean {
  const owner = procedure.blockOfLimit(limit);
  return owner === undefined || (step !== undefined && owner.steps.has(step));
}

/** What a restore step puts back: everything, or in a called procedure what that one took apart. */
export function dueAt(procedure: CompiledProcedure, state: RunState, step: string): RunState['disturbed'] {
  const block = procedure.blockOf(step);
  return block === undefined ? state.disturbed : state.disturbed.filter((item) => block.steps.has(item.step));
}
