import type { CompiledProcedure, Step } from '../document';
import { resultsOf, takenOf } from '../document/step-parts';
import type { NamedValue } from './run-state';
import { CannotDo, type Drafting } from './drafting';
import { requireSomebody } from './decide-second-person';
import { renderTemplate } from './template';
import { staleAmong } from './validity';
import { branchData, wayOn, type NamedExit } from './ways-on';

/** Completes the current step: what it disturbs, its results, the way its conditions lead to, and the next claim. */
export function completeStep(drafting: Drafting, step: Step, forced?: NamedExit): void {
  for (const { item, label } of step.disturbs ?? []) {
    drafting.add({ type: 'disturbed', data: { step: step.id, item, label } });
  }
  passOver(drafting, step, forced);
}

/** The same for a step whose act was not done: nothing was taken apart. */
export function passOver(drafting: Drafting, step: Step, forced?: NamedExit): void {
  const { procedure } = drafting;
  requireSomebody(drafting, step);
  drafting.add({ type: 'step-done', data: { step: step.id } });
  if (forced === undefined) requireFresh(drafting, step);
  const exit = forced ?? wayOn(procedure, drafting.state, step);
  if (exit === undefined)
    throw new CannotDo('no-way-on', `Step ${step.number} has no way on. Set the run aside and tell the lead.`);
  takeExit(drafting, step, exit);
}

/** Nothing is computed or decided from a reading that no longer holds. */
function requireFresh({ procedure, state }: Drafting, step: Step): void {
  const conditions = step.kind === 'finding' ? [] : (step.next ?? []);
  const sources = [...conditions.map(({ when }) => when), ...resultsOf(step).map(({ is }) => is)];
  const names = sources.flatMap((source) => procedure.expression(source).names);
  const stale = staleAmong(state, [...new Set([...names, ...takenOf(step).map(({ from }) => from)])])[0];
  if (stale !== undefined) throw takeAgain(procedure, stale);
}

/** Says why a reading has no value any more, and where it is taken again. */
export function takeAgain(procedure: CompiledProcedure, { label, step, stale }: NamedValue): CannotDo {
  const number = procedure.step(step)?.number ?? step;
  return new CannotDo(
    'stale',
    `${label} no longer holds. ${stale?.because ?? ''} Take it again: go back to step ${number}.`,
    undefined,
    step,
  );
}

/** Takes one exit: the branch, with the person's own reason where one was asked for, then the next step's claim or the finding. */
export function takeExit(drafting: Drafting, step: Step, exit: NamedExit, reason?: string): void {
  const { procedure } = drafting;
  const data = branchData(procedure, drafting.state, step, exit);
  const target = procedure.step(data.to);
  if (target === undefined) {
    throw new CannotDo(
      'no-way-on',
      `Step ${step.number} leads to ${data.to}, which this version does not have. Set the run aside and tell the lead.`,
    );
  }
  drafting.add({ type: 'branch-taken', data: reason === undefined ? data : { ...data, reason } });
  if (target.kind === 'finding') {
    const verdict = renderTemplate(procedure, drafting.state, target.verdict) ?? target.title;
    drafting.add({ type: 'finding-reached', data: { finding: target.id, verdict } });
  } else {
    drafting.add({ type: 'step-claimed', data: { step: target.id } });
  }
}
