import { intervalOf, type Interval } from './interval';
import type { ComparisonNode, Expression } from '../../expression/expression';
import { namesIn, partsOf } from '../../expression/names-in';
import { isNearlyEqual } from '../../expression/truth-part';

/** One thing that a decision may turn on; its value is one of so many. */
export type Fact =
  /** A truth by itself: 0 fails, 1 holds. */
  | { readonly fact: 'truth'; readonly name: string; readonly size: 2 }
  /** Truths of which one holds at most, such as the options of a choice: which one; the last value is none. */
  | { readonly fact: 'one-of'; readonly names: readonly string[]; readonly size: number }
  /** Whether a quantity has a value: 0 no, 1 yes. */
  | { readonly fact: 'measured'; readonly name: string; readonly size: 2 }
  /** Its result: 0 in band, 1 out, 2 too close, 3 not judged. */
  | { readonly fact: 'result'; readonly name: string; readonly size: 4 }
  /** Where a quantity lies among the figures that it is compared with: even values lie between, odd ones on a figure. */
  | { readonly fact: 'cell'; readonly name: string; readonly cells: readonly Interval[]; readonly size: number }
  /** How two expressions compare: 0 less, 1 equal, 2 greater, 3 not to be told. */
  | { readonly fact: 'order'; readonly left: Expression; readonly right: Expression; readonly size: 3 | 4 };

/** Truths of which one holds at most; whether one surely does. */
export interface Group {
  readonly names: readonly string[];
  readonly isOneSure: boolean;
}

/** What is known before a decision. */
export interface Beforehand {
  readonly range: (name: string) => Interval;
  readonly groups: readonly Group[];
  /** Whether the step itself has just measured it. */
  readonly isFresh: (name: string) => boolean;
  /** Whether it is a truth that never holds here: a finding that no run heads for. */
  readonly isNever: (name: string) => boolean;
}

/** The facts that conditions turn on, by a key that says what each is about. */
export function factsOf(conditions: readonly Expression[], beforehand: Beforehand): ReadonlyMap<string, Fact> {
  const facts = new Map<string, Fact>();
  const figures = new Map<string, number[]>();
  const measured = (name: string): void => {
    if (!beforehand.isFresh(name) && constantOf(beforehand.range(name)) === undefined) {
      facts.set(`measured ${name}`, { fact: 'measured', name, size: 2 });
    }
  };
  const visit = (node: Expression): void => {
    if (node.node === 'name') addTruth(node.name, facts, beforehand);
    else if (node.node === 'about' && node.asks !== 'uncertainty') {
      measured(node.name);
      if (node.asks !== 'measured') facts.set(`result ${node.name}`, { fact: 'result', name: node.name, size: 4 });
    } else if (node.node === 'comparison') {
      namesIn(node).forEach(measured);
      const against = figureOf(node, beforehand.range);
      if (against === undefined) addOrder(node, facts, beforehand.range);
      else if (against.name !== undefined) {
        figures.set(against.name, [...(figures.get(against.name) ?? []), against.figure]);
      }
    } else partsOf(node).forEach(visit);
  };
  conditions.forEach(visit);
  for (const [name, values] of figures) {
    const cells = cellsAround(values, beforehand.range(name));
    facts.set(`cell ${name}`, { fact: 'cell', name, cells, size: cells.length });
  }
  return facts;
}

function addTruth(name: string, facts: Map<string, Fact>, { groups, isNever }: Beforehand): void {
  if (isNever(name)) return;
  const group = groups.find(({ names }) => names.includes(name));
  if (group === undefined) facts.set(`truth ${name}`, { fact: 'truth', name, size: 2 });
  else {
    const { names, isOneSure } = group;
    facts.set(`one-of ${names.join(' ')}`, { fact: 'one-of', names, size: names.length + (isOneSure ? 0 : 1) });
  }
}

function addOrder(node: ComparisonNode, facts: Map<string, Fact>, range: Beforehand['range']): void {
  const { left, right, key } = orderedSides(node);
  if (constantOf(intervalOf(left, range)) !== undefined && constantOf(intervalOf(right, range)) !== undefined) return;
  const size = canLackValue(left) || canLackValue(right) || namesIn(node).length === 0 ? 4 : 3;
  facts.set(key, { fact: 'order', left, right, size });
}

/** Both sides in an order that does not depend on how they were written, and whether they were swapped. */
export function orderedSides({ left, right }: ComparisonNode): {
  readonly left: Expression;
  readonly right: Expression;
  readonly isSwapped: boolean;
  readonly isSame: boolean;
  readonly key: string;
} {
  const [a, b] = [wordsOf(left), wordsOf(right)];
  return a <= b
    ? { left, right, isSwapped: false, isSame: a === b, key: `order ${a} | ${b}` }
    : { left: right, right: left, isSwapped: true, isSame: false, key: `order ${b} | ${a}` };
}

/** A name compared with a figure: both, and whether the figure stands on the left. A figure may be an input. */
export function figureOf(
  { left, right }: ComparisonNode,
  range: Beforehand['range'],
): { readonly name: string | undefined; readonly figure: number; readonly isSwapped: boolean } | undefined {
  const [a, b] = [constantOf(intervalOf(left, range)), constantOf(intervalOf(right, range))];
  if (a !== undefined && b !== undefined) return undefined;
  if (left.node === 'name' && b !== undefined) return { name: left.name, figure: b, isSwapped: false };
  if (right.node === 'name' && a !== undefined) return { name: right.name, figure: a, isSwapped: true };
  return undefined;
}

export function constantOf({ low, high }: Interval): number | undefined {
  return low === high ? low : undefined;
}

/** Cuts a range at figures: between two of them, on one, between the next two. */
function cellsAround(figures: readonly number[], { low, high }: Interval): readonly Interval[] {
  const cuts: number[] = [];
  for (const figure of [...figures].sort((a, b) => a - b)) {
    const last = cuts.at(-1);
    if (last === undefined || !isNearlyEqual(last, figure)) cuts.push(figure);
  }
  const above = (cut: number): number => cut + nextTo(cut);
  const below = (cut: number | undefined): number => (cut === undefined ? high : cut - nextTo(cut));
  const cells: Interval[] = [{ low, high: below(cuts[0]) }];
  cuts.forEach((cut, index) => cells.push({ low: cut, high: cut }, { low: above(cut), high: below(cuts[index + 1]) }));
  return cells.map((cell) => ({ low: Math.max(cell.low, low), high: Math.min(cell.high, high) }));
}

/** A cell beside a figure ends just short of it, by a little more than what counts as equal (`isNearlyEqual`). */
function nextTo(figure: number): number {
  return Math.max(1e-11 * Math.abs(figure), 1e-14);
}

/** Whether an expression of measured values can still have none: a division, and calculations with a range. */
function canLackValue(node: Expression): boolean {
  if (node.node === 'arithmetic' && node.operator === '/') return true;
  if (node.node === 'call' && !['abs', 'min', 'max', 'mean'].includes(node.calls)) return true;
  return node.node === 'about' || partsOf(node).some(canLackValue);
}

/** An expression without its places, so that the same one is known again. */
function wordsOf(node: Expression): string {
  switch (node.node) {
    case 'number':
      return `${node.value} ${node.unit}`;
    case 'name':
      return node.name;
    case 'about':
      return `${node.asks}(${node.name})`;
    default: {
      const sign = 'operator' in node ? node.operator : 'calls' in node ? node.calls : node.node;
      return `(${sign} ${partsOf(node).map(wordsOf).join(' ')})`;
    }
  }
}
