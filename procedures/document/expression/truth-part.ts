import type { JudgedResult } from '../procedure-document';
import type { Environment } from './environment';
import type { AboutNode, ComparisonNode, Expression, LogicNode } from './expression';
import { numberPart } from './number-part';

/** A compiled truth; undefined where something that decides it was not measured. */
export type TruthPart = (environment: Environment) => boolean | undefined;

/** Compiles what gives a truth. Throws RangeError on a number: `inferKind` comes first. */
export function truthPart(node: Expression): TruthPart {
  switch (node.node) {
    case 'name': {
      const { name } = node;
      return (environment) => environment.truth(name);
    }
    case 'comparison':
      return comparisonPart(node);
    case 'logic':
      return logicPart(node);
    case 'not': {
      const of = truthPart(node.of);
      return (environment) => {
        const holds = of(environment);
        return holds === undefined ? undefined : !holds;
      };
    }
    case 'about':
      return aboutPart(node);
    default:
      throw new RangeError(`${node.node} gives a number; allowed: an expression that gives a truth`);
  }
}

function comparisonPart(node: ComparisonNode): TruthPart {
  const left = numberPart(node.left);
  const right = numberPart(node.right);
  const compare = comparisons[node.operator];
  return (environment) => {
    const a = left(environment);
    if (a === undefined) return undefined;
    const b = right(environment);
    return b === undefined ? undefined : compare(a, b);
  };
}

const comparisons: Readonly<Record<ComparisonNode['operator'], (a: number, b: number) => boolean>> = {
  '<': (a, b) => a < b && !isNearlyEqual(a, b),
  '<=': (a, b) => a < b || isNearlyEqual(a, b),
  '>': (a, b) => a > b && !isNearlyEqual(a, b),
  '>=': (a, b) => a > b || isNearlyEqual(a, b),
  '==': isNearlyEqual,
  '!=': (a, b) => !isNearlyEqual(a, b),
};

/**
 * Whether two numbers differ by no more than what converting their units may have left behind: 1e-12 of the larger,
 * or 1e-15. The same bounds as mathjs compares with, so that 34.5 kPa is not above 345 hPa.
 */
export function isNearlyEqual(a: number, b: number): boolean {
  return a === b || Math.abs(a - b) <= Math.max(1e-12 * Math.max(Math.abs(a), Math.abs(b)), 1e-15);
}

function logicPart(node: LogicNode): TruthPart {
  const left = truthPart(node.left);
  const right = truthPart(node.right);
  const deciding = node.operator === 'or';
  return (environment) => {
    const a = left(environment);
    if (a === deciding) return deciding;
    const b = right(environment);
    if (b === deciding) return deciding;
    return a === undefined || b === undefined ? undefined : !deciding;
  };
}

const askedResult: Readonly<Partial<Record<AboutNode['asks'], JudgedResult>>> = {
  inBand: 'in',
  outOfBand: 'out',
  tooClose: 'too-close',
};

/** What was never measured has no result; what was measured and not judged is neither in, nor out, nor too close. */
function aboutPart({ asks, name }: AboutNode): TruthPart {
  if (asks === 'measured') return (environment) => environment.isMeasured(name);
  const wanted = askedResult[asks];
  if (wanted === undefined) throw new RangeError(`${asks}(${name}) gives a number; allowed: a question about a result`);
  return (environment) => (environment.isMeasured(name) ? environment.result(name) === wanted : undefined);
}
