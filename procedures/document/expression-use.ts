import type { Declaration } from './declarations';
import type { ExpressionPlace } from './expression-places';
import { isSameDimension } from './expression/dimension';
import type { AboutNode, Expression, ExpressionProblem } from './expression/expression';
import { commonSense, declaredKind, kindInWords, type Kind } from './expression/kinds';
import { partsOf } from './expression/names-in';

/** Whether what an expression gives is what its place needs; if not, the problem. */
export function problemWithUse(
  expression: Expression,
  kind: Kind,
  place: ExpressionPlace,
): ExpressionProblem | undefined {
  const { start, end } = expression;
  if (place.gives.is === 'truth') {
    if (kind.kind === 'truth') return undefined;
    return {
      start,
      end,
      message: `This needs what holds or does not, and gets ${kindInWords(kind)}: compare it with something.`,
    };
  }
  if (kind.kind === 'truth') return { start, end, message: 'This needs a quantity, and gets what holds or does not.' };
  const { unit, sense } = place.gives.of;
  const declared = declaredKind(unit, sense);
  const wanted = place.gives.is === 'uncertainty' ? ({ ...declared, sense: 'difference' } as const) : declared;
  const fits = isSameDimension(kind.dimension, wanted.dimension) && commonSense(wanted.sense, kind.sense) !== undefined;
  if (fits) return undefined;
  const message = `This needs ${kindInWords(wanted)} (${unit}), and gets ${kindInWords(kind)}.`;
  return { start, end, message };
}

/** Asking whether a quantity without a band is in it has no answer. */
export function problemWithQuestion(
  expression: Expression,
  place: ExpressionPlace,
  declarations: ReadonlyMap<string, Declaration>,
): ExpressionProblem | undefined {
  if (place.sees === 'gauge') return undefined;
  const asked = findQuestion(expression, (node) => {
    const declared = declarations.get(node.name);
    return (
      node.asks !== 'measured' && node.asks !== 'uncertainty' && declared?.kind === 'quantity' && !declared.hasBand
    );
  });
  if (asked === undefined) return undefined;
  const { start, end } = asked;
  return { start, end, message: `\`${asked.name}\` has no band, so it is never in or out of it: give it one.` };
}

function findQuestion(node: Expression, isWanted: (node: AboutNode) => boolean): AboutNode | undefined {
  if (node.node === 'about') return isWanted(node) ? node : undefined;
  for (const part of partsOf(node)) {
    const found = findQuestion(part, isWanted);
    if (found !== undefined) return found;
  }
  return undefined;
}
