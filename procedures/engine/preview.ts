import type { CompiledProcedure } from '../document';
import { decide } from './decide';
import { Drafting } from './drafting';
import { own } from './environment';
import { analyseListening, currentSeriesStep, suggestBegin, suggestMark, type MarkSuggestion } from './listening';
import { computedValue } from './measure-quantity';
import type { RunCommand } from './run-command';
import type { RunEventData } from './run-event';
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
