import { noiseBegins } from './ramp-rest';
import { rampSeries, type RampSample } from './ramp-series';

/** Fewer samples with a sound level than this have no background to be told from. */
const fewestSamples = 16;

/**
 * When the sound level of a ramp leaves its background to stay above it, seconds on the samples' own clock; undefined
 * when it never does, as without a level or with a noise that was there from the start.
 *
 * Throws RangeError on a reading or time that is not finite and on times that run backwards.
 */
export function findNoiseBegin(samples: readonly RampSample[]): number | undefined {
  const { sound } = rampSeries(samples);
  if (sound.timeS.length < fewestSamples) return undefined;
  const beginsS = noiseBegins(sound);
  return beginsS < (sound.timeS.at(-1) ?? NaN) ? beginsS : undefined;
}
