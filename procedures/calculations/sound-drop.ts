import { splitTwoLines, splitTwoMeans, squaredErrorAboutMean } from './change-point';
import {
  burstsOf,
  fewestSamples,
  leastBurstDb,
  longestBurstS,
  placeAmongRuns,
  windowAfter,
  windowBefore,
  windowS,
  type IsBurst,
  type PlacedDrop,
} from './drop-place';
import { medianOf, runningMedianOfFive } from './median';
import { indexAt, scatterOf, type RampSeries, type Series } from './ramp-series';
import { withoutBursts } from './without-bursts';

/** A place where the sound level falls. */
export interface SoundDrop {
  /** Index of the last loud sample. */
  readonly lastLoud: number;
  /** Index of the first sample that is as quiet as those that follow: the valve is shut by then. */
  readonly firstShut: number;
  /** How far the level falls, median to median. */
  readonly dropDb: number;
  /** How far it would have to fall to stand out of its own scatter. */
  readonly requiredDb: number;
  /** Half-way between loud and quiet. */
  readonly midLevelDb: number;
  /** Index from which it was loud the last time, where the noise had gone and come back shortly before. */
  readonly loudFrom: number | undefined;
  /** Whether a sample is part of a cough or a clank: short, and louder than the hiss of this valve. */
  readonly isBurst: IsBurst;
  /** Share of the level's variation around the drop that two levels explain, 0 to 1. */
  readonly explained: number;
}

/** The least drop that counts, two and a half times less power (our choice; no source). */
const leastDropDb = 4;
/** Times the standard deviation of the difference of the two medians. */
const standsOut = 4;
/** How steady a hiss is at best about its own level. */
const leastScatterDb = 1;
/** The standard deviation of a median against that of a mean, for normal scatter: sqrt(pi / 2). */
const medianPenalty = Math.sqrt(Math.PI / 2);

/**
 * Finds the places where the mean level of the seconds before exceeds that of the seconds after by half the least
 * drop or more, the largest difference of each neighbourhood alone. Gives the counts of samples before.
 *
 * Linear time. Source: moving-sum contrast for a change of mean (MOSUM; Bauer and Hackl, 1980).
 */
function possibleDrops({ timeS, value }: Series): number[] {
  const n = timeS.length;
  const at = (index: number): number => value[index] ?? NaN;
  const found: number[] = [];
  let best = 0;
  let bestContrast = leastDropDb / 2;
  // value[start..count) and value[count..end) with their sums, which move along by the samples that enter and leave.
  let [start, end] = [0, fewestSamples];
  let [before, after] = [0, 0];
  for (let index = 0; index < fewestSamples; index++) after += at(index);
  for (let count = 1; count <= n - fewestSamples; count++) {
    const lastBefore = timeS[count - 1] ?? NaN;
    const firstAfter = timeS[count] ?? NaN;
    before += at(count - 1);
    after -= at(count - 1);
    while (start < count - fewestSamples && (timeS[start] ?? NaN) < lastBefore - windowS) before -= at(start++);
    while (end < n && (end < count + fewestSamples || (timeS[end] ?? NaN) <= firstAfter + windowS)) after += at(end++);
    if (count < fewestSamples) continue;
    if (best > 0 && lastBefore - (timeS[best] ?? NaN) > windowS) {
      found.push(best);
      best = 0;
      bestContrast = leastDropDb / 2;
    }
    const contrast = before / (count - start) - after / (end - count);
    if (contrast > bestContrast) {
      bestContrast = contrast;
      best = count;
    }
  }
  if (best > 0) found.push(best);
  return found;
}

/** 1 - (squared error about the best two levels) / (that about one level): 0 to 1. */
function shareOfTwoLevels(level: Float64Array): number {
  const total = squaredErrorAboutMean(level);
  return total > 0 ? Math.max(0, 1 - splitTwoMeans(level, 3).squaredError / total) : 0;
}

