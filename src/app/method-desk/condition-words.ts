import type { ProcedureDocument, Step } from '../../../procedures/document';
import { foundLabel } from './found-label';
import { lowerFirst } from '../../../procedures/engine/showing';

/** Name in expressions -> how people call it. */
export type NameBook = ReadonlyMap<string, string>;

/** Every name of a document with its label: inputs, quantities, results, options, windows, findings, halves. */
export function nameBook(document: ProcedureDocument): NameBook {
  const names = new Map<string, string>([
    ['cold', 'the cold half'],
    ['warm', 'the warm half'],
  ]);
  for (const { name, label } of document.inputs) names.set(name, lowerFirst(label));
  for (const step of document.steps) {
    for (const [name, label] of namesOf(step)) names.set(name, lowerFirst(label));
  }
  return names;
}

/**
 * A condition in words, `manifold pressure is too close to call`. Figures and comparisons stay as they are written;
 * only names and questions become words.
 */
export function conditionWords(when: string, names: NameBook): string {
  const label = (name: string): string => names.get(name) ?? name;
  return when
    .replace(
      /\b(inBand|outOfBand|tooClose|measured|uncertainty)\(\s*(\w+)\s*\)/g,
      (_whole, question: string, name: string) => asked(question, label(name)),
    )
    .replace(/\u0001[^\u0001]*\u0001|\b[a-z]\w*\b/g, (found) =>
      found.startsWith('\u0001') ? found.slice(1, -1) : label(found),
    )
    .replace(/<=/g, '\u2264')
    .replace(/>=/g, '\u2265');
}

/** Marked, so that the words of an answer are not taken for names again. */
function asked(question: string, label: string): string {
  const words: Record<string, string> = {
    inBand: `${label} is in its band`,
    outOfBand: `${label} is out of its band`,
    tooClose: `${label} is too close to call`,
    measured: `${label} was measured`,
    uncertainty: `the uncertainty of ${label}`,
  };
  return `\u0001${words[question] ?? label}\u0001`;
}

function namesOf(step: Step): readonly (readonly [string, string])[] {
  const results = 'results' in step ? (step.results ?? []).map(({ name, label }) => [name, label] as const) : [];
  switch (step.kind) {
    case 'reading':
    case 'wait':
      return [
        ...step.reads.map(({ name, label }) => [name, label] as const),
        ...step.reads.flatMap(({ ways = [] }) =>
          ways.flatMap(({ entry }) => (entry === undefined ? [] : [[entry.name, entry.label] as const])),
        ),
        ...results,
      ];
    case 'choice':
      return [...step.options.map(({ name, label }) => [name, `${quoted(label)} was chosen`] as const), ...results];
    case 'drive':
      return [...step.windows.map(({ name, label }) => [name, `${quoted(label)} was visited`] as const), ...results];
    case 'listen':
      return [...step.finds.map((found) => [found.name, foundLabel(found)] as const), ...results];
    case 'codes':
      return [...(step.newCodes === undefined ? [] : [[step.newCodes, 'a code is new'] as const]), ...results];
    case 'finding':
      return [[step.id, `heading for ${quoted(step.title)}`]];
    default:
      return results;
  }
}

function quoted(text: string): string {
  return `\u2018${text}\u2019`;
}
