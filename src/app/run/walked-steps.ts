import type { Step } from '../../../procedures/document';
import { resultsOf, type NamedValue, type RunState, type WalkedStep } from '../../../procedures/engine/showing';
import type { ShownResult } from '../shared/result-words';
import type { RunView } from './run-view';

/** A claim with its step. */
export interface WalkedPlace {
  readonly step: Step;
  readonly walked: WalkedStep;
  /** Its place among the claims. */
  readonly index: number;
}

/** The claims before the current one, in order; findings are no steps. */
export function walkedBefore({ procedure, state }: Pick<RunView, 'procedure' | 'state'>): readonly WalkedPlace[] {
  return state.walked.flatMap((walked, index) => {
    const step = procedure.step(walked.step);
    const isCurrent = walked.claimedSeq === state.current?.claimedSeq;
    return step === undefined || isCurrent || step.kind === 'finding' ? [] : [{ step, walked, index }];
  });
}

/** What a claim's bead shows. */
export function beadResult({ result, notMeasured }: WalkedStep): ShownResult {
  return notMeasured === true ? 'not-measured' : (result ?? 'done');
}

/** The decision that led to where the run stands; undefined where nothing was decided yet. */
export function lastDecision(run: Pick<RunView, 'procedure' | 'state'>): WalkedPlace | undefined {
  return [...walkedBefore(run)].reverse().find(({ walked }) => walked.way !== undefined && walked.isLeft !== true);
}

/** The values that a step gave, as they stand. */
export function valuesOf(state: Pick<RunState, 'values'>, stepId: string): readonly NamedValue[] {
  return Object.values(state.values).filter(({ step }) => step === stepId);
}

/**
 * The value that was recorded last in the whole run. What a step only works out on the way, with no band, is left out;
 * of a ramp the first thing counts that it was to find.
 */
export function latestValue({ procedure, state }: Pick<RunView, 'procedure' | 'state'>): NamedValue | undefined {
  const read = Object.values(state.values)
    .filter(({ name, step: id }) => {
      const step = procedure.step(id);
      const result = step === undefined ? undefined : resultsOf(step).find((candidate) => candidate.name === name);
      return result === undefined || result.band !== undefined;
    })
    .sort((a, b) => a.seq - b.seq);
  const latest = read.at(-1);
  const kind = latest === undefined ? undefined : procedure.step(latest.step)?.kind;
  if (latest === undefined || (kind !== 'listen' && kind !== 'ramp')) return latest;
  return read.find(({ step }) => step === latest.step);
}
