import type { Step } from '../../../procedures/document';
import type { NamedValue, RunState, WalkedStep } from '../../../procedures/engine';
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

/** The value that was recorded last in the whole run. */
export function latestValue(state: Pick<RunState, 'values'>): NamedValue | undefined {
  return Object.values(state.values).reduce<NamedValue | undefined>(
    (latest, value) => (latest === undefined || value.seq >= latest.seq ? value : latest),
    undefined,
  );
}
