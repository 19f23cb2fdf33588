import { documentTexts, textPlace } from './document-texts';
import type { LintFinding, LintSubject } from './lint-finding';

/** A figure and what it may be off by: nobody does that sum at the car. */
const plusOrMinus = /±|\+\s?\/\s?[-\u2212\u2013]|\+[-\u2212]|\bplus[\s-]?(?:or|\/|and)[\s-]?minus\b|\bgive or take\b/iu;

/** Nominal figures with a plus-or-minus where the two ends belong. */
export function nominalsWithTolerance({ document }: LintSubject): readonly LintFinding[] {
  return documentTexts(document).flatMap((placed): LintFinding[] => {
    const found = plusOrMinus.exec(placed.text)?.[0];
    if (found === undefined) return [];
    const message = `${textPlace(document, placed)}: "${excerpt(placed.text, found)}" gives a figure and what it may be off by. Write the two ends, each with its unit: "12.4 V to 12.8 V".`;
    const step = placed.step === undefined ? {} : { step: placed.step };
    return [{ rule: 'two-ends', ...step, pointer: placed.pointer, message }];
  });
}

/** A few words on both sides of what was found. */
function excerpt(text: string, found: string): string {
  const at = text.indexOf(found);
  return text
    .slice(Math.max(0, at - 15), at + found.length + 15)
    .replace(/^\S*\s(?=.*\S)/, (cut) => (at > 15 ? '' : cut))
    .trim();
}
