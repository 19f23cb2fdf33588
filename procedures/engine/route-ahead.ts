import type { CompiledProcedure, Step } from '../document';
import { headingFrom } from './called';
import type { RunHeader } from './run-event';
import type { RunState } from './run-state';
import { lowerFirst } from './within-a-sentence';

/** A way that the run may take next, for the Route. */
export interface WayAhead {
  readonly to: string;
  readonly label: string;
  readonly isMain: boolean;
}

/**
 * Where the current step may lead: the way that the author wrote next first, then the others in order, each target once.
 */
export function routeAhead(procedure: CompiledProcedure, state: RunState): readonly WayAhead[] {
  const step = state.current === undefined ? undefined : procedure.step(state.current.id);
  if (step === undefined) return [];
  return targetsOf(procedure, step, state.header.half, headingFrom(procedure, state, step)).map((target, index) => ({
    to: target.id,
    label: wayLabel(target),
    isMain: index === 0,
  }));
}

function wayLabel({ kind, number, title }: Step): string {
  const words = lowerFirst(title);
  return kind === 'finding' ? words : `${number}, ${words}`;
}

/**
 * The steps that a step's exits name, the nearest later one in the document's order first. An exit for one half alone
 * counts in that half only, and is then the whole way on.
 */
function targetsOf(
  procedure: CompiledProcedure,
  step: Step,
  half: RunHeader['half'],
  verdict: string | undefined,
): readonly Step[] {
  if (step.kind === 'finding') return [];
  const { steps } = procedure.document;
  const forHalf = (step.next ?? []).find(({ when }) => when === half);
  const branches = (step.next ?? []).filter(({ when }) => when !== 'cold' && when !== 'warm');
  const exits = forHalf === undefined ? [...branches, step.otherwise] : [forHalf];
  const call = procedure.blockOf(step.id)?.call;
  const ids = exits.map(({ to, verdict: named }) => {
    const id = to === 'verdict' ? (named ?? verdict ?? call ?? to) : to;
    // A finding of a called procedure is none of the run's: it leads to the step that called.
    const block = procedure.step(id)?.kind === 'finding' ? procedure.blockOf(id) : undefined;
    return block?.call ?? id;
  });
  const targets = steps.filter(({ id }) => id !== step.id && ids.includes(id));
  const here = steps.findIndex(({ id }) => id === step.id);
  const isLater = (target: Step): boolean => steps.indexOf(target) > here && target.kind !== 'finding';
  return [...targets.filter(isLater), ...targets.filter((target) => !isLater(target))];
}

/** About how many steps a run of the procedure has: as many as the author's plain way has from the first to its end. */
export function expectedSteps(procedure: CompiledProcedure, half?: RunHeader['half']): number {
  const seen = new Set<Step>();
  let step = procedure.document.steps[0];
  while (step !== undefined && step.kind !== 'finding' && !seen.has(step)) {
    seen.add(step);
    step = targetsOf(procedure, step, half, undefined)[0];
  }
  return seen.size;
}
