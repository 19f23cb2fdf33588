import { toAbsolute, toBase, toGauge } from '../../calculations/for-a-run';
import { signatures } from './signatures';
import type { Environment } from './environment';
import { stationPressureName, type ArithmeticNode, type CallNode, type Expression } from './expression';

/** A compiled number in base units; undefined where there is none. */
export type NumberPart = (environment: Environment) => number | undefined;

const pascalPerKpa = 1000;

/** Compiles what gives a number. Throws RangeError on a truth: `inferKind` comes first. */
export function numberPart(node: Expression): NumberPart {
  switch (node.node) {
    case 'number': {
      const value = toBase(node.value, node.unit);
      return () => value;
    }
    case 'name': {
      const { name } = node;
      return (environment) => finite(environment.number(name));
    }
    case 'negate': {
      const of = numberPart(node.of);
      return (environment) => {
        const value = of(environment);
        return value === undefined ? undefined : -value;
      };
    }
    case 'arithmetic':
      return arithmeticPart(node);
    case 'call':
      return callPart(node);
    case 'about': {
      if (node.asks !== 'uncertainty') break;
      const { name } = node;
      return (environment) => finite(environment.uncertainty(name));
    }
  }
  throw new RangeError(`${node.node} gives a truth; allowed: an expression that gives a number`);
}

function arithmeticPart(node: ArithmeticNode): NumberPart {
  const left = numberPart(node.left);
  const right = numberPart(node.right);
  const operate = operations[node.operator];
  return (environment) => {
    const a = left(environment);
    if (a === undefined) return undefined;
    const b = right(environment);
    return b === undefined ? undefined : finite(operate(a, b));
  };
}

const operations: Readonly<Record<ArithmeticNode['operator'], (a: number, b: number) => number>> = {
  '+': (a, b) => a + b,
  '-': (a, b) => a - b,
  '*': (a, b) => a * b,
  '/': (a, b) => a / b,
};

function callPart(node: CallNode): NumberPart {
  const parts = node.arguments.map(numberPart);
  const first = parts[0] ?? (() => undefined);
  switch (node.calls) {
    case 'abs':
      return (environment) => {
        const value = first(environment);
        return value === undefined ? undefined : Math.abs(value);
      };
    case 'min':
      return ofAll(parts, (values) => Math.min(...values));
    case 'max':
      return ofAll(parts, (values) => Math.max(...values));
    case 'mean':
      return ofAll(parts, (values) => values.reduce((sum, value) => sum + value, 0) / values.length);
    case 'absolute':
      return ofTwo(first, station, (gauge, air) => toAbsolute(gauge / pascalPerKpa, air / pascalPerKpa) * pascalPerKpa);
    case 'gauge':
      return ofTwo(first, station, (value, air) => toGauge(value / pascalPerKpa, air / pascalPerKpa) * pascalPerKpa);
    default: {
      const { calculate } = signatures[node.calls];
      return ofAll(parts, (values) => calculate(...values));
    }
  }
}

const station: NumberPart = (environment) => finite(environment.number(stationPressureName));

function ofAll(parts: readonly NumberPart[], calculate: (values: readonly number[]) => number): NumberPart {
  return (environment) => {
    const values: number[] = [];
    for (const part of parts) {
      const value = part(environment);
      if (value === undefined) return undefined;
      values.push(value);
    }
    return inRange(() => calculate(values));
  };
}

function ofTwo(first: NumberPart, second: NumberPart, calculate: (a: number, b: number) => number): NumberPart {
  return (environment) => {
    const a = first(environment);
    if (a === undefined) return undefined;
    const b = second(environment);
    return b === undefined ? undefined : inRange(() => calculate(a, b));
  };
}

/** The calculations throw RangeError on what cannot be, an elevation of 20 km say: here that is no value. */
function inRange(calculate: () => number): number | undefined {
  try {
    return finite(calculate());
  } catch (error) {
    if (error instanceof RangeError) return undefined;
    throw error;
  }
}

function finite(value: number | undefined): number | undefined {
  return value !== undefined && Number.isFinite(value) ? value : undefined;
}
