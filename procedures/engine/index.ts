/**
 * The public face of the engine: events and their chain, replay, deciding, and what a run's state gives to show.
 * `validate-event` and `evidence` are imported by their paths: the first step of a run does without them.
 */
export * from './run-event';
export * from './run-state';
export * from './run-command';
export * from './series';
export { applyEvent } from './apply-event';
export { canonicalJson } from './canonical-json';
export {
  brokenLink,
  contentHash,
  eventHash,
  headerHash,
  sealEvent,
  verifyChain,
  type ChainVerdict,
  type EventPlace,
} from './chain';
export { newCodesAgainst } from './compare-codes';
export { compareHalves, type HalvesCompared, type PairComparison } from './compare-halves';
export { dueAt } from './called';
export { cautionCount } from './cautions';
export { decide } from './decide';
export { coarseness, isOverdue } from './decide-gear';
export { previewDecision, type DecisionPreview } from './deciding';
export { parseDecimal, tidyDecimal } from './figures';
export { samplesOf, suggestMark, type MarkSuggestion } from './listening';
export { openRun, type OpeningFacts } from './open-run';
export {
  expectedSteps,
  previewListening,
  previewReading,
  routeAhead,
  type ListeningPreview,
  type ReadingPreview,
  type WayAhead,
} from './preview';
export { previewBand, previewResults, previewTaken } from './preview-step';
export { secondsOf } from './decide-timer';
export { waitsForSomebody } from './waits-for-somebody';
export { channelsOf, readsOf, resultsOf, takesNeeded } from './quantities';
export { type Refusal, type ReplayResult } from './refusal';
export { replay } from './replay';
export { sha256Hex } from './sha256';
export {
  readSnapshot,
  replayFrom,
  snapshotFormat,
  takeSnapshot,
  type RunSnapshot,
  type SnapshotPlace,
  type SnapshotProblem,
  type SnapshotReading,
  type SnapshotReplay,
} from './snapshot';
export { renderCited, renderTemplate, shownUnit, type Citation } from './template';
export { exitsOf, wayOn, type NamedExit } from './ways-on';
export { composeWriteUp, writeUpParts, type WriteUp, type WriteUpPart } from './write-up';
