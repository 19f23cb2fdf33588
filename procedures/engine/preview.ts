import type { CompiledProcedure, Step } from '../document';
import { decide } from './decide';
import { Drafting } from './drafting';
import { own } from './environment';
import { analyseListening, currentSeriesStep, suggestBegin, suggestMark, type MarkSuggestion } from './listening';
import { computedValue } from './measure-quantity';
import type { RunCommand } from './run-command';
import type { RunEventData, RunHeader } from './run-event';
import type { NamedValue, RunState } from './run-state';
import type { Series } from './series';

export type ReadingPreview =
  | {
      readonly ok: true;
      /** Absent while more takes are needed. */
      readonly value: NamedValue | undefined;
      /** What the step would give beside it, such as a difference. */
      readonly others: readonly NamedValue[];
      /** Where it would go on, when this take completes the step. */
      readonly way: RunEventData['branch-taken'] | undefined;
      readonly isOverLimit: boolean;
    }
  | { readonly ok: false; readonly message: string; readonly field?: string };

/** What a take would give if it were recorded now: value, uncertainty, judgement and the way on. Records nothing. */
export function previewReading(
  procedure: CompiledProcedure,
  state: RunState,
  take: Omit<Extract<RunCommand, { do: 'record' }>, 'do'>,
): ReadingPreview {
  const outcome = decide(procedure, state, { do: 'record', ...take });
  if (!outcome.ok)
    return { ok: false, message: outcome.message, ...(outcome.field === undefined ? {} : { field: outcome.field }) };
  const drafting = new Drafting(procedure, state);
  const step = state.current?.id;
  let value: NamedValue | undefined;
  let others: readonly NamedValue[] = [];
  let way: RunEventData['branch-taken'] | undefined;
  for (const draft of outcome.drafts) {
    if (draft.type === 'branch-taken') {
      way = draft.data;
      break;
    }
    drafting.add(draft);
    value = own(drafting.state.values, take.name) ?? value;
    others = Object.values(drafting.state.values).filter((other) => other.step === step && other.name !== take.name);
  }
  return { ok: true, value, others, way, isOverLimit: outcome.drafts.some(({ type }) => type === 'limit-exceeded') };
}

export interface ListeningPreview {
  readonly values: readonly NamedValue[];
  readonly problems: readonly string[];
  readonly suggestion: MarkSuggestion;
  /** A place for the mark `noise begins`, seconds in the series; undefined where the level does not tell it. */
  readonly suggestedBeginS: number | undefined;
}

/** What the series and its marks give as they stand. Undefined where the current step does not listen. */
export function previewListening(
  procedure: CompiledProcedure,
  state: RunState,
  series: Series,
): ListeningPreview | undefined {
  const step = currentSeriesStep(procedure, state);
  if (step === undefined) return undefined;
  const { found, problems } = analyseListening(state, step, series);
  const provenance = { step: step.id, seq: state.seq, at: state.lastAt };
  const values = found.map(({ quantity, figure }) =>
    computedValue(procedure, state, quantity, { text: figure.text, uncertainty: figure.uncertaintyText }, provenance),
  );
  return {
    values,
    problems,
    suggestion: suggestMark(procedure, state, series),
    suggestedBeginS: suggestBegin(state, series),
  };
}

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
  return targetsOf(procedure, step, state.header.half, state.verdict).map((target, index) => ({
    to: target.id,
    label: wayLabel(target),
    isMain: index === 0,
  }));
}

function wayLabel({ kind, number, title }: Step): string {
  const words = title.charAt(0).toLowerCase() + title.slice(1);
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