/**
 * How much of the sound level's variation in the seconds around `timeS` two levels explain, 0 to 1; 0 where there is
 * too little of it to tell.
 */
export function explainedByTwoLevels({ timeS: times, value }: Series, timeS: number): number {
  const from = indexAt(times, timeS - windowS);
  const to = indexAt(times, timeS + windowS);
  return to - from < fewestSamples ? 0 : shareOfTwoLevels(runningMedianOfFive(value.slice(from, to)));
}

/** A drop at `firstQuiet` with the median levels of the seconds on both sides. */
function levelsBeside(sound: Series, calmDb: Float64Array, firstQuiet: number): PlacedDrop {
  return {
    lastLoud: firstQuiet - 1,
    loudFrom: undefined,
    others: [],
    loudDb: medianOf(calmDb, windowBefore(sound, firstQuiet), firstQuiet),
    quietDb: medianOf(calmDb, firstQuiet, windowAfter(sound, firstQuiet)),
  };
}

/** Places a possible drop to the sample, and measures it by medians. */
function measureDrop(series: RampSeries, calmDb: Float64Array, possible: number, resolutionKpa: number): SoundDrop {
  const { sound } = series;
  const { timeS, value } = sound;
  const [from, to] = [windowBefore(sound, possible), windowAfter(sound, possible)];
  const calm = calmDb.subarray(from, to);
  // From both sides at once: two seconds alone would be at the mercy of one clank.
  const scatterDb = scatterOf(value, from, to);
  const wanderDb = Math.max(leastScatterDb, scatterDb);
  // The best cut of a valve that chatters may be a place where the noise comes back: then the contrast's own has to do.
  let drop = levelsBeside(sound, calmDb, from + splitTwoLines(timeS.subarray(from, to), calm, 3).count);
  if (drop.loudDb - drop.quietDb < leastDropDb / 2) drop = levelsBeside(sound, calmDb, possible);
  if (drop.loudDb - drop.quietDb >= leastDropDb / 2) {
    // The second time with the levels that the first one told apart.
    for (let time = 0; time < 2; time++) drop = placeAmongRuns(series, calmDb, drop, wanderDb, resolutionKpa);
  }
  const { lastLoud, loudDb, quietDb } = drop;
  const [before, after] = [
    lastLoud + 1 - windowBefore(sound, lastLoud + 1),
    windowAfter(sound, lastLoud + 1) - lastLoud - 1,
  ];
  const spreadDb = medianPenalty * scatterDb * Math.sqrt(1 / before + 1 / after);
  const isBurst = burstsOf(sound, calmDb, loudDb, wanderDb);
  let firstShut = lastLoud + 1;
  while (firstShut + 1 < timeS.length && (value[firstShut] ?? NaN) > quietDb + wanderDb) firstShut++;
  return {
    lastLoud,
    firstShut,
    loudFrom: drop.loudFrom,
    dropDb: loudDb - quietDb,
    requiredDb: Math.max(leastDropDb, standsOut * spreadDb),
    midLevelDb: (loudDb + quietDb) / 2,
    isBurst: (index) => isBurst(index) || drop.others.some(({ from, to }) => index >= from && index < to),
    explained: shareOfTwoLevels(calm),
  };
}

/** Gives every drop of the sound level that is large enough, the largest first. Linear time. */
export function soundDrops(series: RampSeries, resolutionKpa: number): SoundDrop[] {
  const { sound } = series;
  if (sound.timeS.length < 2 * fewestSamples) return [];
  const { timeS } = sound;
  const medians = { timeS, value: runningMedianOfFive(sound.value) };
  const calmDb = withoutBursts(medians, longestBurstS, leastBurstDb);
  return possibleDrops({ timeS, value: calmDb })
    .map((possible) => measureDrop(series, calmDb, possible, resolutionKpa))
    .filter(({ lastLoud, dropDb, requiredDb }) => lastLoud + 1 >= fewestSamples && dropDb >= requiredDb)
    .sort((first, second) => second.dropDb - first.dropDb);
}
