import * as fc from 'fast-check';
import { linearRegression, linearRegressionLine, median, rSquared } from 'simple-statistics';
import { fitLine, fitRobustLine } from './fit';

/** Readings have a last digit; numbers next to zero would underflow when squared. */
const number = fc.integer({ min: -1_000_000, max: 1_000_000 }).map((thousandths) => thousandths / 1000);
const points = fc
  .array(fc.tuple(fc.integer({ min: -500, max: 500 }), number), { minLength: 3, maxLength: 40 })
  .filter((drawn) => new Set(drawn.map(([x]) => x)).size > 1);
const split = (drawn: [number, number][]) => [drawn.map(([x]) => x), drawn.map(([, y]) => y)] as const;
const expectNear = (result: number, expected: number, tolerance: number) =>
  expect(Math.abs(result - expected)).toBeLessThanOrEqual(tolerance * Math.max(1, Math.abs(expected)));

describe('fitLine', () => {
  it('agrees with simple-statistics', () => {
    fc.assert(
      fc.property(points, (drawn) => {
        const fit = fitLine(...split(drawn));
        const { m, b } = linearRegression(drawn);
        expectNear(fit.slope, m, 1e-8);
        expectNear(fit.intercept, b, 1e-6);
        fc.pre(new Set(drawn.map(([, y]) => y)).size > 1);
        expectNear(fit.rSquared, rSquared(drawn, linearRegressionLine({ m, b })), 1e-6);
      }),
    );
  });

  it('leaves residuals that sum to nothing, alone and times x', () => {
    fc.assert(
      fc.property(points, (drawn) => {
        const { slope, intercept } = fitLine(...split(drawn));
        const residuals = drawn.map(([x, y]) => y - intercept - slope * x);
        expect(Math.abs(residuals.reduce((sum, residual) => sum + residual, 0))).toBeLessThan(1e-6);
        expect(Math.abs(drawn.reduce((sum, [x], index) => sum + x * residuals[index]!, 0))).toBeLessThan(1e-3);
      }),
    );
  });

  it('keeps nine figures when a large offset is added to the data', () => {
    const [x, y] = [
      Array.from({ length: 200 }, (_, index) => index),
      Array.from({ length: 200 }, (_, index) => 3 * index + (index % 7)),
    ];
    const near = fitLine(x, y);
    // Powers of two and whole numbers, so that the shifted data themselves are exact.
    const far = fitLine(
      x.map((value) => value + 2 ** 40),
      y.map((value) => value + 2 ** 40),
    );
    expectNear(far.slope / near.slope, 1, 1e-9);
    expectNear(far.slopeError / near.slopeError, 1, 1e-9);
    expectNear(far.residualDeviation / near.residualDeviation, 1, 1e-9);
    expectNear(far.rSquared / near.rSquared, 1, 1e-9);
  });

  it('calls a level line a perfect fit', () => {
    expect(fitLine([0, 1, 2], [5, 5, 5])).toMatchObject({ slope: 0, intercept: 5, residualDeviation: 0, rSquared: 1 });
  });

  it.each([
    [[0, 1], [0, 1], 'length of x is 2; allowed: 3 or more'],
    [[0, 1, 2], [0, 1], 'length of y is 2; allowed: 3, as of x'],
    [[1, 1, 1], [0, 1, 2], 'x are all 1'],
    [[0, NaN, 2], [0, 1, 2], 'x[1] is NaN'],
    [[0, 1, 2], [0, 1, Infinity], 'y[2] is Infinity'],
    [[-1e200, 0, 1e200], [0, 1, 2], 'sum of squares of x is NaN'],
  ])('refuses %p with %p', (x, y, message) => {
    expect(() => fitLine(x, y)).toThrow(RangeError);
    expect(() => fitLine(x, y)).toThrow(message);
  });
});

describe('fitRobustLine', () => {
  it('is the median of all slopes, by simple-statistics', () => {
    fc.assert(
      fc.property(points, (drawn) => {
        const slopes = drawn.flatMap(([xi, yi], i) =>
          drawn.slice(i + 1).flatMap(([xj, yj]) => (xj === xi ? [] : [(yj - yi) / (xj - xi)])),
        );
        const slope = median(slopes);
        const fit = fitRobustLine(...split(drawn));
        expectNear(fit.slope, slope, 1e-12);
        expectNear(fit.intercept, median(drawn.map(([x, y]) => y - slope * x)), 1e-9);
      }),
    );
  });

  it('keeps its line while a quarter of the points is wrong, whether all pairs are looked at or a draw of them', () => {
    for (const length of [100, 2000, 10_000]) {
      const x = Array.from({ length }, (_, index) => index / length);
      const y = x.map((value, index) => (index % 4 === 1 ? 1000 * value : 2 + 3 * value + 0.01 * Math.sin(index)));
      const { slope, intercept } = fitRobustLine(x, y);
      expect(Math.abs(slope - 3)).toBeLessThan(0.1);
      expect(Math.abs(intercept - 2)).toBeLessThan(0.1);
    }
  });

  it('gives the same line every time above 2000 points, close to that of all pairs', () => {
    const x = Array.from({ length: 2400 }, (_, index) => index);
    const y = x.map((value) => 0.5 * value + 20 * Math.sin(value * 12.9898));
    const drawn = fitRobustLine(x, y);
    expect(fitRobustLine(x, y)).toEqual(drawn);
    expect(Math.abs(drawn.slope - fitRobustLine(x.slice(0, 2000), y.slice(0, 2000)).slope)).toBeLessThan(0.002);
  });

  it('refuses points that make no line', () => {
    expect(() => fitRobustLine([1], [1])).toThrow('length of x is 1; allowed: 2 or more');
    expect(() => fitRobustLine([1, 1], [1, 2])).toThrow('x are all 1');
    expect(() => fitRobustLine([1, 2], [1, NaN])).toThrow('y[1] is NaN');
  });
});
