import * as fc from 'fast-check';
import { median } from 'simple-statistics';
import { medianInPlace, medianOf, runningMedianOfFive } from './median';

describe('medianOf', () => {
  it('agrees with simple-statistics, for odd and even numbers of values and for ties', () => {
    const number = fc
      .oneof(fc.integer({ min: -1e6, max: 1e6 }), fc.integer({ min: 0, max: 3 }))
      .map((thousandths) => thousandths / 1000);
    fc.assert(
      fc.property(fc.array(number, { minLength: 1, maxLength: 60 }), (values) => {
        const before = [...values];
        // The mean of two middle values may differ by the rounding of the sum.
        expect(Math.abs(medianOf(values) - median(values))).toBeLessThanOrEqual(1e-12);
        expect(values).toEqual(before);
      }),
    );
  });

  it('looks at the given stretch alone', () => {
    expect(medianOf([100, 1, 2, 3, 100], 1, 4)).toBe(2);
    expect(medianInPlace(Float64Array.of(4, 1, 3, 2, 0), 4)).toBe(2.5);
  });

  it('refuses an empty stretch', () => {
    expect(() => medianOf([])).toThrow(RangeError);
    expect(() => medianOf([1, 2], 2, 1)).toThrow(RangeError);
  });
});

describe('runningMedianOfFive', () => {
  it('is the median of each value and its neighbours', () => {
    fc.assert(
      fc.property(fc.array(fc.integer({ min: -9, max: 9 }), { maxLength: 30 }), (values) => {
        const expected = values.map((_, index) => {
          const reach = Math.min(2, index, values.length - 1 - index);
          return medianOf(values, index - reach, index + reach + 1);
        });
        expect([...runningMedianOfFive(Float64Array.from(values))]).toEqual(expected);
      }),
    );
  });
});
