import * as fc from 'fast-check';
import { splitTwoLines, splitTwoMeans, squaredErrorAboutMean } from './change-point';

const level = fc.integer({ min: -500, max: 500 }).map((tenths) => tenths / 10);
const levels = fc.array(level, { minLength: 6, maxLength: 30 });
const squares = (values: readonly number[]) => {
  const mean = values.reduce((sum, value) => sum + value, 0) / values.length;
  return values.reduce((sum, value) => sum + (value - mean) ** 2, 0);
};

describe('splitTwoMeans', () => {
  it('leaves no more error than any other cut, summed plainly', () => {
    fc.assert(
      fc.property(levels, (y) => {
        const { count, squaredError } = splitTwoMeans(y);
        const errors = y.slice(1).map((_, index) => squares(y.slice(0, index + 1)) + squares(y.slice(index + 1)));
        expect(squaredError).toBeCloseTo(Math.min(...errors), 6);
        expect(errors[count - 1]).toBeCloseTo(squaredError, 6);
      }),
    );
  });

  it('keeps both parts as long as asked, and never does worse than one mean', () => {
    fc.assert(
      fc.property(levels, (y) => {
        const { count, squaredError } = splitTwoMeans(y, 3);
        expect(count).toBeGreaterThanOrEqual(3);
        expect(y.length - count).toBeGreaterThanOrEqual(3);
        expect(squaredError).toBeLessThanOrEqual(squaredErrorAboutMean(y) + 1e-9);
      }),
    );
  });
});

describe('splitTwoLines', () => {
  it('finds a jump between two lines exactly, whatever is added to both axes', () => {
    const shift = fc.integer({ min: -1e6, max: 1e6 });
    fc.assert(
      fc.property(fc.integer({ min: 4, max: 16 }), shift, shift, (cut, shiftX, shiftY) => {
        const x = Array.from({ length: 20 }, (_, index) => index + shiftX);
        const y = x.map((_, index) => shiftY + (index < cut ? 2 * index : 100 - index));
        const { count, squaredError } = splitTwoLines(x, y, 4);
        expect(count).toBe(cut);
        expect(squaredError).toBeLessThan(1e-3);
      }),
    );
  });

  it('refuses a series that is too short to cut and one with holes', () => {
    expect(() => splitTwoLines([0, 1, 2], [0, 1, 2])).toThrow('number of values is 3; allowed: 6 or more');
    expect(() => splitTwoMeans([0, NaN, 2])).toThrow(RangeError);
  });
});
