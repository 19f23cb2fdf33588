import { findNoiseBegin } from './noise-begin';
import type { RampSample } from './ramp-series';

/** A level of 50 dB that goes up to 62 dB for a while, four samples a second, with a ripple of its own. */
const heard = (fromS: number, untilS: number): RampSample[] =>
  Array.from({ length: 241 }, (_, index) => {
    const timeS = index / 4;
    const soundDb = (timeS >= fromS && timeS < untilS ? 62 : 50) + 0.3 * Math.sin(index);
    return { timeS, gaugeKpa: timeS / 10, mapKpa: 94 + timeS / 10, boostKpa: undefined, soundDb };
  });

describe('the begin of the noise', () => {
  it.each([8, 21.5])('is found where the level leaves its background, at %d s', (fromS) => {
    expect(findNoiseBegin(heard(fromS, 50))).toBeCloseTo(fromS, 1);
  });

  it('is not told where it was there from the start, never came, or no level was logged', () => {
    expect(findNoiseBegin(heard(0, 61))).toBeUndefined();
    expect(findNoiseBegin(heard(100, 101))).toBeUndefined();
    expect(findNoiseBegin(heard(8, 50).map((sample) => ({ ...sample, soundDb: undefined })))).toBeUndefined();
  });

  it('is not told by a short knock', () => {
    expect(findNoiseBegin(heard(8, 8.5))).toBeUndefined();
  });
});
