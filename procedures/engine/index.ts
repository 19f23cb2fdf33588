export * from './run-event';
export * from './run-state';
export * from './series';
export { canonicalJson } from './canonical-json';
export { sha256Hex } from './sha256';
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
