import type { CompiledProcedure, Exit, Step } from '../document';
import { destinationOf } from './called';
import { environmentOf, own } from './environment';
import { truthOf } from './judge-quantity';
import type { DecisionInput, RunEventData } from './run-event';
import type { RunState } from './run-state';
import { renderTemplate } from './template';

/** An authored exit of a step under its fixed name: `next-0`, `thenceforth-0`, `otherwise`, `cannot-measure`, `stop`. */
export interface NamedExit extends Exit {
  readonly exit: string;
  readonly when?: string;
  readonly atMost?: number;
}

/** A step's exits in the order in which they are tried, and by their names. */
interface Exits {
  readonly inOrder: readonly NamedExit[];
  readonly byName: ReadonlyMap<string, NamedExit>;
}

/** A procedure's exits by step: a replay asks for them at every branch. */
const knownExits = new WeakMap<CompiledProcedure, Map<Step, Exits>>();

function exitsOnce(procedure: CompiledProcedure, step: Step): Exits {
  let ofProcedure = knownExits.get(procedure);
  if (ofProcedure === undefined) knownExits.set(procedure, (ofProcedure = new Map()));
  let exits = ofProcedure.get(step);
  if (exits === undefined) {
    const inOrder = namedExits(procedure, step);
    exits = { inOrder, byName: new Map(inOrder.map((exit) => [exit.exit, exit])) };
    ofProcedure.set(step, exits);
  }
  return exits;
}

/** Every exit that the author gave a step, in the order in which they are tried. */
export function exitsOf(procedure: CompiledProcedure, step: Step): readonly NamedExit[] {
  return exitsOnce(procedure, step).inOrder;
}

/** One of them by its name. */
export function exitNamed(procedure: CompiledProcedure, step: Step, name: string): NamedExit | undefined {
  return exitsOnce(procedure, step).byName.get(name);
}

function namedExits(procedure: CompiledProcedure, step: Step): readonly NamedExit[] {
  const stop: NamedExit = { ...procedure.document.stop.exit, exit: 'stop' };
  if (step.kind === 'finding') return [stop];
  const branches = (step.next ?? []).flatMap((branch, index): NamedExit[] => {
    const { thenceforth, ...exit } = branch;
    const first = { ...exit, exit: `next-${index}` };
    return thenceforth === undefined
      ? [first]
      : [first, { ...thenceforth, when: branch.when, exit: `thenceforth-${index}` }];
  });
  const honest = 'cannotMeasure' in step ? [{ ...step.cannotMeasure, exit: 'cannot-measure' }] : [];
  return [...branches, { ...step.otherwise, exit: 'otherwise' }, ...honest, stop];
}

/** The exit that the conditions lead to as the run stands; the first branch that holds, within its bound. */
export function wayOn(procedure: CompiledProcedure, state: RunState, step: Step): NamedExit | undefined {
  const environment = environmentOf(state);
  return exitsOf(procedure, step).find((exit) => {
    if (exit.exit === 'otherwise') return true;
    if (exit.when === undefined || truthOf(procedure, exit.when, environment) !== true) return false;
    const taken = own(state.branchCounts, `${step.id}/${exit.exit}`) ?? 0;
    return exit.atMost === undefined || taken < exit.atMost;
  });
}

/** The exit as a `branch-taken` event's data: the numbers that decided, and why in the author's words. */
export function branchData(
  procedure: CompiledProcedure,
  state: RunState,
  step: Step,
  exit: NamedExit,
  because: string = exit.because,
): RunEventData['branch-taken'] {
  return {
    step: step.id,
    to: destinationOf(procedure, state, step, exit).to ?? exit.to,
    exit: exit.exit,
    ...(exit.when === undefined ? {} : { when: exit.when }),
    inputs: exit.when === undefined ? [] : decisionInputs(procedure, state, exit.when),
    because: renderTemplate(procedure, state, because) ?? because,
    ...(exit.verdict === undefined ? {} : { verdict: exit.verdict }),
  };
}

function decisionInputs(procedure: CompiledProcedure, state: RunState, when: string): readonly DecisionInput[] {
  return procedure.expression(when).names.map((name) => decisionInput(procedure, state, name));
}

function decisionInput(procedure: CompiledProcedure, state: RunState, name: string): DecisionInput {
  const label = procedure.declared(name)?.label ?? name;
  const value = own(state.values, name);
  if (value !== undefined)
    return { name, label, text: value.text, unit: value.unit, uncertainty: value.uncertaintyText };
  const input = own(state.inputs, name);
  if (input !== undefined) return { name, label, text: input.text, unit: input.unit };
  if (procedure.declared(name)?.kind !== 'truth') return { name, label, text: 'not measured' };
  return { name, label, text: environmentOf(state).truth(name) ? 'yes' : 'no' };
}
