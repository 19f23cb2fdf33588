import { requireInRange } from './argument-range';
import { shortestQuietS } from './drop-place';
import { heldUntil } from './pressure-held';
import { readPressureAt } from './pressure-reading';
import { quickestTurnS } from './pressure-swing';
import { initialRest, noiseBegins } from './ramp-rest';
import {
  indexAt,
  rampSeries,
  samplesBetween,
  smallestStep,
  type RampSample,
  type RampSeries,
  type Series,
} from './ramp-series';
import { sealAt, type NoSealReason, type SealFacts, type SealOptions, type SealPoint } from './seal-result';
import { soundDrops, type SoundDrop } from './sound-drop';

/** Fewer samples with a sound level than this have no two levels to compare. */
const fewestSamples = 16;
/** How long the quiet is looked at where there is more. */
const longestQuietS = 10;
const fewestQuietSamples = 4;
/** Share of the samples after the drop that have to be quiet. */
const quietShare = 0.8;
/** While it chatters a valve is shut no longer than this (our allowance; no source). */
const longestTurnS = 1;
/** How far around a seal point found among averages the single samples are looked at. */
const closeLookS = 20;

/** Whether the drop is the seal: the pressure stays up and the quiet lasts. */
function refusal(series: RampSeries, drop: SoundDrop, resolutionKpa: number): NoSealReason | undefined {
  const { timeS, value } = series.sound;
  const firstQuiet = drop.lastLoud + 1;
  const quietFromS = timeS[firstQuiet] ?? NaN;
  const heldS = heldUntil(series.pressure, quietFromS, longestQuietS, resolutionKpa);
  if (heldS - quietFromS < shortestQuietS) return 'pressure-fell';
  const end = indexAt(timeS, Math.min(heldS, quietFromS + longestQuietS));
  const lastsS = (timeS[end - 1] ?? NaN) - quietFromS;
  let [quiet, heard] = [0, 0];
  for (let index = firstQuiet; index < end; index++) {
    if ((value[index] ?? NaN) < drop.midLevelDb) quiet++;
    if (!drop.isBurst(index)) heard++;
  }
  const isLong = lastsS >= shortestQuietS - 1e-9 && heard >= fewestQuietSamples;
  return isLong && quiet >= quietShare * heard ? undefined : 'quiet-too-short';
}

/**
 * Finds the pressure at which the noise of the air goes away for good while the pressure is raised: the seal point.
 *
 * The drop is a jump of the sound level, not a knee. Its neighbourhood is found by a moving-sum contrast (MOSUM; Bauer
 * and Hackl, 1980) on the level without its bursts (opening; Serra, 1982), its place by two-segment least squares without
 * continuity (the one-break case of Bai and Perron, 1998 and 2003), and where the noise comes back and goes again, as
 * with a valve that chatters, by the most likely sequence of loud and quiet (Viterbi, 1967). It counts as the seal by its
 * size (4 dB and four times its own scatter), its sign, the quiet that follows (3 s at least, four fifths of what comes
 * within 10 s) and the pressure, which may not fall with it. The pressure is read just before the drop, since the next
 * sample has already jumped, with an allowance for the last way of the valve.
 *
 * The uncertainty covers about 95 %: on simulated ramps of many kinds between 93 and 99 %. What it cannot know of is a
 * valve that chatters wholly inside a gap of the recording.
 *
 * Samples may be uneven and have gaps; a gap at the drop widens the uncertainty. A sensor's offset does not move the
 * result. Linear time.
 *
 * Throws RangeError on a reading or time that is not finite, on times that run backwards, on a station pressure that
 * is not above 0 kPa and on a negative resolution.
 *
 * @example findSealPoint(samples, { stationKpa: 93.9 }) // { sealed: true, timeS: 54.25, aboveStationKpa: 3.43, ... }
 */
export function findSealPoint(samples: readonly RampSample[], { stationKpa, resolutionKpa }: SealOptions): SealPoint {
  requireInRange('stationKpa', stationKpa, { low: 0, aboveLow: true });
  if (resolutionKpa !== undefined) requireInRange('resolutionKpa', resolutionKpa, { low: 0 });
  const series = rampSeries(samples);
  const stepKpa = resolutionKpa ?? smallestStep(samples, series.isGauge ? 'gaugeKpa' : 'mapKpa');
  if (series.sound.timeS.length < fewestSamples) return { sealed: false, reason: 'too-little-data' };
  const rest = series.isGauge ? undefined : initialRest(series, stepKpa);
  if (!series.isGauge && rest === undefined) return { sealed: false, reason: 'no-rest' };
  const facts = { rest, stationKpa, resolutionKpa: stepKpa };
  const found = sealIn(series, facts);
  if (!found.sealed || series.blockSize === 1) return found;
  // Found among averages: look again where it is, sample by sample.
  const near = rampSeries(samplesBetween(samples, found.timeS - closeLookS, found.timeS + closeLookS));
  const closer = near.isGauge === series.isGauge ? sealIn(near, facts) : found;
  return closer.sealed ? closer : found;
}

/** How long the valve may have been open still after it was last heard. */
function unheardAfter({ timeS: times }: Series, { lastLoud, firstShut, loudFrom }: SoundDrop) {
  const timeS = times[lastLoud] ?? NaN;
  let [end, shut] = [lastLoud + 1, firstShut];
  // One that chatters may have gone on in a gap that follows, even if it was quiet just before that.
  for (let index = end + 1; loudFrom !== undefined && (times[index - 1] ?? NaN) - timeS < longestTurnS; index++) {
    if ((times[index] ?? NaN) - (times[index - 1] ?? NaN) > quickestTurnS) end = shut = index;
  }
  const gapS = (times[end] ?? NaN) - timeS;
  return { gapS, shutByS: times[shut], sinceS: loudFrom === undefined ? undefined : times[loudFrom] };
}

function sealIn(series: RampSeries, facts: Omit<SealFacts, 'timeS' | 'confidence'>): SealPoint {
  const { sound, pressure } = series;
  let reason: NoSealReason = noiseBegins(sound) < (sound.timeS.at(-1) ?? NaN) ? 'never-quiet' : 'no-noise';
  for (const [rank, drop] of soundDrops(series, facts.resolutionKpa).entries()) {
    const timeS = sound.timeS[drop.lastLoud] ?? NaN;
    const refused = refusal(series, drop, facts.resolutionKpa);
    if (refused === undefined) {
      const reading = readPressureAt(pressure, {
        timeS,
        resolutionKpa: facts.resolutionKpa,
        ...unheardAfter(sound, drop),
      });
      return sealAt(reading, { ...facts, timeS, confidence: drop.explained });
    }
    if (rank === 0) reason = refused;
  }
  return { sealed: false, reason };
}
