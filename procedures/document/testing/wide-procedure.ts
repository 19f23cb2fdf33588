import type { Branch, ProcedureDocument } from '../procedure-document';
import { longProcedure } from './long-procedure';

/** A sound invented procedure whose steps have so many branches more, each on a higher figure than the one before. */
export function wideProcedure(readings: number, findings: number, more: number): ProcedureDocument {
  const document = longProcedure(readings, findings);
  const steps = document.steps.map((step) => {
    if (step.kind !== 'reading') return step;
    const { name } = step.reads[0] ?? { name: '' };
    const { to } = step.otherwise;
    const further = Array.from({ length: more }, (_, index): Branch => {
      const when = `${name} < ${index + 1} kPa and inBand(${name})`;
      return { when, to, because: 'it is low', ...(step.otherwise.verdict ? { verdict: step.otherwise.verdict } : {}) };
    });
    return { ...step, next: [...(step.next ?? []), ...further] };
  });
  return { ...document, steps };
}
