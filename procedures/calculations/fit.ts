import { requireInRange } from './argument-range';
import { requireSeriesPair } from './finite-series';
import { medianInPlace } from './median';

/** A straight line by least squares: y = intercept + slope x. */
export interface LineFit {
  readonly slope: number;
  readonly intercept: number;
  /** Standard error of the slope, in units of y per unit of x. */
  readonly slopeError: number;
  /** Standard error of the intercept, in units of y. */
  readonly interceptError: number;
  /** sqrt(sum of squared residuals / (n - 2)), in units of y. */
  readonly residualDeviation: number;
  /** 1 - residual / total sum of squares; 1 for points that all lie on a level line. */
  readonly rSquared: number;
}

/** The mean in two passes: the second takes back what the first lost to rounding. */
function meanOf(values: ArrayLike<number>): number {
  const first = sumOf(values.length, (index) => at(values, index)) / values.length;
  return first + sumOf(values.length, (index) => at(values, index) - first) / values.length;
}

/** Compensated sum of n terms (Neumaier 1974). */
function sumOf(n: number, term: (index: number) => number): number {
  let sum = 0;
  let lost = 0;
  for (let index = 0; index < n; index++) {
    const value = term(index);
    const next = sum + value;
    lost += Math.abs(sum) >= Math.abs(value) ? sum - next + value : value - next + sum;
    sum = next;
  }
  return sum + lost;
}

const at = (values: ArrayLike<number>, index: number): number => values[index] ?? NaN;

/**
 * Fits a straight line by ordinary least squares, all error in y.
 *
 *     slope = Sxy / Sxx,  intercept = mean(y) - slope mean(x),  s^2 = SSE / (n - 2)
 *     slopeError = s / sqrt(Sxx),  interceptError = s sqrt(1 / n + mean(x)^2 / Sxx)
 *
 * The sums are taken about the means and with compensation, so that a large offset in x or y costs no figures.
 *
 * Throws RangeError on fewer than 3 points (two leave nothing to judge the line by), on series of different lengths,
 * on a value that is not finite and when all x are equal. Source: the normal equations, in any textbook; NIST StRD,
 * linear least squares, for the certified results.
 *
 * @example fitLine([0, 1, 2], [1, 3, 5]) // slope 2, intercept 1, rSquared 1
 */
export function fitLine(x: ArrayLike<number>, y: ArrayLike<number>): LineFit {
  const n = requireSeriesPair(['x', x], ['y', y], 3);
  const meanX = meanOf(x);
  const meanY = meanOf(y);
  const offX = (index: number): number => at(x, index) - meanX;
  const offY = (index: number): number => at(y, index) - meanY;
  const sxx = requireInRange(
    'sum of squares of x',
    sumOf(n, (index) => offX(index) ** 2),
  );
  if (sxx === 0) throw new RangeError(`x are all ${at(x, 0)}; allowed: at least two different values`);
  const slope = sumOf(n, (index) => offX(index) * offY(index)) / sxx;
  const intercept = requireInRange('intercept', meanY - slope * meanX);
  const residual = sumOf(n, (index) => (offY(index) - slope * offX(index)) ** 2);
  const total = sumOf(n, (index) => offY(index) ** 2);
  const residualDeviation = requireInRange('residual deviation', Math.sqrt(residual / (n - 2)));
  return {
    slope: requireInRange('slope', slope),
    intercept,
    slopeError: residualDeviation / Math.sqrt(sxx),
    interceptError: residualDeviation * Math.sqrt(1 / n + meanX ** 2 / sxx),
    residualDeviation,
    rSquared: total > 0 ? 1 - residual / total : 1,
  };
}

/** Up to here every pair of points is looked at: 2000 points have two million slopes. */
const exactPointLimit = 2000;
const sampledPairs = 500_000;
/** The same data must give the same line on every device, so the draw has a fixed seed. */
const pairSeed = 0x2f6e2b1;

/** A 32-bit generator of whole numbers below a bound (Marsaglia's xorshift, 2003). */
function drawer(seed: number): (below: number) => number {
  let state = seed;
  return (below) => {
    state ^= state << 13;
    state ^= state >>> 17;
    state ^= state << 5;
    return (state >>> 0) % below;
  };
}

/**
 * Fits a straight line by the median of the slopes between pairs of points; up to 29 % of the points may be wrong.
 *
 *     slope = median((yj - yi) / (xj - xi)) over the pairs with different x;  intercept = median(y - slope x)
 *
 * The median of an even number of slopes is the mean of the middle two. Up to 2000 points every pair counts; above,
 * half a million pairs drawn with a fixed seed, so that the time grows only with n.
 *
 * Throws RangeError on fewer than 2 points, on series of different lengths, on a value that is not finite and when
 * all x are equal. Source: H. Theil (1950), P. K. Sen (1968).
 *
 * @example fitRobustLine([0, 1, 2, 3], [0, 1, 2, 30]) // slope 1.5, intercept 0
 */
export function fitRobustLine(x: ArrayLike<number>, y: ArrayLike<number>): { slope: number; intercept: number } {
  const n = requireSeriesPair(['x', x], ['y', y], 2);
  const slopes = n <= exactPointLimit ? allSlopes(x, y, n) : sampledSlopes(x, y, n);
  if (slopes.length === 0) throw new RangeError(`x are all ${at(x, 0)}; allowed: at least two different values`);
  const slope = requireInRange('slope', medianInPlace(slopes));
  const rests = Float64Array.from({ length: n }, (_, index) => at(y, index) - slope * at(x, index));
  return { slope, intercept: requireInRange('intercept', medianInPlace(rests)) };
}

function allSlopes(x: ArrayLike<number>, y: ArrayLike<number>, n: number): Float64Array {
  const slopes = new Float64Array((n * (n - 1)) / 2);
  let count = 0;
  for (let i = 0; i < n; i++) {
    for (let j = i + 1; j < n; j++) {
      const run = at(x, j) - at(x, i);
      if (run !== 0) slopes[count++] = (at(y, j) - at(y, i)) / run;
    }
  }
  return slopes.subarray(0, count);
}

function sampledSlopes(x: ArrayLike<number>, y: ArrayLike<number>, n: number): Float64Array {
  const draw = drawer(pairSeed);
  const slopes = new Float64Array(sampledPairs);
  let count = 0;
  for (let pair = 0; pair < sampledPairs; pair++) {
    const i = draw(n);
    const j = draw(n);
    const run = at(x, j) - at(x, i);
    if (run !== 0) slopes[count++] = (at(y, j) - at(y, i)) / run;
  }
  return slopes.subarray(0, count);
}
