import { expressionPlaces } from '../expression-places';
import type { Expression } from '../expression/expression';
import { partsOf } from '../expression/names-in';
import type { LintFinding, LintSubject } from './lint-finding';

/** Conditions that mix `and` with `or`: people read them in two ways, brackets or not. */
export function mixedConnectives({ document, trees }: LintSubject): readonly LintFinding[] {
  const numbers = new Map(document.steps.map(({ id, number }) => [id, number]));
  return expressionPlaces(document).flatMap(({ source, pointer, step, where }): LintFinding[] => {
    const tree = trees.get(source);
    if (tree === undefined || connectivesIn(tree).size < 2) return [];
    const place = step === undefined ? where : `step ${numbers.get(step) ?? step}, ${where}`;
    const message = `${place}: mixes and with or. Make it two branches, or give a part of it a name of its own.`;
    return [
      {
        rule: 'one-connective',
        ...(step === undefined ? {} : { step }),
        pointer,
        message: message.charAt(0).toUpperCase() + message.slice(1),
      },
    ];
  });
}

function connectivesIn(node: Expression): ReadonlySet<string> {
  const found = new Set(partsOf(node).flatMap((part) => [...connectivesIn(part)]));
  if (node.node === 'logic') found.add(node.operator);
  return found;
}
