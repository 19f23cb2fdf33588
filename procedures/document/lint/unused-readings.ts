import { expressionPlaces } from '../expression-places';
import { namesIn } from '../expression/names-in';
import type { Step } from '../procedure-document';
import { findsOf, isFoundQuantity, placedReadsOf } from '../step-parts';
import { documentTexts } from './document-texts';
import { stepWords, type LintFinding, type LintSubject } from './lint-finding';
import { namesInTemplate } from './named-values';

/**
 * Readings that nothing judges and nothing asks for: no band, no expression, no text, no limit. The person at the car
 * takes them in vain, or their use was forgotten.
 */
export function unusedReadings(subject: LintSubject): readonly LintFinding[] {
  const used = usedNames(subject);
  return subject.document.steps.flatMap((step, place) =>
    taken(step).flatMap(({ name, pointer, isEntry }): LintFinding[] => {
      if (used.has(name)) return [];
      const mending = isEntry
        ? 'Let the way’s `is` use it, or take the entry out.'
        : 'Give it a band, let a branch or a text use it, or take it out.';
      const message = `${stepWords(step)}: takes ${name}, which has no band and which nothing uses. ${mending}`;
      return [{ rule: 'unused-reading', step: step.id, pointer: `/steps/${place}/${pointer}`, message }];
    }),
  );
}

interface Taken {
  readonly name: string;
  readonly pointer: string;
  readonly isEntry: boolean;
}

/** What a step takes without judging it. */
function taken(step: Step): readonly Taken[] {
  const reads = placedReadsOf(step).flatMap(({ part, pointer }): Taken[] => [
    ...(part.band === undefined ? [{ name: part.name, pointer, isEntry: false }] : []),
    ...(part.ways ?? []).flatMap(({ entry }, index): Taken[] =>
      entry === undefined ? [] : [{ name: entry.name, pointer: `${pointer}/ways/${index}/entry`, isEntry: true }],
    ),
  ]);
  const finds = findsOf(step).flatMap((found, index): Taken[] =>
    isFoundQuantity(found) && found.band === undefined
      ? [{ name: found.name, pointer: `finds/${index}`, isEntry: false }]
      : [],
  );
  return [...reads, ...finds];
}

function usedNames({ document, trees }: LintSubject): ReadonlySet<string> {
  const inExpressions = expressionPlaces(document).flatMap(({ source }) => {
    const tree = trees.get(source);
    return tree === undefined ? [] : namesIn(tree);
  });
  const inTexts = documentTexts(document).flatMap(({ text }) => namesInTemplate(text));
  return new Set([...inExpressions, ...inTexts, ...document.limits.flatMap((limit) => limit.of)]);
}
