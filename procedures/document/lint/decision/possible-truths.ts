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

/** Evaluates a condition over what is settled, with the logic of a run (strong Kleene, see `compileEvaluation`). */
export class PossibleTruths {
  constructor(
    private readonly facts: ReadonlyMap<string, Fact>,
    private readonly beforehand: Beforehand,
  ) {}

  of(node: Expression, settled: Settled): Truths {
    switch (node.node) {
      case 'name':
        return this.truth(node.name, settled);
      case 'not':
        return negated(this.of(node.of, settled));
      case 'logic': {
        const [left, right] = [this.of(node.left, settled), this.of(node.right, settled)];
        return node.operator === 'and' ? both(left, right) : negated(both(negated(left), negated(right)));
      }
      case 'about':
        return this.about(node, settled);
      case 'comparison':
        return this.comparison(node, settled);
      default:
        return holds | fails | untold;
    }
  }

  private truth(name: string, settled: Settled): Truths {
    if (this.beforehand.isNever(name)) return fails;
    const alone = settled.get(`truth ${name}`);
    if (alone !== undefined) return alone === 1 ? holds : fails;
    const group = this.beforehand.groups.find(({ names }) => names.includes(name));
    const which = group === undefined ? undefined : settled.get(`one-of ${group.names.join(' ')}`);
    if (group === undefined || which === undefined) return holds | fails;
    return group.names[which] === name ? holds : fails;
  }

  private about({ asks, name }: AboutNode, settled: Settled): Truths {
    const measured = this.measured(name, settled);
    if (asks === 'measured') return measured;
    const result = settled.get(`result ${name}`);
    const told = result === undefined ? holds | fails : result === resultPlaces[asks] ? holds : fails;
    return (measured & holds ? told : 0) | (measured & fails ? untold : 0);
  }

  /** Whether a quantity has a value. */
  private measured(name: string, settled: Settled): Truths {
    const { isFresh, range } = this.beforehand;
    if (isFresh(name) || constantOf(range(name)) !== undefined) return holds;
    const known = settled.get(`measured ${name}`);
    if (known === undefined) return holds | fails;
    return known === 1 ? holds : fails;
  }

  private comparison(node: ComparisonNode, settled: Settled): Truths {
    const measured = namesIn(node).map((name) => this.measured(name, settled));
    const missing = measured.some((truths) => truths & fails) ? untold : 0;
    if (measured.some((truths) => !(truths & holds))) return untold;
    const orders = this.orders(node, settled);
    const told = (['less', 'equal', 'greater'] as const)
      .filter((order) => orders & orderBits[order])
      .reduce((truths, order) => truths | (agrees[node.operator][order] ? holds : fails), 0);
    return told | (orders & orderBits.none ? untold : 0) | missing;
  }

  /** How the two sides may compare. */
  private orders(node: ComparisonNode, settled: Settled): number {
    const { range } = this.beforehand;
    const against = figureOf(node, range);
    if (against?.name !== undefined)
      return this.ordersToFigure(against.name, against.figure, against.isSwapped, settled);
    const { left, right, isSwapped, isSame, key } = orderedSides(node);
    const inCells = (name: string): Interval => this.rangeWithin(name, settled);
    const feasible = isSame ? orderBits.equal : feasibleOrders(intervalOf(left, inCells), intervalOf(right, inCells));
    const fact = this.facts.get(key);
    const known = settled.get(key);
    const lacking = fact?.size === 4 ? orderBits.none : 0;
    const orders = known === undefined ? feasible | lacking : (feasible | lacking) & (1 << known);
    return isSwapped ? swapped(orders) : orders;
  }

  private ordersToFigure(name: string, figure: number, isSwapped: boolean, settled: Settled): number {
    const orders = feasibleOrders(this.rangeWithin(name, settled), { low: figure, high: figure });
    const place = settled.get(`cell ${name}`);
    // A cell between two figures does not hold its ends.
    const inside = place !== undefined && place % 2 === 0 ? orders & ~orderBits.equal : orders;
    return isSwapped ? swapped(inside) : inside;
  }

  private rangeWithin(name: string, settled: Settled): Interval {
    const place = settled.get(`cell ${name}`);
    const fact = this.facts.get(`cell ${name}`);
    const cell = place === undefined || fact?.fact !== 'cell' ? undefined : fact.cells[place];
    return cell ?? this.beforehand.range(name);
  }
}

const resultPlaces: Readonly<Partial<Record<AboutNode['asks'], number>>> = { inBand: 0, outOfBand: 1, tooClose: 2 };
const orderBits = { less: 1, equal: 2, greater: 4, none: 8 } as const;
type Order = 'less' | 'equal' | 'greater';

const agrees: Readonly<Record<ComparisonNode['operator'], Readonly<Record<Order, boolean>>>> = {
  '<': { less: true, equal: false, greater: false },
  '<=': { less: true, equal: true, greater: false },
  '>': { less: false, equal: false, greater: true },
  '>=': { less: false, equal: true, greater: true },
  '==': { less: false, equal: true, greater: false },
  '!=': { less: true, equal: false, greater: true },
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
