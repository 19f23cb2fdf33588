import { requireInRange } from './argument-range';

/** Where a reading lies: inside its band, outside it, or so near to an edge that the uncertainty hides the answer. */
export type Verdict = 'in' | 'out' | 'too-close';

/** A reading, its expanded uncertainty and its band, all in one unit. */
export interface JudgedReading {
  readonly value: number;
  /** The expanded uncertainty U of the value; 0 or more. */
  readonly uncertainty: number;
  /** The band's lower edge; left out when there is none. */
  readonly low?: number | undefined;
  /** The band's upper edge, not below `low`; left out when there is none. */
  readonly high?: number | undefined;
}

/** As a decimal fraction has no exact double, 2.3 - 2 falls short of 0.3: so many times the last digit may be lost. */
const roundingSteps = 16;

/** How far apart two sums of these numbers may be and still mean the same. */
const roundingOf = (...numbers: number[]): number =>
  roundingSteps * Number.EPSILON * Math.max(...numbers.map(Math.abs));

/**
 * Judges a reading against its band with a guard band of U on both sides of each edge.
 *
 *     in         low + U <= value <= high - U
 *     out        value < low - U  or  value > high + U
 *     too-close  anything else
 *
 * A value exactly on an inner boundary is in and one exactly on an outer boundary is too close: the band is a closed
 * interval, and the published texts leave these two points open. Decimals are compared as such: 2.3 with U = 0.3 is
 * exactly on the inner boundary of 2, rounding apart. A band narrower than 2 U has no value that is in.
 *
 * Throws RangeError on anything that is not finite, on a negative uncertainty, on `high` below `low` and when there
 * is no edge at all. Source: JCGM 106:2012, clause 8 (guarded acceptance and guarded rejection); ILAC-G8:09/2019,
 * 4.2, whose conditional pass and conditional fail are `too-close` together.
 *
 * @example judge({ value: 2.6, uncertainty: 0.3, low: 2, high: 3 }) // 'in'
 */
export function judge({ value, uncertainty, low, high }: JudgedReading): Verdict {
  requireInRange('value', value);
  requireInRange('uncertainty', uncertainty, { low: 0 });
  if (low === undefined && high === undefined)
    throw new RangeError('low and high are undefined; allowed: at least one');
  if (low !== undefined) requireInRange('low', low);
  if (high !== undefined) requireInRange('high', high, low === undefined ? {} : { low });
  const above = low === undefined ? Infinity : value - low;
  const below = high === undefined ? Infinity : high - value;
  const margin = Math.min(above, below);
  const rounding = roundingOf(value, uncertainty, low ?? 0, high ?? 0);
  if (margin < -uncertainty - rounding) return 'out';
  return margin >= uncertainty - rounding ? 'in' : 'too-close';
}
