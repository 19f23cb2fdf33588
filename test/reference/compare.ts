import { allowance, type CheckValue, type Tolerance } from './check-values';

/** How many single numbers, texts and marks were compared, and what was wrong. */
export interface Comparison {
  readonly compared: number;
  readonly differences: readonly string[];
}

/**
 * Compares results with everything that a row expects: numbers within its tolerance, all else equal, and no key more
 * or less on either side, however deep. A regime of `either` takes both.
 */
export function compare({ expected, tolerance }: CheckValue, results: unknown): Comparison {
  const differences: string[] = [];
  const compared = compareAt('', '', expected, results, tolerance, differences);
  return { compared, differences };
}

function compareAt(
  path: string,
  key: string,
  expected: unknown,
  result: unknown,
  tolerance: Tolerance,
  differences: string[],
): number {
  if (typeof expected === 'object' && expected !== null) {
    const entries = Object.entries(expected);
    const found = typeof result === 'object' && result !== null ? result : {};
    for (const extra of Object.keys(found))
      if (!(extra in expected)) differences.push(`${path}${extra} is not expected`);
    // The entries of a list have the tolerance of the list.
    const keyOf = (name: string) => (Array.isArray(expected) ? key : name);
    return entries.reduce((count, [name, inner]) => {
      const innerResult: unknown = Reflect.get(found, name);
      return count + compareAt(`${path}${name}.`, keyOf(name), inner, innerResult, tolerance, differences);
    }, 0);
  }
  const isMet =
    typeof expected === 'number'
      ? typeof result === 'number' && Math.abs(result - expected) <= allowance(tolerance, key, expected)
      : result === expected || (expected === 'either' && (result === 'choked' || result === 'subsonic'));
  if (!isMet) differences.push(`${path.slice(0, -1)} is ${String(result)}, expected ${String(expected)}`);
  return 1;
}
