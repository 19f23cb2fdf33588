import type { Step } from '../document';
import { dueAt } from './called';
import { requireCautions } from './require-cautions';
import { CannotDo, type Drafting } from './drafting';
import { completeStep } from './go-on';

/** Throws `CannotDo` while something is apart that the step puts back. */
export function requireNothingDue({ procedure, state }: Drafting, step: Step): void {
  const due = dueAt(procedure, state, step.id);
  if (due.length === 0) return;
  throw new CannotDo('still-disturbed', `Still to be put back: ${due.map(({ label }) => label).join(', ')}.`);
}

/** Puts one thing back, from wherever in the run; a restore step goes on with the last one. */
export function restore(drafting: Drafting, item: string): void {
  if (!drafting.state.disturbed.some((candidate) => candidate.item === item)) {
    throw new CannotDo('not-disturbed', 'That is back in its place already.');
  }
  const { current } = drafting.state;
  const step = current === undefined ? undefined : drafting.procedure.step(current.id);
  if (step !== undefined) requireCautions(drafting, step);
  drafting.add({
    type: 'restored',
    data: { step: step?.id ?? drafting.state.finding ?? '', item },
  });
  if (step?.kind !== 'restore' || dueAt(drafting.procedure, drafting.state, step.id).length > 0) return;
  completeStep(drafting, step);
}
