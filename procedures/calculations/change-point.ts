import { requireInRange } from './argument-range';

/** Where a series is best cut into two parts. */
export interface Split {
  /** How many values the first part has: the first value of the second part stands at this index. */
  readonly count: number;
  /** Summed squared error about the two parts' own models. */
  readonly squaredError: number;
}

/** Sums over values[0..k) of what the errors about a mean or a line need, with x and y taken about their own middle. */
interface PrefixSums {
  readonly x: Float64Array;
  readonly y: Float64Array;
  readonly xx: Float64Array;
  readonly xy: Float64Array;
  readonly yy: Float64Array;
}

function prefixSums(x: ArrayLike<number>, y: ArrayLike<number>, from: number, to: number): PrefixSums {
  const n = to - from;
  const sums = {
    x: new Float64Array(n + 1),
    y: new Float64Array(n + 1),
    xx: new Float64Array(n + 1),
    xy: new Float64Array(n + 1),
    yy: new Float64Array(n + 1),
  };
  // A clock that started at midnight or a pressure of 100 kPa would eat the figures of the differences below.
  const middle = (values: ArrayLike<number>): number => {
    let sum = 0;
    for (let index = from; index < to; index++) sum += values[index] ?? NaN;
    return sum / n;
  };
  const [middleX, middleY] = [middle(x), middle(y)];
  for (let k = 0; k < n; k++) {
    const offX = (x[from + k] ?? NaN) - middleX;
    const offY = (y[from + k] ?? NaN) - middleY;
    sums.x[k + 1] = (sums.x[k] ?? 0) + offX;
    sums.y[k + 1] = (sums.y[k] ?? 0) + offY;
    sums.xx[k + 1] = (sums.xx[k] ?? 0) + offX * offX;
    sums.xy[k + 1] = (sums.xy[k] ?? 0) + offX * offY;
    sums.yy[k + 1] = (sums.yy[k] ?? 0) + offY * offY;
  }
  return sums;
}

const between = (sums: Float64Array, from: number, to: number): number => (sums[to] ?? NaN) - (sums[from] ?? NaN);

type SegmentError = (sums: PrefixSums, from: number, to: number) => number;

const errorAboutMean: SegmentError = (sums, from, to) => {
  const sumY = between(sums.y, from, to);
  return Math.max(0, between(sums.yy, from, to) - (sumY * sumY) / (to - from));
};

const errorAboutLine: SegmentError = (sums, from, to) => {
  const n = to - from;
  const sumX = between(sums.x, from, to);
  const sumY = between(sums.y, from, to);
  const sxx = between(sums.xx, from, to) - (sumX * sumX) / n;
  const sxy = between(sums.xy, from, to) - (sumX * sumY) / n;
  const syy = between(sums.yy, from, to) - (sumY * sumY) / n;
  return Math.max(0, sxx > 0 ? syy - (sxy * sxy) / sxx : syy);
};

function bestSplit(sums: PrefixSums, minSegment: number, segmentError: SegmentError): Split {
  const n = sums.y.length - 1;
  requireInRange('minSegment', minSegment, { low: 1 });
  requireInRange('number of values', n, { low: 2 * minSegment });
  let best: Split = { count: minSegment, squaredError: Infinity };
  for (let count = minSegment; count <= n - minSegment; count++) {
    const squaredError = segmentError(sums, 0, count) + segmentError(sums, count, n);
    if (squaredError < best.squaredError) best = { count, squaredError };
  }
  requireInRange('squared error', best.squaredError);
  return best;
}

/**
 * Finds the cut of y[from..to) that leaves the smallest summed squared error about two means: a shift of level.
 *
 * `count` counts from `from`; each part keeps at least `minSegment` values. Linear time by prefix sums.
 *
 * Throws RangeError when there are fewer than 2 minSegment values or one is not finite. Source: the one-break case of
 * least-squares segmentation (Bai and Perron, 1998 and 2003).
 */
export function splitTwoMeans(y: ArrayLike<number>, minSegment = 1, from = 0, to = y.length): Split {
  return bestSplit(prefixSums(y, y, from, to), minSegment, errorAboutMean);
}

/**
 * Finds the cut of (x, y)[from..to) that leaves the smallest summed squared error about two lines that need not meet:
 * a jump, not a knee. A continuous two-line fit puts the knee somewhere else altogether when the series jumps.
 *
 * `count` counts from `from`; each part keeps at least `minSegment` points. Linear time by prefix sums.
 *
 * Throws RangeError when there are fewer than 2 minSegment points or a value is not finite. Source: two-segment least
 * squares without continuity, the one-break case of Bai and Perron (1998 and 2003).
 */
export function splitTwoLines(
  x: ArrayLike<number>,
  y: ArrayLike<number>,
  minSegment = 3,
  from = 0,
  to = x.length,
): Split {
  return bestSplit(prefixSums(x, y, from, to), minSegment, errorAboutLine);
}

/** Summed squared error of y[from..to) about one mean, for comparison with that about two. */
export function squaredErrorAboutMean(y: ArrayLike<number>, from = 0, to = y.length): number {
  return errorAboutMean(prefixSums(y, y, from, to), 0, to - from);
}
