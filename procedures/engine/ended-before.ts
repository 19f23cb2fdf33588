import type { CompiledProcedure } from '../document';
import type { BranchTaken, RunState, WalkedStep } from './run-state';
import { endStop } from './sentence-end';
import type { RenderedTemplate } from './template';
import { lowerFirst } from './within-a-sentence';

/**
 * Where and why a test ended before it had its finding, as one sentence that cites the step; none where it came to a
 * finding of its own. The reason stands as the person gave it, or as the author wrote it where nobody was asked.
 */
export function endedBefore(procedure: CompiledProcedure, state: RunState): readonly RenderedTemplate[] {
  const { finding } = state;
  if (finding === undefined || finding !== procedure.document.stop.exit.verdict) return [];
  const claim = state.walked.findLast(
    ({ isLeft, way, verdictBefore }) => isLeft !== true && way?.verdict === finding && verdictBefore !== finding,
  );
  const step = claim === undefined ? undefined : procedure.step(claim.step);
  if (claim?.way === undefined || step === undefined) return [];
  const place = `step ${step.number}, ${step.title}`;
  const cites = [{ name: step.id, step: step.id, stepNumber: step.number, seq: claim.way.seq }];
  return [{ text: sentence(place, claim, claim.way), cites }];
}

function sentence(place: string, claim: WalkedStep, way: BranchTaken): string {
  if (way.exit === 'stop') return withReason(`The test was stopped at ${place}`, way.reason);
  const isGivenUp = way.exit === 'cannot-measure';
  return withReason(`The test ended at ${place}`, isGivenUp ? claim.notMeasuredBecause : way.because);
}

function withReason(what: string, reason = ''): string {
  return endStop(reason.trim() === '' ? what : `${what}: ${lowerFirst(reason.trim())}`);
}
