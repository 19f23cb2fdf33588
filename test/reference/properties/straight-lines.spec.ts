import * as fc from 'fast-check';
import { SimpleLinearRegression } from 'ml-regression-simple-linear';
import { linearRegression, linearRegressionLine, median, rSquared } from 'simple-statistics';
import { jStat } from 'jstat';
import { fitLine, fitRobustLine } from '../../../procedures/calculations';
import { medianOf } from '../../../procedures/calculations/median';
import { checkValues, numberOf } from '../check-values';
import { listOf } from '../reproduce/reproduction';
import { expectClose, readings, thousands } from './runs';

const points = fc
  .array(fc.tuple(readings(-500, 500), readings(-1000, 1000)), { minLength: 3, maxLength: 40 })
  .filter((drawn) => Math.max(...drawn.map(([x]) => x)) - Math.min(...drawn.map(([x]) => x)) > 1);
const split = (drawn: [number, number][]) => [drawn.map(([x]) => x), drawn.map(([, y]) => y)] as const;

describe('fitLine', () => {
  it('agrees with simple-statistics and ml-regression-simple-linear', () => {
    fc.assert(
      fc.property(points, (drawn) => {
        const [x, y] = split(drawn);
        const fit = fitLine(x, y);
        const { m, b } = linearRegression(drawn);
        expectClose(fit.slope, m, 1e-9);
        expectClose(fit.intercept, b, 1e-9);
        const other = new SimpleLinearRegression(x, y);
        expectClose(fit.slope, other.slope, 1e-9);
        expectClose(fit.intercept, other.intercept, 1e-9);
        fc.pre(new Set(y).size > 1);
        expectClose(fit.rSquared, rSquared(drawn, linearRegressionLine({ m, b })), 1e-9);
      }),
      thousands,
    );
  });

  it('has standard errors that belong together: the slope and the correlation have one t', () => {
    // t = slope / slopeError = r sqrt(n - 2) / sqrt(1 - r^2); "Applied Regression Analysis", chapter 1 (from memory).
    fc.assert(
      fc.property(points, (drawn) => {
        const fit = fitLine(...split(drawn));
        fc.pre(fit.rSquared > 1e-6 && fit.rSquared < 1 - 1e-6);
        const t = Math.sqrt((fit.rSquared * (drawn.length - 2)) / (1 - fit.rSquared));
        expectClose(Math.abs(fit.slope / fit.slopeError) / t, 1, 1e-8);
        // Moving the origin to the mean of x leaves only the residuals' share in the intercept's error.
        const meanX = drawn.reduce((sum, [x]) => sum + x, 0) / drawn.length;
        const [x, y] = split(drawn);
        const centred = fitLine(
          x.map((value) => value - meanX),
          y,
        );
        expectClose(centred.interceptError * Math.sqrt(drawn.length), centred.residualDeviation, 1e-9);
      }),
      thousands,
    );
  });

  it('keeps nine figures of Norris far from the origin (NIST StRD, linear least squares, certified)', () => {
    const [, norris] = checkValues('g', 'model').find(([title]) => title.startsWith('NIST StRD Norris'))!;
    // 2^20 and a value of one decimal keep it to 1e-10, so the certified figures must stand to nine.
    const shifted = fitLine(
      listOf(norris, 'x').map((entry) => entry + 2 ** 20),
      listOf(norris, 'y').map((entry) => entry - 2 ** 20),
    );
    const certified = (key: string) => numberOf(norris.expected, key);
    expectClose(shifted.slope / certified('slope'), 1, 1e-9);
    expectClose(shifted.slopeError / certified('slope_stderr'), 1, 1e-9);
    expectClose(shifted.residualDeviation / certified('residual_sd'), 1, 1e-9);
    expectClose(shifted.rSquared, certified('r_squared'), 1e-9);
  });
});

describe('fitRobustLine', () => {
  it('is the median of all slopes, by the medians of simple-statistics and jstat', () => {
    fc.assert(
      fc.property(points, (drawn) => {
        const slopes = drawn.flatMap(([xi, yi], i) =>
          drawn.slice(i + 1).flatMap(([xj, yj]) => (xj === xi ? [] : [(yj - yi) / (xj - xi)])),
        );
        const fit = fitRobustLine(...split(drawn));
        expectClose(fit.slope, median(slopes), 1e-12);
        expectClose(fit.slope, jStat.median(slopes), 1e-12);
        expectClose(fit.intercept, median(drawn.map(([x, y]) => y - fit.slope * x)), 1e-9);
      }),
      thousands,
    );
  });
});

describe('medianOf', () => {
  it('agrees with simple-statistics and jstat, of odd and even counts', () => {
    fc.assert(
      fc.property(fc.array(readings(-1e6, 1e6), { minLength: 1, maxLength: 60 }), (values) => {
        expectClose(medianOf(values), median(values), 1e-9);
        expectClose(medianOf(values), jStat.median(values), 1e-9);
      }),
      thousands,
    );
  });
});
