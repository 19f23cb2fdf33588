import { compileProcedure, type CompileProblem, type ProcedureDocument } from '../../procedures/document';
import { lintProcedure, validateDocument, type PublishedVersions } from '../../procedures/document/authoring';
import { pictureParts } from '../../procedures/library/picture-parts';
import { Invalid, type FieldProblem } from '../http/problem';

/** A document that this build can run. Throws `Invalid` naming the step and the place of everything that is wrong. */
export function checkedDocument(sent: unknown): ProcedureDocument {
  const validation = validateDocument(sent);
  if (!validation.ok) {
    throw refusal(validation.problems.map(({ pointer, message }) => ({ pointer, detail: message })));
  }
  const compilation = compileProcedure(validation.document);
  if (!compilation.ok) throw refusal(compilation.problems.map(fieldProblem));
  return validation.document;
}

/** What would keep a document from being published, in words: the errors of its lint. `published`: what it may call. */
export function publishingProblems(document: ProcedureDocument, published: PublishedVersions): FieldProblem[] {
  return lintProcedure(document, { parts: pictureParts, published }).errors.map(({ step, pointer = '', message }) => ({
    pointer,
    detail: step === undefined ? message : `Step ${step}: ${message}`,
  }));
}

/** Throws `Invalid` while something keeps the document from being published. */
export function requirePublishable(document: ProcedureDocument, published: PublishedVersions): void {
  const problems = publishingProblems(document, published);
  if (problems.length > 0) throw refusal(problems);
}

function fieldProblem({ step, where, message, pointer = '' }: CompileProblem): FieldProblem {
  const place = step === undefined ? where : `Step ${step}: ${where}`;
  return { pointer, detail: `${place}: ${message}` };
}

function refusal(errors: readonly FieldProblem[]): Invalid {
  return new Invalid(`The document has ${errors.length === 1 ? 'a problem' : `${errors.length} problems`}.`, errors);
}
