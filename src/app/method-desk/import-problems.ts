import type { ApiProblem } from '../core/api-problem';
import type { FileProblem } from './read-procedure-file';

/** The server's refusal of a document as problems that name their step and their place. */
export function problemsOf(refusal: ApiProblem, document: object): readonly FileProblem[] {
  if (refusal.fields.length === 0) return [{ where: 'the document', message: refusal.message }];
  return refusal.fields.map(({ pointer, detail }) => {
    const [, named, where, message] = /^Step ([\w-]+): ([^:]+): ([\s\S]+)$/.exec(detail) ?? [];
    if (named !== undefined && where !== undefined && message !== undefined) return { step: named, where, message };
    const step = stepAt(document, pointer);
    const place = pointer === '' ? 'the document' : pointer;
    return { where: place, message: detail, ...(step === undefined ? {} : { step }) };
  });
}

/** The id of the step that a JSON pointer leads into, where it has one. */
function stepAt(document: object, pointer: string): string | undefined {
  const index = /^\/steps\/(\d+)/.exec(pointer)?.[1];
  if (index === undefined || !('steps' in document) || !Array.isArray(document.steps)) return undefined;
  const step: unknown = document.steps[Number(index)];
  if (typeof step !== 'object' || step === null || !('id' in step)) return undefined;
  return typeof step.id === 'string' ? step.id : undefined;
}
