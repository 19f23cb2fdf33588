import type { ApiProblem } from '../core/api-problem';
import type { FileProblem } from './read-procedure-file';

/** The server's refusal of a document as problems that name their step and their place. */
export function problemsOf(refusal: ApiProblem, document: object): readonly FileProblem[] {
  const steps = stepsOf(document);
  if (refusal.fields.length === 0) return [{ where: '', message: refusal.message }];
  return refusal.fields.map(({ pointer, detail }) => {
    const [, id, where, message] = /^Step ([\w-]+): ([^:]+): ([\s\S]+)$/.exec(detail) ?? [];
    const named = steps.find((step) => step.id === id);
    if (named !== undefined && where !== undefined && message !== undefined)
      return { ...inStep(named), where, message };
    const index = /^\/steps\/(\d+)/.exec(pointer)?.[1];
    const at = index === undefined ? undefined : steps[Number(index)];
    if (at === undefined) return { where: '', message: detail };
    return { ...inStep(at), where: '', message: detail.replace(`Step ${at.number}: `, '') };
  });
}

interface NamedStep {
  readonly id: string;
  readonly number: string;
  readonly title: string;
}

function inStep({ id, number, title }: NamedStep): Pick<FileProblem, 'step' | 'stepName'> {
  return { step: id, stepName: [number, title].filter((word) => word !== '').join(', ') };
}

/** What can be told of the steps of a document that nobody has checked yet, in their places. */
function stepsOf(document: object): readonly NamedStep[] {
  if (!('steps' in document) || !Array.isArray(document.steps)) return [];
  return document.steps.map((step: unknown): NamedStep => {
    const fields: Record<string, unknown> = typeof step === 'object' && step !== null ? { ...step } : {};
    const text = (name: string): string => (typeof fields[name] === 'string' ? fields[name] : '');
    return { id: text('id'), number: text('number'), title: text('title') };
  });
}
