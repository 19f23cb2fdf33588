import type { CompiledProcedure, Step } from '../document';

/** How many cautions gate a step: the start card's hold throughout, the others are the step's own. */
export function cautionCount(procedure: CompiledProcedure, step: Step): number {
  return step.kind === 'start'
    ? procedure.document.start.throughout.length + (step.cautions?.length ?? 0)
    : (step.cautions?.length ?? 0);
}
