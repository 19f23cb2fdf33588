import { compileProcedure, type Compilation, type ProcedureDocument } from '../../procedures/document';
import { Invalid } from '../http/problem';

/** A document that this build can run. Throws `Invalid` naming the step and the place of everything that is wrong. */
export function checkedDocument(sent: object): ProcedureDocument {
  const document = sent as ProcedureDocument;
  const compiled = compiledOrRefused(document);
  if (compiled.ok) return document;
  const errors = compiled.problems.map(({ step, where, message }) => ({
    pointer: where,
    detail: step === undefined ? message : `Step ${step}: ${message}`,
  }));
  throw new Invalid(`The document has ${errors.length === 1 ? 'a problem' : `${errors.length} problems`}.`, errors);
}

function compiledOrRefused(document: ProcedureDocument): Compilation {
  try {
    return compileProcedure(document);
  } catch (error) {
    // Compiling stumbles over what has not even the form of a document.
    if (!(error instanceof TypeError)) throw error;
    throw new Invalid('This has not the form of a procedure document.', [{ pointer: '', detail: error.message }]);
  }
}
