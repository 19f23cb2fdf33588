import { fitLine } from '../../../procedures/calculations';
import { splitTwoLines, splitTwoMeans } from '../../../procedures/calculations/change-point';
import { cumulativeSum, firstSignal } from '../published-formulas';
import { listOf, type Reproduction, type Results } from './reproduction';

const meanOf = (values: number[]) => values.reduce((sum, value) => sum + value, 0) / values.length;

/** What a straight line over x leaves of the values. */
function residuals(x: number[], values: number[]): number[] {
  const { slope, intercept } = fitLine(x, values);
  return values.map((value, index) => value - intercept - slope * x[index]!);
}

/** Two lines that meet at a knee: least squares in three numbers, by what a line over x leaves of both sides. */
function hingeAt(knee: number, x: number[], y: number[]) {
  const beyond = x.map((value) => Math.max(0, value - knee));
  const { slope: bend } = fitLine(residuals(x, beyond), residuals(x, y));
  const straightened = y.map((value, index) => value - bend * beyond[index]!);
  const { slope, intercept } = fitLine(x, straightened);
  const squares = residuals(x, straightened).reduce((sum, residual) => sum + residual ** 2, 0);
  return { knee, bend, slope, intercept, squares };
}

/** The best knee, looked for ever more closely: the squares have one lowest place between the ends. */
function hinge(x: number[], y: number[]) {
  let [low, high] = [Math.min(...x), Math.max(...x)];
  const margin = (high - low) / 20;
  [low, high] = [low + margin, high - margin];
  let best = hingeAt((low + high) / 2, x, y);
  while (high - low > 1e-7) {
    const width = (high - low) / 40;
    const tried = Array.from({ length: 41 }, (_, index) => hingeAt(low + index * width, x, y));
    best = tried.reduce((found, next) => (next.squares < found.squares ? next : found));
    [low, high] = [best.knee - 2 * width, best.knee + 2 * width];
  }
  return best;
}

function cusum(x: number[], target: number, k: number, h: number): Results {
  const upper = cumulativeSum(x, target, k, 1);
  const lower = cumulativeSum(x, target, k, -1);
  return {
    upper,
    lower,
    first_signal: firstSignal(
      upper.map((sum, index) => Math.max(sum, lower[index]!)),
      h,
    ),
  };
}

/** Section h: change points. The product uses the two-line and two-mean splits; the rest was weighed and not taken. */
export const changePoints: readonly Reproduction[] = [
  {
    topic: 'h',
    inputs: ['y', 'method'],
    give: (_given, value) => {
      const y = listOf(value, 'y');
      const { count, squaredError } = splitTwoMeans(y);
      return {
        split_after_index_1based: count,
        sse: squaredError,
        mean_before: meanOf(y.slice(0, count)),
        mean_after: meanOf(y.slice(count)),
      };
    },
  },
  {
    topic: 'h',
    inputs: ['x', 'y', 'method'],
    give: (_given, value) => {
      const found = hinge(listOf(value, 'x'), listOf(value, 'y'));
      return {
        knee: found.knee,
        slope1: found.slope,
        slope2: found.slope + found.bend,
        intercept: found.intercept,
        sse: found.squares,
      };
    },
  },
  {
    topic: 'h',
    inputs: ['x', 'target', 'k', 'h'],
    give: (given, value) => {
      const [x, target, k, h] = [listOf(value, 'x'), given('target'), given('k'), given('h')];
      const all = cusum(x, target, k, h);
      if (!('upper_head_start_2p5' in value.expected)) return all;
      const headStart = cumulativeSum(x, target, k, 1, 2.5);
      return {
        upper: all['upper'],
        first_signal: all['first_signal'],
        upper_head_start_2p5: headStart,
        first_signal_head_start: firstSignal(headStart, h),
      };
    },
  },
  {
    topic: 'h',
    inputs: ['x', 'y', 'min_segment'],
    only: ({ expected }) => 'hinge_knee' in expected,
    give: (given, value) => {
      const [x, y] = [listOf(value, 'x'), listOf(value, 'y')];
      const lines = splitTwoLines(x, y, given('min_segment'));
      const knee = hinge(x, y);
      return {
        split_after_index_1based: lines.count,
        sse_two_lines: lines.squaredError,
        hinge_knee: knee.knee,
        hinge_slope1: knee.slope,
        hinge_slope2: knee.slope + knee.bend,
        hinge_intercept: knee.intercept,
        hinge_sse: knee.squares,
      };
    },
  },
  {
    topic: 'h',
    inputs: ['x', 'y', 'min_segment'],
    only: ({ expected }) => !('hinge_knee' in expected),
    give: (given, value) => {
      const [x, y, least] = [listOf(value, 'x'), listOf(value, 'y'), given('min_segment')];
      const [lines, means] = [splitTwoLines(x, y, least), splitTwoMeans(y, least)];
      return {
        split_after_index_1based_lines: lines.count,
        sse_two_lines: lines.squaredError,
        split_after_index_1based_means: means.count,
        sse_two_means: means.squaredError,
      };
    },
  },
];
