import { requireInRange } from './argument-range';

/** What is known about how far a reading may be wrong, all in the unit of the reading. */
export interface UncertaintySources {
  /** The limit of error that the instrument's maker states, as plus or minus; 0 or more. */
  readonly accuracy?: number;
  /** The smallest step that the display or the bus shows; 0 or more. */
  readonly resolution?: number;
  /** The sample standard deviation of repeated readings; 0 or more. */
  readonly repeatDeviation?: number;
  /** How many readings the value is the mean of; 1 or more. Without it the deviation counts in full. */
  readonly repeats?: number;
  /** The coverage factor; 2 (about 95 %) when left out. */
  readonly k?: number;
}

/** Standard uncertainty of a rectangular distribution of half-width a: a / sqrt(3) (JCGM 100:2008, 4.3.7). */
const rectangular = (halfWidth: number): number => halfWidth / Math.sqrt(3);

/**
 * Gives the expanded uncertainty U of a reading, in the reading's unit.
 *
 *     u^2 = (accuracy / sqrt(3))^2 + (resolution / 2 / sqrt(3))^2 + (repeatDeviation / sqrt(repeats))^2;  U = k u
 *
 * Accuracy and resolution are taken as rectangular: the maker states limits, and every value inside a display's step
 * is as likely as the next. A source that is left out adds nothing, so the result of `{}` is 0, not "unknown".
 *
 * Throws RangeError on a negative or non-finite source, on `repeats` that is no whole number of 1 or more, and on
 * `k` that is not above 0. Source: JCGM 100:2008, 4.2.3, 4.3.7, 5.1.2, 6.2.1 and F.2.2.1.
 *
 * @example expandedUncertainty({ accuracy: 1.5, resolution: 1 }) // 1.826
 */
export function expandedUncertainty(sources: UncertaintySources): number {
  const { accuracy = 0, resolution = 0, repeatDeviation = 0, repeats = 1, k = 2 } = sources;
  requireInRange('accuracy', accuracy, { low: 0 });
  requireInRange('resolution', resolution, { low: 0 });
  requireInRange('repeatDeviation', repeatDeviation, { low: 0 });
  requireInRange('repeats', repeats, { low: 1 });
  if (!Number.isInteger(repeats)) throw new RangeError(`repeats is ${repeats}; allowed: a whole number of 1 or more`);
  requireInRange('k', k, { low: 0, aboveLow: true });
  const parts = [rectangular(accuracy), rectangular(resolution / 2), repeatDeviation / Math.sqrt(repeats)];
  return requireInRange('expanded uncertainty', k * Math.hypot(...parts));
}
