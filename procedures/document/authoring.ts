/**
 * The face for whoever imports, reads and publishes documents. Apart from `index.ts`, since a run needs none of it and
 * the compiled schema is large.
 */
export { validateDocument, type DocumentProblem, type Validation } from './validate-document';
export { lintProcedure, type LintOptions, type LintReport } from './lint';
export { type CalledVersion, type PublishedVersions } from './lint/called';
export { type LintFinding, type LintRule } from './lint/lint-finding';
