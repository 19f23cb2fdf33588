import { fitLine, fitRobustLine } from '../../../procedures/calculations';
import { listOf, type Reproduction, type Results } from './reproduction';

const ols = (x: number[], y: number[]): Results => {
  const fit = fitLine(x, y);
  return {
    slope: fit.slope,
    intercept: fit.intercept,
    slope_stderr: fit.slopeError,
    intercept_stderr: fit.interceptError,
    residual_sd: fit.residualDeviation,
    r_squared: fit.rSquared,
  };
};

const medianOf = (values: number[]): number => {
  const sorted = [...values].sort((a, b) => a - b);
  const half = sorted.length / 2;
  return (sorted[Math.ceil(half) - 1]! + sorted[Math.floor(half)]!) / 2;
};

/** The product's intercept is the median of the residuals; the other convention in use differs a little. */
function theilSen(x: number[], y: number[]): Results {
  const { slope, intercept } = fitRobustLine(x, y);
  const intercept_medians = medianOf(y) - slope * medianOf(x);
  return { slope, intercept_median_of_residuals: intercept, intercept_medians };
}

/** The fit with error on both axes (Deming), out of the product's two fits: y over x, and x over y. */
function bothAxes(x: number[], y: number[], varianceRatio: number): Results {
  const yOverX = fitLine(x, y).slope;
  const xOverY = fitLine(y, x).slope;
  // Syy / Sxx is the ratio of the two slopes.
  const spread = yOverX / xOverY - varianceRatio;
  const slope = (spread + Math.sqrt(spread ** 2 + 4 * varianceRatio * yOverX ** 2)) / (2 * yOverX);
  const mean = (values: number[]) => values.reduce((sum, value) => sum + value, 0) / values.length;
  return { slope, intercept: mean(y) - slope * mean(x) };
}

/** A line through the origin is the line through the points and their mirror images; twice the points, same scatter. */
function throughOrigin(x: number[], y: number[]): Results {
  const mirrored = (values: number[]) => [...values, ...values.map((value) => -value)];
  const fit = fitLine(mirrored(x), mirrored(y));
  return {
    slope: fit.slope,
    slope_stderr: fit.slopeError * Math.SQRT2,
    residual_sd: fit.residualDeviation,
    r_squared: fit.rSquared,
  };
}

/** Section g: straight lines. */
export const straightLines: readonly Reproduction[] = [
  {
    topic: 'g',
    inputs: ['x', 'y', 'model'],
    only: ({ expected }) => 'intercept' in expected,
    give: (_given, value) => ols(listOf(value, 'x'), listOf(value, 'y')),
  },
  {
    topic: 'g',
    inputs: ['x', 'y', 'model'],
    only: ({ expected }) => !('intercept' in expected),
    give: (_given, value) => throughOrigin(listOf(value, 'x'), listOf(value, 'y')),
  },
  {
    topic: 'g',
    inputs: ['x', 'y'],
    give: (_given, value) => {
      const [x, y] = [listOf(value, 'x'), listOf(value, 'y')];
      const weighted = 'tls_lambda4' in value.expected ? { tls_lambda4: bothAxes(x, y, 4) } : {};
      return { ols: ols(x, y), theil_sen: theilSen(x, y), tls_lambda1: bothAxes(x, y, 1), ...weighted };
    },
  },
];
