import type { Expression } from '../expression/expression';
import type { Limit } from '../procedure-document';
import type { NominalFigures } from './nominal-figures';

/** The highest gauge pressure that a limit allows, in Pa; undefined where it is no plain ceiling (`gauge <= 34.5 kPa`). */
export function ceilingOf(
  limit: Limit,
  trees: ReadonlyMap<string, Expression>,
  figures: NominalFigures,
): { readonly pascal: number; readonly figure: Expression } | undefined {
  const tree = trees.get(limit.holds);
  if (tree?.node !== 'comparison') return undefined;
  const { left, right, operator } = tree;
  const isAbove = operator === '<' || operator === '<=';
  const isBelow = operator === '>' || operator === '>=';
  const figure = isAbove && left.node === 'name' ? right : isBelow && right.node === 'name' ? left : undefined;
  if (figure === undefined) return undefined;
  const pascal = figures.constantValue([figure], ([value]) => value ?? Number.NaN);
  return pascal === undefined ? undefined : { pascal, figure };
}
