import type { RampSample } from '../../procedures/calculations';

/** Kilopascals at which the invented valve seals, and when the supply is opened. */
const sealKpa = 3.4;
const restS = 10;

/**
 * An invented ramp with every column: rest, a rise of 0.08 kPa/s with a hiss that stops at the seal, and a quiet end,
 * over 100 s however many samples there are.
 */
export function longRamp(count: number): readonly RampSample[] {
  const chance = xorshift(7);
  return Array.from({ length: count }, (_, index): RampSample => {
    const timeS = (100 * index) / count;
    const gaugeKpa = Math.max(0, (timeS - restS) * 0.08) + 0.01 * chance();
    const hisses = timeS > restS + 1 && gaugeKpa < sealKpa;
    return {
      timeS,
      gaugeKpa,
      mapKpa: 93.9 + gaugeKpa + 0.02 * chance(),
      boostKpa: 93.7 + gaugeKpa + 0.02 * chance(),
      soundDb: (hisses ? -30 : -62) + chance(),
    };
  });
}

/** Numbers from -1 to 1 with a fixed seed (Marsaglia's xorshift, 2003). */
function xorshift(seed: number): () => number {
  let state = seed;
  return () => {
    state ^= state << 13;
    state ^= state >>> 17;
    state ^= state << 5;
    return (state >>> 0) / 2 ** 31 - 1;
  };
}

/** One pass that sums every column: the least that reading the ramp can cost. */
export function sumOfColumns(samples: readonly RampSample[]): readonly number[] {
  let [time, gauge, map, boost, sound] = [0, 0, 0, 0, 0];
  for (const { timeS, gaugeKpa, mapKpa, boostKpa, soundDb } of samples) {
    time += timeS;
    gauge += gaugeKpa ?? 0;
    map += mapKpa;
    boost += boostKpa ?? 0;
    sound += soundDb ?? 0;
  }
  return [time, gauge, map, boost, sound];
}
