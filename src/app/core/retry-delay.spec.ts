import { retryDelayMs } from './retry-delay';

describe('retryDelayMs', () => {
  it('doubles its ceiling from 2 s to 5 min', () => {
    const ceilings = [1, 2, 3, 7, 8, 9, 50].map((failures) => retryDelayMs(failures, 1 - Number.EPSILON));
    expect(ceilings).toEqual([2000, 4000, 8000, 128_000, 256_000, 300_000, 300_000]);
  });

  it('takes any share of it, from nothing on', () => {
    expect([0, 0.25, 0.5].map((share) => retryDelayMs(3, share))).toEqual([0, 2000, 4000]);
  });
});
