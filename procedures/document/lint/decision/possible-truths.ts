import { namesIn } from '../../expression/names-in';
import type { AboutNode, ComparisonNode, Expression } from '../../expression/expression';
import { constantOf, figureOf, orderedSides, type Beforehand, type Fact } from './decision-facts';
import { intervalOf, type Interval } from './interval';

/** What a condition may come to, as a set: it holds, it fails, it cannot be told. The empty set: this cannot be. */
export type Truths = number;
export const holds = 1;
export const fails = 2;
export const untold = 4;

/** Facts that are settled, by their keys; the others are open. */
export type Settled = ReadonlyMap<string, number>;

/** A condition that can be asked what it may come to. */
export type PossibleTruths = (settled: Settled) => Truths;

/** Compiles a condition over facts, with the logic of a run (strong Kleene, see `compileEvaluation`). */
export function possibleTruths(
  condition: Expression,
  facts: ReadonlyMap<string, Fact>,
  beforehand: Beforehand,
): PossibleTruths {
  return new Compiler(facts, beforehand).of(condition);
}

class Compiler {
  constructor(
    private readonly facts: ReadonlyMap<string, Fact>,
    private readonly beforehand: Beforehand,
  ) {}

  of(node: Expression): PossibleTruths {
    switch (node.node) {
      case 'name':
        return this.truth(node.name);
      case 'not': {
        const of = this.of(node.of);
        return (settled) => negated(of(settled));
      }
      case 'logic': {
        const [left, right] = [this.of(node.left), this.of(node.right)];
        if (node.operator === 'and') return (settled) => both(left(settled), right(settled));
        return (settled) => negated(both(negated(left(settled)), negated(right(settled))));
      }
      case 'about':
        return this.about(node);
      case 'comparison':
        return this.comparison(node);
      default:
        return () => holds | fails | untold;
    }
  }

  private truth(name: string): PossibleTruths {
    if (this.beforehand.isNever(name)) return () => fails;
    const group = this.beforehand.groups.find(({ names }) => names.includes(name));
    const key = group === undefined ? `truth ${name}` : `one-of ${group.names.join(' ')}`;
    const place = group === undefined ? 1 : group.names.indexOf(name);
    return (settled) => {
      const known = settled.get(key);
      if (known === undefined) return holds | fails;
      return known === place ? holds : fails;
    };
  }

  private about({ asks, name }: AboutNode): PossibleTruths {
    const measured = this.measured(name);
    if (asks === 'measured') return measured;
    const key = `result ${name}`;
    const place = resultPlaces[asks];
    return (settled) => {
      const result = settled.get(key);
      const told = result === undefined ? holds | fails : result === place ? holds : fails;
      const has = measured(settled);
      return (has & holds ? told : 0) | (has & fails ? untold : 0);
    };
  }

  /** Whether a quantity has a value. */
  private measured(name: string): PossibleTruths {
    const { isFresh, range } = this.beforehand;
    if (isFresh(name) || constantOf(range(name)) !== undefined) return () => holds;
    const key = `measured ${name}`;
    return (settled) => {
      const known = settled.get(key);
      if (known === undefined) return holds | fails;
      return known === 1 ? holds : fails;
    };
  }

  private comparison(node: ComparisonNode): PossibleTruths {
    const measured = namesIn(node).map((name) => this.measured(name));
    const ordersOf = this.orders(node);
    const agreeing = agrees[node.operator];
    return (settled) => {
      let missing = 0;
      for (const has of measured) {
        const truths = has(settled);
        if (!(truths & holds)) return untold;
        if (truths & fails) missing = untold;
      }
      const orders = ordersOf(settled);
      const isTrue = orders & agreeing ? holds : 0;
      const isFalse = orders & ~agreeing & orderBits.any ? fails : 0;
      return isTrue | isFalse | (orders & orderBits.none ? untold : 0) | missing;
    };
  }

  /** How the two sides may compare. */
  private orders(node: ComparisonNode): (settled: Settled) => number {
    const against = figureOf(node, this.beforehand.range);
    if (against?.name !== undefined) return this.ordersToFigure(against.name, against.figure, against.isSwapped);
    const { left, right, isSwapped, isSame, key } = orderedSides(node);
    const lacking = this.facts.get(key)?.size === 4 ? orderBits.none : 0;
    const names = namesIn(node);
    return (settled) => {
      const cells = new Map(names.map((name) => [name, this.rangeWithin(name, settled)]));
      const inCells = (name: string): Interval => cells.get(name) ?? this.beforehand.range(name);
      const sides = isSame ? orderBits.equal : feasibleOrders(intervalOf(left, inCells), intervalOf(right, inCells));
      const feasible = sides | lacking;
      const known = settled.get(key);
      const orders = known === undefined ? feasible : feasible & (1 << known);
      return isSwapped ? swapped(orders) : orders;
    };
  }

  private ordersToFigure(name: string, figure: number, isSwapped: boolean): (settled: Settled) => number {
    const there = { low: figure, high: figure };
    return (settled) => {
      const orders = feasibleOrders(this.rangeWithin(name, settled), there);
      return isSwapped ? swapped(orders) : orders;
    };
  }

  private rangeWithin(name: string, settled: Settled): Interval {
    const place = settled.get(`cell ${name}`);
    const fact = place === undefined ? undefined : this.facts.get(`cell ${name}`);
    const cell = place === undefined || fact?.fact !== 'cell' ? undefined : fact.cells[place];
    return cell ?? this.beforehand.range(name);
  }
}

const resultPlaces: Readonly<Partial<Record<AboutNode['asks'], number>>> = { inBand: 0, outOfBand: 1, tooClose: 2 };
/** Bit by value of an `order` fact; `any` is all three that tell something. */
const orderBits = { less: 1, equal: 2, greater: 4, none: 8, any: 7 } as const;

/** The orders of the two sides in which a comparison holds. */
const agrees: Readonly<Record<ComparisonNode['operator'], number>> = {
  '<': orderBits.less,
  '<=': orderBits.less | orderBits.equal,
  '>': orderBits.greater,
  '>=': orderBits.greater | orderBits.equal,
  '==': orderBits.equal,
  '!=': orderBits.less | orderBits.greater,
};

function feasibleOrders(left: Interval, right: Interval): number {
  return (
    (left.low < right.high ? orderBits.less : 0) |
    (left.low <= right.high && right.low <= left.high ? orderBits.equal : 0) |
    (left.high > right.low ? orderBits.greater : 0)
  );
}

function swapped(orders: number): number {
  const { less, equal, greater, none } = orderBits;
  return (orders & (equal | none)) | (orders & less ? greater : 0) | (orders & greater ? less : 0);
}

function negated(truths: Truths): Truths {
  return (truths & holds ? fails : 0) | (truths & fails ? holds : 0) | (truths & untold);
}

function both(left: Truths, right: Truths): Truths {
  if (left === 0 || right === 0) return 0;
  const holding = left & holds && right & holds ? holds : 0;
  const failing = (left | right) & fails ? fails : 0;
  const isUntold = (left & untold && right & (holds | untold)) || (right & untold && left & (holds | untold));
  return holding | failing | (isUntold ? untold : 0);
}
