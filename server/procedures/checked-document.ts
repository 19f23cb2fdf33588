import { compileProcedure, type CompileProblem, type ProcedureDocument } from '../../procedures/document';
import { validateDocument } from '../../procedures/document/authoring';
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

function fieldProblem({ step, where, message, pointer = '' }: CompileProblem): FieldProblem {
  const place = step === undefined ? where : `Step ${step}: ${where}`;
  return { pointer, detail: `${place}: ${message}` };
}

function refusal(errors: readonly FieldProblem[]): Invalid {
  return new Invalid(`The document has ${errors.length === 1 ? 'a problem' : `${errors.length} problems`}.`, errors);
}
