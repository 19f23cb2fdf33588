import { stepWords, type LintFinding, type LintSubject } from './lint-finding';

/** A run begins with the start card, once. */
export function startCardPlace({ document }: LintSubject): readonly LintFinding[] {
  return document.steps.flatMap((step, place): LintFinding[] => {
    const at = { rule: 'start', step: step.id, pointer: `/steps/${place}` } as const;
    if (place === 0 && step.kind !== 'start') {
      return [
        {
          ...at,
          message: `${stepWords(step)} is the first and no start card: put a step of kind \`start\` before it.`,
        },
      ];
    }
    if (place > 0 && step.kind === 'start') {
      return [{ ...at, message: `${stepWords(step)} is a second start card: only the first step can be one.` }];
    }
    return [];
  });
}
