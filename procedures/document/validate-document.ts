import { checkProcedureDocument } from './compiled/procedure-document-validator';
import { placeInWords } from './place-in-words';
import type { ProcedureDocument } from './procedure-document';
import { schemaErrorInWords } from './schema-error';

/** One thing that keeps a value from being a procedure document. */
export interface DocumentProblem {
  /** JSON pointer (RFC 6901) to the place. */
  readonly pointer: string;
  /** The step's id, where the place lies in a step that has one. */
  readonly step?: string;
  /** Place and mending in words: "Step 11: `otherwise` is missing: say where it goes on." */
  readonly message: string;
}

export type Validation =
  | { readonly ok: true; readonly document: ProcedureDocument }
  | { readonly ok: false; readonly problems: readonly DocumentProblem[] };

/** A person mends a few at a time; a file that is something else altogether would give thousands. */
const mostProblems = 50;

/**
 * Holds a value of unknown shape, such as an imported file, against `procedure-document.schema.json`. What lies
 * between the parts (expressions, names, ways on) is the compiler's and the lint's. At most 50 problems come back.
 */
export function validateDocument(value: unknown): Validation {
  if (checkProcedureDocument(value)) return { ok: true, document: value as ProcedureDocument };
  const problems = (checkProcedureDocument.errors ?? []).flatMap((error): DocumentProblem[] => {
    const words = schemaErrorInWords(error);
    if (words === undefined) return [];
    const { step, words: place } = placeInWords(value, error.instancePath);
    const message = place === '' ? `The procedure: ${words}` : `${place}: ${words}`;
    return [{ pointer: error.instancePath, ...(step === undefined ? {} : { step }), message }];
  });
  return { ok: false, problems: problems.slice(0, mostProblems) };
}
