import type { CompiledProcedure, Step } from '../document';
import { decide } from './decide';
import { own } from './environment';
import { previewResults } from './preview-step';
import type { RunEventData } from './run-event';
import type { NamedValue, RunState } from './run-state';
import { exitsOf } from './ways-on';

/**
 * The names that were read to take an exit: those of its own rule first, then those of the rules before it, which had to
 * fail. None where nothing was asked: `cannot-measure`, `stop`.
 */
export function namesRead(procedure: CompiledProcedure, step: Step, exit: string): readonly string[] {
  const exits = exitsOf(procedure, step);
  const place = exits.findIndex((candidate) => candidate.exit === exit);
  if (place < 0 || exit === 'stop' || exit === 'cannot-measure') return [];
  const tried = exits.slice(0, place + 1).reverse();
  const [taken, ...before] = tried.map(({ when }) => (when === undefined ? [] : procedure.expression(when).names));
  return [...new Set([...(taken ?? []), ...before.reverse().flat()])];
}

/** Where a step that is only confirmed would go on, and by what. */
export interface DecisionPreview {
  readonly way: RunEventData['branch-taken'];
  /** The quantities that decide it, measured or computed in the step, those of the rule that holds first. */
  readonly deciding: readonly NamedValue[];
}

/** What confirming the current step would decide as the run stands. Undefined where it would be refused. */
export function previewDecision(procedure: CompiledProcedure, state: RunState): DecisionPreview | undefined {
  const step = state.current === undefined ? undefined : procedure.step(state.current.id);
  const outcome = step === undefined ? undefined : decide(procedure, state, { do: 'confirm' });
  if (step === undefined || outcome?.ok !== true) return undefined;
  const way = outcome.drafts.find((draft) => draft.type === 'branch-taken')?.data;
  if (way === undefined) return undefined;
  const results = previewResults(procedure, state);
  const deciding = namesRead(procedure, step, way.exit).flatMap(
    (name) => results.find((result) => result.name === name) ?? own(state.values, name) ?? [],
  );
  return { way, deciding };
}
