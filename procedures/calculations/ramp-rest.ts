import { fitLine } from './fit';
import { medianOf } from './median';
import { indexAt, scatterOf, type RampSeries, type Series } from './ramp-series';

/** A sensor's own reading before the pressure was raised. */
export interface Rest {
  readonly levelKpa: number;
  /** Standard deviation of the level, from the scatter of its samples. */
  readonly deviationKpa: number;
}

/** A rest shorter than this, or of fewer samples, could as well be the ramp itself. */
const shortestRestS = 2;
const fewestRestSamples = 5;
/** A rise is seen only after it has begun: the shares of the seconds before that are tried for the rest. */
const calmShares = [0.75, 0.5, 0.35];
/** How far a rest may drift and still be one. */
const mayDriftKpa = 0.1;
/** What the rest's level is first guessed from. */
const firstLookS = 1;
/** A rise has to be seen in this many samples in a row: a spike is not the start of a ramp. */
const samplesInARow = 3;
const leastRiseKpa = 0.15;
const leastRiseDb = 4;

/** When the series leaves the level that it begins with, upwards and to stay; its last time when it never does. */
function riseTime({ timeS, value }: Series, leastRise: number): number {
  const first = Math.max(fewestRestSamples, indexAt(timeS, (timeS[0] ?? NaN) + firstLookS));
  const look = Math.min(first, timeS.length);
  if (look === 0) return NaN;
  const threshold = medianOf(value, 0, look) + Math.max(leastRise, 4 * scatterOf(value, 0, look));
  let inARow = 0;
  for (let index = 0; index < timeS.length; index++) {
    inARow = (value[index] ?? NaN) > threshold ? inARow + 1 : 0;
    if (inARow === samplesInARow) return timeS[index + 1 - samplesInARow] ?? NaN;
  }
  return timeS[timeS.length - 1] ?? NaN;
}

/** When the sound level leaves its background; the end of the series when it never does. */
export const noiseBegins = (sound: Series): number => riseTime(sound, leastRiseDb);

/**
 * The level of the pressure series at rest, given when the rest was seen to end: undefined when it is too short to tell
 * or when the pressure was rising all along, as in a recording that begins in the middle of a ramp.
 */
export function restBefore(pressure: Series, seenEndS: number, resolutionKpa: number): Rest | undefined {
  for (const share of calmShares) {
    const rest = calmRest(pressure, share * (seenEndS - (pressure.timeS[0] ?? NaN)), resolutionKpa);
    if (rest !== undefined) return rest;
  }
  return undefined;
}

function calmRest({ timeS, value }: Series, lengthS: number, resolutionKpa: number): Rest | undefined {
  const startS = timeS[0] ?? NaN;
  const count = indexAt(timeS, startS + lengthS);
  if (!(lengthS >= shortestRestS) || count < fewestRestSamples) return undefined;
  const offS = timeS.subarray(0, count).map((time) => time - startS);
  const { slope, slopeError } = fitLine(offS, value.subarray(0, count));
  const surelyDriftsKpa = (Math.abs(slope) - 2 * slopeError) * lengthS;
  if (surelyDriftsKpa > Math.max(mayDriftKpa, resolutionKpa / 2)) return undefined;
  let sum = 0;
  for (let index = 0; index < count; index++) sum += value[index] ?? NaN;
  return {
    levelKpa: sum / count,
    deviationKpa: scatterOf(value, 0, count) / Math.sqrt(count),
  };
}

/** The rest at the start of a ramp: before the pressure rises and before the hiss begins. */
export function initialRest({ pressure, sound }: RampSeries, resolutionKpa: number): Rest | undefined {
  const pressureRiseS = riseTime(pressure, Math.max(leastRiseKpa, 1.1 * resolutionKpa));
  return restBefore(pressure, Math.min(pressureRiseS, noiseBegins(sound)), resolutionKpa);
}
