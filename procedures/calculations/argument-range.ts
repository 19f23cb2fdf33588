/** An inclusive range of allowed values; a side that is left out is open to the last finite number. */
export interface AllowedRange {
  readonly low?: number;
  readonly high?: number;
  /** The lower limit itself is not allowed: a volume must be above zero, not zero. */
  readonly aboveLow?: boolean;
}

const rangeInWords = ({ low, high, aboveLow = false }: AllowedRange): string => {
  if (low !== undefined && high !== undefined) return aboveLow ? `above ${low} to ${high}` : `${low} to ${high}`;
  if (low !== undefined) return aboveLow ? `above ${low}` : `${low} or more`;
  return high === undefined ? 'a finite number' : `${high} or less`;
};

/**
 * Gives the value back when it is a finite number inside the range.
 *
 * Throws RangeError naming the argument, its value and the allowed range: no calculation lets NaN, an infinity or an
 * impossible value through to a result that looks like a measurement.
 */
export function requireInRange(name: string, value: number, range: AllowedRange = {}): number {
  const { low = -Number.MAX_VALUE, high = Number.MAX_VALUE, aboveLow = false } = range;
  const isAllowed = Number.isFinite(value) && value <= high && (aboveLow ? value > low : value >= low);
  if (!isAllowed) throw new RangeError(`${name} is ${String(value)}; allowed: ${rangeInWords(range)}`);
  return value;
}
