/**
 * The public face of the engine: events and their chain, replay, deciding, and what a run's state gives to show.
 * `validate-event` and `evidence` are imported by their paths: the first step of a run does without them.
 */
export * from './showing';
export { decide } from './decide';
export { coarseness, isOverdue } from './decide-gear';
export { previewDecision, type DecisionPreview } from './deciding';
export { samplesOf, suggestMark, type MarkSuggestion } from './listening';
export { previewListening, previewReading, type ListeningPreview, type ReadingPreview } from './preview';
export { previewBand, previewResults, previewTaken } from './preview-step';
export { secondsOf } from './decide-timer';
export { composeWriteUp, writeUpParts, type WriteUp, type WriteUpPart } from './write-up';
