import type { Caution } from '../procedure-document';
import { stepWords, type LintFinding, type LintSubject } from './lint-finding';

/** More than one danger, warning or caution on one step: what is piled up is not read. Notices are free. */
export function piledUpCautions({ document }: LintSubject): readonly LintFinding[] {
  return document.steps.flatMap((step, place): LintFinding[] => {
    const piled = counted.flatMap(([word, plural]) => {
      const count = (step.cautions ?? []).filter((caution) => caution.word === word).length;
      return count > 1 ? [`${count} ${plural}`] : [];
    });
    if (piled.length === 0) return [];
    const message = `${stepWords(step)}: has ${piled.join(' and ')}; at most one of each. Put what holds throughout on the start card, or cut the step in two.`;
    return [{ rule: 'cautions', step: step.id, pointer: `/steps/${place}/cautions`, message }];
  });
}

const counted: readonly (readonly [word: Caution['word'], plural: string])[] = [
  ['danger', 'dangers'],
  ['warning', 'warnings'],
  ['caution', 'cautions'],
];
