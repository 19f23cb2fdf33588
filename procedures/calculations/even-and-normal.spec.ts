import { coveringHalfWidth, coveringSum } from './even-and-normal';

describe('coveringHalfWidth', () => {
  it('is twice the deviation of a normal error, and 95.45 % of an even one', () => {
    expect(coveringHalfWidth(0.05, 0)).toBe(0.1);
    expect(coveringHalfWidth(0, 0.1)).toBeCloseTo(0.09545, 6);
  });

  it.each([
    [1, 0.5],
    [1, 1],
    [0.3, 1],
    [0.05, 1],
  ])('covers 95.45 %% of a normal error of %d plus an even one of %d', (deviation, halfWidth) => {
    const reach = coveringHalfWidth(deviation, halfWidth);
    // The share of the sum inside, by the trapezium rule over the normal error.
    let share = 0;
    const stepZ = 1e-4;
    for (let z = -8; z < 8; z += stepZ) {
      const error = z * deviation;
      const inside = Math.min(halfWidth, reach - error) - Math.max(-halfWidth, -reach - error);
      share += (Math.max(0, inside) / (2 * halfWidth)) * Math.exp((-z * z) / 2) * stepZ;
    }
    expect(share / Math.sqrt(2 * Math.PI)).toBeCloseTo(0.9545, 4);
  });

  it('covers two even errors of one size within one and a half percent of their triangle', () => {
    // A triangle of half-width 2 holds 95.45 % within 2 (1 - sqrt(0.0455)).
    expect(Math.abs(coveringSum(0, 1, 1) / (2 * (1 - Math.sqrt(0.0455))) - 1)).toBeLessThan(0.015);
  });
});
