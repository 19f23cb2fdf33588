import { fitLine, fitRobustLine } from '../../procedures/calculations';
import { checkValues, expectWithin, numberOf, type CheckValue } from './check-values';

const seriesOf = ({ inputs }: CheckValue) => [inputs['x'] as number[], inputs['y'] as number[]] as const;
const all = checkValues('g', 'x', 'y');

describe('straight lines by least squares', () => {
  it.each(all.filter(([, { expected }]) => 'intercept' in expected))('%s', (_title, value) => {
    const fit = fitLine(...seriesOf(value));
    expectWithin(value, 'slope', fit.slope);
    expectWithin(value, 'intercept', fit.intercept);
    expectWithin(value, 'slope_stderr', fit.slopeError);
    expectWithin(value, 'intercept_stderr', fit.interceptError);
    expectWithin(value, 'residual_sd', fit.residualDeviation);
    expectWithin(value, 'r_squared', fit.rSquared);
  });

  it.each(all.filter(([, { expected }]) => 'ols' in expected))('%s', (_title, value) => {
    const ols = { ...value, expected: value.expected['ols'] as Record<string, unknown> };
    const fit = fitLine(...seriesOf(value));
    expectWithin(ols, 'slope', fit.slope);
    expectWithin(ols, 'intercept', fit.intercept);
    expectWithin(ols, 'slope_stderr', fit.slopeError);
    expectWithin(ols, 'residual_sd', fit.residualDeviation);
    expectWithin(ols, 'r_squared', fit.rSquared);
  });

  it('keeps the certified slope of Norris (NIST StRD, linear least squares) with offsets that are exact', () => {
    const [, norris] = all.find(([title]) => title.startsWith('NIST StRD Norris'))!;
    const [x, y] = seriesOf(norris);
    // 2^20 + a value of one decimal keeps it to 1e-10; the certified slope then stands to nine figures.
    const shifted = fitLine(
      x.map((value) => value + 2 ** 20),
      y.map((value) => value - 2 ** 20),
    );
    const certified = numberOf(norris.expected, 'slope');
    expect(Math.abs(shifted.slope - certified)).toBeLessThanOrEqual(1e-9 * certified);
  });
});

describe('straight lines by the median of slopes', () => {
  it.each(all.filter(([, { expected }]) => 'theil_sen' in expected))('%s', (_title, value) => {
    const robust = { ...value, expected: value.expected['theil_sen'] as Record<string, unknown> };
    const { slope, intercept } = fitRobustLine(...seriesOf(value));
    expectWithin(robust, 'slope', slope);
    expectWithin(robust, 'intercept_median_of_residuals', intercept);
  });
});
