import { standardPressure, stationPressure, toBase } from '../../../calculations/for-a-run';
import { stationPressureName, type CallNode, type Expression } from '../../expression/expression';

/** All that a number can be, both ends included, in base units. */
export interface Interval {
  readonly low: number;
  readonly high: number;
}

export const anyNumber: Interval = { low: Number.NEGATIVE_INFINITY, high: Number.POSITIVE_INFINITY };

/**
 * What an expression can come to, given what its names can (interval arithmetic: each operation gives every value that
 * two values of its sides can give, so nothing is left out; a name that stands twice counts as two).
 */
export function intervalOf(node: Expression, of: (name: string) => Interval): Interval {
  switch (node.node) {
    case 'number': {
      const value = toBase(node.value, node.unit);
      return { low: value, high: value };
    }
    case 'name':
      return of(node.name);
    case 'negate': {
      const { low, high } = intervalOf(node.of, of);
      return { low: -high, high: -low };
    }
    case 'arithmetic':
      return combined(node.operator, intervalOf(node.left, of), intervalOf(node.right, of));
    case 'call':
      return callInterval(
        node,
        node.arguments.map((argument) => intervalOf(argument, of)),
        of,
      );
    default:
      return anyNumber;
  }
}

function combined(operator: '+' | '-' | '*' | '/', a: Interval, b: Interval): Interval {
  switch (operator) {
    case '+':
      return proper(a.low + b.low, a.high + b.high);
    case '-':
      return proper(a.low - b.high, a.high - b.low);
    case '*':
      return hull([a.low * b.low, a.low * b.high, a.high * b.low, a.high * b.high]);
    case '/':
      if (b.low <= 0 && b.high >= 0) return anyNumber;
      return hull([a.low / b.low, a.low / b.high, a.high / b.low, a.high / b.high]);
  }
}

const pascalPerKpa = 1000;

function callInterval(node: CallNode, given: readonly Interval[], of: (name: string) => Interval): Interval {
  const [first = anyNumber, second = anyNumber] = given;
  const lows = given.map(({ low }) => low);
  const highs = given.map(({ high }) => high);
  switch (node.calls) {
    case 'abs': {
      const high = Math.max(Math.abs(first.low), Math.abs(first.high));
      return { low: first.low <= 0 && first.high >= 0 ? 0 : Math.min(Math.abs(first.low), Math.abs(first.high)), high };
    }
    case 'min':
      return { low: Math.min(...lows), high: Math.min(...highs) };
    case 'max':
      return { low: Math.max(...lows), high: Math.max(...highs) };
    case 'mean':
      return proper(sum(lows) / lows.length, sum(highs) / highs.length);
    case 'absolute':
      return combined('+', first, of(stationPressureName));
    case 'gauge':
      return combined('-', first, of(stationPressureName));
    case 'standardPressure':
      // The higher the place, the thinner the air.
      return within(
        () => standardPressure(first.high) * pascalPerKpa,
        () => standardPressure(first.low) * pascalPerKpa,
      );
    case 'stationPressure':
      return within(
        () =>
          stationPressure({ altimeterSettingKpa: first.low / pascalPerKpa, elevationM: second.high }) * pascalPerKpa,
        () =>
          stationPressure({ altimeterSettingKpa: first.high / pascalPerKpa, elevationM: second.low }) * pascalPerKpa,
      );
    default:
      return anyNumber;
  }
}

/** Open where an end lies outside of what the calculation takes: it throws RangeError there. */
function within(low: () => number, high: () => number): Interval {
  try {
    return proper(low(), high());
  } catch (error) {
    if (error instanceof RangeError) return anyNumber;
    throw error;
  }
}

function sum(values: readonly number[]): number {
  return values.reduce((all, value) => all + value, 0);
}

/** Nothing is known of what has no number (an infinity less an infinity). */
function proper(low: number, high: number): Interval {
  return Number.isNaN(low) || Number.isNaN(high) ? anyNumber : { low, high };
}

function hull(values: readonly number[]): Interval {
  return proper(Math.min(...values), Math.max(...values));
}
