import { requireInRange } from './argument-range';
import { readPressureAt } from './pressure-reading';
import { readSwing } from './pressure-swing';
import { restBefore } from './ramp-rest';
import { rampSeries, smallestStep, type RampSample } from './ramp-series';
import { sealAt, type SealOptions, type SealPoint } from './seal-result';
import { explainedByTwoLevels } from './sound-drop';

/** The two moments that a person marked while listening, on the samples' own clock. */
export interface SealMarks extends SealOptions {
  readonly noiseBeginsS: number;
  readonly noiseStopsS: number;
}

// A simple reaction to a sound that ends takes 0.2 s or a little more; to be sure of it and tap takes up to a second
// (our allowance; no source).
const quickestReactionS = 0.2;
const slowestReactionS = 1;
const fewestSamples = 3;

/**
 * Gives the seal point from the marks of a person who listened: the result of `findSealPoint` without its analysis.
 *
 * The mark comes 0.2 to 1 s after the noise has gone, when the pressure has already jumped. So the pressure is read
 * 1 s before the mark, and what it may have risen until 0.2 s before it is in the value (half) and in the uncertainty
 * (half, as a rectangular half-width). `timeS` is the middle of that stretch. Without a gauge the manifold pressure is
 * taken from its own rest before `noiseBeginsS`. Where the pressure swung down shortly before, as with a valve that
 * chatters, it is anywhere between its lowest and highest reading of that stretch. k = 2, both ends of the stretch
 * inside; a reaction slower or quicker than that is not covered. `confidence` tells how far a recorded sound level bears the mark out,
 * 0 without one.
 *
 * Throws RangeError as `findSealPoint` does, when the marks are not inside the samples' time, and when `noiseStopsS`
 * is not after `noiseBeginsS`. Source: JCGM 100:2008, 4.3.7, for the rectangular share of the reaction time.
 *
 * @example sealPointFromMarks(samples, { noiseBeginsS: 12, noiseStopsS: 55, stationKpa: 93.9 })
 */
export function sealPointFromMarks(samples: readonly RampSample[], marks: SealMarks): SealPoint {
  const { noiseBeginsS, noiseStopsS, stationKpa, resolutionKpa } = marks;
  requireInRange('stationKpa', stationKpa, { low: 0, aboveLow: true });
  if (resolutionKpa !== undefined) requireInRange('resolutionKpa', resolutionKpa, { low: 0 });
  const { pressure, sound, isGauge } = rampSeries(samples);
  const [first, last] = [pressure.timeS[0], pressure.timeS.at(-1)];
  if (first === undefined || last === undefined || pressure.timeS.length < fewestSamples) {
    return { sealed: false, reason: 'too-little-data' };
  }
  requireInRange('noiseBeginsS', noiseBeginsS, { low: first, high: last });
  requireInRange('noiseStopsS', noiseStopsS, { low: noiseBeginsS, high: last, aboveLow: true });
  const stepKpa = resolutionKpa ?? smallestStep(samples, isGauge ? 'gaugeKpa' : 'mapKpa');
  const rest = isGauge ? undefined : restBefore(pressure, noiseBeginsS, stepKpa);
  if (!isGauge && rest === undefined) return { sealed: false, reason: 'no-rest' };
  const place = {
    timeS: noiseStopsS - slowestReactionS,
    gapS: slowestReactionS - quickestReactionS,
    resolutionKpa: stepKpa,
  };
  const reading = readSwing(pressure, place) ?? readPressureAt(pressure, place);
  const timeS = noiseStopsS - (slowestReactionS + quickestReactionS) / 2;
  return sealAt(reading, {
    timeS,
    rest,
    stationKpa,
    resolutionKpa: stepKpa,
    coversEnds: true,
    confidence: explainedByTwoLevels(sound, timeS),
  });
}
