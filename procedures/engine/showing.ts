/**
 * What a run is opened, read and shown with: events and their chain, replay, the route. The app imports it from here:
 * what decides, weighs a reading or looks through a series comes once something is to be done.
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
export { parseDecimal, tidyDecimal } from './figures';
export { openRun, type OpeningFacts } from './open-run';
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
export { expectedSteps, routeAhead, type WayAhead } from './route-ahead';
export { lowerFirst } from './within-a-sentence';
