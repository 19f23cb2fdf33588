import * as fc from 'fast-check';
import { median } from 'simple-statistics';
import { medianInPlace, medianOf } from './median';

describe('medianOf', () => {
  it('agrees with simple-statistics, for odd and even numbers of values and for ties', () => {
    const number = fc
      .oneof(fc.integer({ min: -1e6, max: 1e6 }), fc.integer({ min: 0, max: 3 }))
      .map((thousandths) => thousandths / 1000);
    fc.assert(
      fc.property(fc.array(number, { minLength: 1, maxLength: 60 }), (values) => {
        const before = [...values];
        // The mean of two middle values may differ in its last bit by the order of the sum.
        expect(Math.abs(medianOf(values) - median(values))).toBeLessThanOrEqual(1e-15 * Math.abs(median(values)));
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
