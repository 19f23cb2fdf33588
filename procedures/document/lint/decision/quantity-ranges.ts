import { toBase, unitKind } from '../../../calculations/for-a-run';
import type { Expression } from '../../expression/expression';
import type { ProcedureDocument, Quantity } from '../../procedure-document';
import { findsOf, isFoundQuantity, readsOf, resultsOf, takenOf } from '../../step-parts';
import { anyNumber, intervalOf, type Interval } from './interval';

/**
 * What each quantity of a document can be, in base units: an input its default, a reading what can be believed, a
 * result what its formula makes of that. What several steps give is all of it together.
 */
export function quantityRanges(
  document: ProcedureDocument,
  trees: ReadonlyMap<string, Expression>,
): (name: string) => Interval {
  const ranges = new Map<string, Interval>();
  const add = (name: string, range: Interval): void => {
    const known = ranges.get(name);
    ranges.set(
      name,
      known === undefined ? range : { low: Math.min(known.low, range.low), high: Math.max(known.high, range.high) },
    );
  };
  for (const { name, unit, from, default: fallback } of document.inputs) {
    const value = fallback === undefined ? Number.NaN : toBase(Number(fallback), unit);
    add(name, from === 'default' && Number.isFinite(value) ? { low: value, high: value } : anyNumber);
  }
  for (const step of document.steps) {
    for (const { name, unit, plausible, ways } of readsOf(step)) {
      add(name, { low: toBase(plausible.low, unit), high: toBase(plausible.high, unit) });
      for (const { entry } of ways ?? []) {
        if (entry === undefined) continue;
        const { low, high } = entry.plausible;
        add(entry.name, { low: toBase(low, entry.unit), high: toBase(high, entry.unit) });
      }
    }
    for (const found of findsOf(step)) if (isFoundQuantity(found)) add(found.name, physicalRange(found));
    for (const result of takenOf(step)) add(result.name, physicalRange(result));
  }
  // Of another result nothing is taken to be known: it may be one of a later step, in a loop.
  const measured = new Map(ranges);
  for (const { name, is } of document.steps.flatMap(resultsOf)) {
    const tree = trees.get(is);
    add(name, tree === undefined ? anyNumber : intervalOf(tree, (part) => measured.get(part) ?? anyNumber));
  }
  return (name) => ranges.get(name) ?? anyNumber;
}

/** No pressure lies below a vacuum, and no temperature below 0 K. */
function physicalRange({ unit, sense }: Pick<Quantity, 'unit' | 'sense'>): Interval {
  const kind = unitKind(unit);
  const isFromZero = kind === 'temperature' || (kind === 'pressure' && sense === 'absolute');
  return isFromZero ? { low: 0, high: Number.POSITIVE_INFINITY } : anyNumber;
}
