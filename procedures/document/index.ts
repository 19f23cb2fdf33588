/**
 * The public face of procedure documents. The app imports types from here, and the functions lazily: reading
 * expressions brings mathjs's parser with it. What only looks at a step is imported from `step-parts` by its path.
 */
export * from './procedure-document';
export {
  compileProcedure,
  type Compilation,
  type CompiledExpression,
  type CompiledProcedure,
  type CompileProblem,
} from './compile-procedure';
export {
  channelsOf,
  findsOf,
  isFoundQuantity,
  isFoundTruth,
  isSeriesStep,
  readsOf,
  resultsOf,
  takenOf,
} from './step-parts';
export { type CallBlock, type ProcedureLibrary } from './call/expand-calls';
export { callsOf, gatherCalls, libraryOf, type CalledKey, type GatheredCalls } from './call/gather-library';
export { type CompiledValidator } from './schema-error';
export { type Declaration } from './declarations';
export { type Environment, type Evaluation, type EvaluationProblem } from './expression/environment';
export { type Expression, type ExpressionProblem, type Span } from './expression/expression';
export { compileEvaluation } from './expression/evaluate';
export { expandedUncertaintyOf } from './expression/expanded-uncertainty';
export { inferKind, type Inferred, type KindOfName } from './expression/infer-kind';
export { declaredKind, kindInWords, type Kind, type QuantityKind, type Sense } from './expression/kinds';
export { namesIn } from './expression/names-in';
export { parseExpression } from './expression/parse';
export { type Parsed } from './expression/read-tree';
