/**
 * The face for whoever imports, reads and publishes documents. Apart from `index.ts`, since a run needs none of it and
 * the compiled schema is large.
 */
export { validateDocument, type DocumentProblem, type Validation } from './validate-document';
