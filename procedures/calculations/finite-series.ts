import { requireInRange } from './argument-range';

/**
 * Checks that two series belong together: lists of one length, of at least so many numbers, all finite. Gives the
 * length.
 *
 * Throws RangeError naming the series, and the place of the first number that is none.
 */
export function requireSeriesPair(
  [firstName, first]: readonly [string, ArrayLike<number>],
  [secondName, second]: readonly [string, ArrayLike<number>],
  atLeast: number,
): number {
  requireInRange(`length of ${firstName}`, lengthOf(firstName, first), { low: atLeast });
  if (lengthOf(secondName, second) !== first.length) {
    throw new RangeError(`length of ${secondName} is ${second.length}; allowed: ${first.length}, as of ${firstName}`);
  }
  for (let index = 0; index < first.length; index++) {
    requireFinite(firstName, index, first[index]);
    requireFinite(secondName, index, second[index]);
  }
  return first.length;
}

function lengthOf(name: string, series: ArrayLike<number>): number {
  if (typeof series !== 'object' || series === null) {
    throw new RangeError(`${name} is ${String(series)}; allowed: a list of numbers`);
  }
  return series.length;
}

function requireFinite(name: string, index: number, value: number | undefined): void {
  if (!Number.isFinite(value)) throw new RangeError(`${name}[${index}] is ${String(value)}; allowed: a finite number`);
}
