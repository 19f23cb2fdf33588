/** Numbers that look random and come again with the same seed. */
export interface SeededRandom {
  /** Evenly in [low, high). */
  between(low: number, high: number): number;
  /** A whole number from low to high, both of them too. */
  whole(low: number, high: number): number;
  /** Normal about 0 with this standard deviation. */
  normal(deviation: number): number;
  /** Evenly in the logarithm, for rates and times that span a decade. */
  decade(low: number, high: number): number;
  chance(share: number): boolean;
  pick<T>(choices: readonly [T, ...T[]]): T;
}

// A test runner looks globals up slowly, and these are called millions of times.
const { cos, imul, log, PI, sqrt } = Math;

/** Mulberry32, a 32-bit generator in the public domain: good enough for a simulation, not for secrets. */
export function seededRandom(seed: number): SeededRandom {
  let state = seed >>> 0;
  const next = (): number => {
    state = (state + 0x6d2b79f5) >>> 0;
    let mixed = imul(state ^ (state >>> 15), 1 | state);
    mixed = (mixed + imul(mixed ^ (mixed >>> 7), 61 | mixed)) ^ mixed;
    return ((mixed ^ (mixed >>> 14)) >>> 0) / 2 ** 32;
  };
  // The first numbers of neighbouring seeds resemble each other.
  for (let count = 0; count < 4; count++) next();
  const between = (low: number, high: number): number => low + (high - low) * next();
  return {
    between,
    whole: (low, high) => Math.floor(between(low, high + 1)),
    // Box and Muller (1958).
    normal: (deviation) => deviation * sqrt(-2 * log(1 - next())) * cos(2 * PI * next()),
    decade: (low, high) => Math.exp(between(Math.log(low), Math.log(high))),
    chance: (share) => next() < share,
    pick: (choices) => choices[Math.floor(next() * choices.length)] ?? choices[0],
  };
}
