import { differenceFromBase } from '../../calculations/for-a-run';
import type { Limit } from '../procedure-document';
import { ceilingOf } from './ceilings';
import { documentTexts, textPlace, type PlacedText } from './document-texts';
import { pressuresIn, type WrittenFigure } from './figures-in-text';
import type { LintFinding, LintSubject } from './lint-finding';
import { NominalFigures, shortFigure } from './nominal-figures';

/** Texts that ask for a pressure, whatever else they say. */
const acts: readonly string[] = ['action', 'short', 'meanwhile', 'restore', 'makeSafe', 'stopActions', 'then'];
/** What, before a figure in its clause, makes it one that is meant to be reached or kept to. */
const asks =
  /\b(?:limit|ceiling|at most|maximum|max|up to|not above|never above|no more than|raise|raised|pressuri[sz]e|relief|set to|set at|target)\b/i;

/** Words about a limit that say another figure than the limit, and texts that ask for more than it allows. */
export function limitsInWords(subject: LintSubject): readonly LintFinding[] {
  const { document, trees } = subject;
  const figures = new NominalFigures(document);
  const ceilings = document.limits.flatMap((limit, place) => {
    const ceiling = ceilingOf(limit, trees, figures);
    return ceiling === undefined || !limit.of.includes('gauge') ? [] : [{ limit, place, pascal: ceiling.pascal }];
  });
  if (ceilings.length === 0) return [];
  const texts = documentTexts(document).flatMap((placed) => {
    const written = pressuresIn(placed.text).filter(({ next }) => !/^abs(?:olute)?\b/i.test(next));
    return written.length === 0 ? [] : [{ placed, written }];
  });
  return ceilings.flatMap((ceiling) =>
    texts.flatMap(({ placed, written }) =>
      placed.pointer === `/limits/${ceiling.place}/says`
        ? otherFigure(ceiling, placed, written)
        : tooMuch(ceiling, placed, written, subject),
    ),
  );
}

interface Ceiling {
  readonly limit: Limit;
  readonly pascal: number;
}

/** What is said when the limit is passed names the limit: one of its figures must be it. */
function otherFigure(
  { limit, pascal }: Ceiling,
  { pointer }: PlacedText,
  written: readonly WrittenFigure[],
): readonly LintFinding[] {
  const [first] = written;
  if (first === undefined || written.some(({ value, slack }) => Math.abs(value - pascal) < slack)) return [];
  const message = `Limit ${limit.id}: says ${first.text}, and holds ${limit.holds}. Let both be the same figure.`;
  return [{ rule: 'limit-in-words', pointer, message }];
}

function tooMuch(
  { limit, pascal }: Ceiling,
  placed: PlacedText,
  written: readonly WrittenFigure[],
  { document }: LintSubject,
): readonly LintFinding[] {
  if (placed.pointer.startsWith('/limits/') && placed.field === 'says') return [];
  const isMeant = ({ before }: WrittenFigure): boolean => acts.includes(placed.field) || asks.test(before);
  const above = written.find((figure) => figure.value - figure.slack > pascal && isMeant(figure));
  if (above === undefined) return [];
  const ceiling = `${shortFigure(differenceFromBase(pascal, above.unit))} ${above.unit}`;
  const message = `${textPlace(document, placed)}: "${above.text}" in \`${placed.field}\` is more than the limit ${limit.id} allows, ${ceiling} gauge. Lower it, or say that it is absolute.`;
  const step = placed.step === undefined ? {} : { step: placed.step };
  return [{ rule: 'limit-in-words', ...step, pointer: placed.pointer, message }];
}
