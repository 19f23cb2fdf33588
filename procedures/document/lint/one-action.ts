import { documentTexts, textPlace } from './document-texts';
import { furtherImperatives, imperativesIn, sentencesOf } from './imperatives';
import type { LintFinding, LintSubject } from './lint-finding';

/** The members that hold one action each. */
const actions: readonly string[] = ['action', 'short', 'restore', 'makeSafe', 'stopActions'];

/** Actions that are two: the second one is done by half, or ticked off with the first (a warning). */
export function doubleActions({ document }: LintSubject): readonly LintFinding[] {
  return documentTexts(document)
    .filter(({ field }) => actions.includes(field))
    .flatMap((placed): LintFinding[] => {
      const [second] = sentencesOf(placed.text).flatMap((sentence, index) =>
        index === 0 ? furtherImperatives(sentence) : imperativesIn(sentence),
      );
      if (second === undefined) return [];
      const message = `${textPlace(document, placed)}: "${placed.text}" holds a second action, "${second.words}". Make it a step of its own, or one movement with the first ("while").`;
      const step = placed.step === undefined ? {} : { step: placed.step };
      return [{ rule: 'one-action', ...step, pointer: placed.pointer, message }];
    });
}
