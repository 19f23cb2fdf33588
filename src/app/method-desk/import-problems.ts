import type { ApiProblem } from '../core/api-problem';
import type { FileProblem } from './read-procedure-file';

/** The server's refusal of a document as problems that name their step. */
export function problemsOf(refusal: ApiProblem): readonly FileProblem[] {
  if (refusal.fields.length === 0) return [{ where: 'the document', message: refusal.message }];
  return refusal.fields.map(({ pointer, detail }) => {
    const [, step, message] = /^Step ([\w-]+): ([\s\S]*)$/.exec(detail) ?? [];
    return step === undefined || message === undefined
      ? { where: pointer, message: detail }
      : { step, where: pointer, message };
  });
}
