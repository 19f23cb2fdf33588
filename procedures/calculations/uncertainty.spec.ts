import * as fc from 'fast-check';
import { expandedUncertainty } from './uncertainty';

const size = fc.double({ min: 0, max: 1e6, noNaN: true });

describe('expandedUncertainty', () => {
  it('adds independent sources in squares', () => {
    fc.assert(
      fc.property(
        size,
        size,
        size,
        fc.integer({ min: 1, max: 50 }),
        (accuracy, resolution, repeatDeviation, repeats) => {
          const together = expandedUncertainty({ accuracy, resolution, repeatDeviation, repeats });
          const squares =
            expandedUncertainty({ accuracy }) ** 2 +
            expandedUncertainty({ resolution }) ** 2 +
            expandedUncertainty({ repeatDeviation, repeats }) ** 2;
          expect(Math.abs(together - Math.sqrt(squares))).toBeLessThanOrEqual(1e-9 * (1 + together));
        },
      ),
    );
  });

  it('shrinks a deviation with the square root of the number of readings', () => {
    expect(expandedUncertainty({ repeatDeviation: 0.6, repeats: 9 })).toBeCloseTo(0.4, 12);
  });

  it('is zero when nothing is known to be wrong, and follows k', () => {
    expect(expandedUncertainty({})).toBe(0);
    expect(expandedUncertainty({ accuracy: 1, k: 3 })).toBeCloseTo(Math.sqrt(3), 12);
  });

  it.each([
    [{ accuracy: -1 }, 'accuracy is -1; allowed: 0 or more'],
    [{ resolution: NaN }, 'resolution is NaN'],
    [{ repeatDeviation: Infinity }, 'repeatDeviation is Infinity'],
    [{ repeats: 0 }, 'repeats is 0; allowed: 1 or more'],
    [{ repeats: 2.5 }, 'repeats is 2.5; allowed: a whole number'],
    [{ k: 0 }, 'k is 0; allowed: above 0'],
  ])('refuses %p', (sources, message) => {
    expect(() => expandedUncertainty(sources)).toThrow(RangeError);
    expect(() => expandedUncertainty(sources)).toThrow(message);
  });
});
