import { splitTwoLines, splitTwoMeans, squaredErrorAboutMean } from './change-point';
import { medianOf, runningMedianOfFive } from './median';
import { indexAt, scatterOf, type Series } from './ramp-series';

/** A place where the sound level falls. */
export interface SoundDrop {
  /** Index of the last loud sample. */
  readonly lastLoud: number;
  /** How far the level falls, median to median. */
  readonly dropDb: number;
  /** How far it would have to fall to stand out of its own scatter. */
  readonly requiredDb: number;
  /** Half-way between loud and quiet. */
  readonly midLevelDb: number;
  /** Share of the level's variation around the drop that two levels explain, 0 to 1. */
  readonly explained: number;
}

/** How far the scan looks to each side of a possible drop, and what the two levels are taken from. */
const windowS = 4;
/** Of eight samples the median stands even where a clank has caught three. */
const fewestSamples = 8;
/** The least drop that counts, two and a half times less power (our choice; no source). */
const leastDropDb = 4;
/** Times the standard deviation of the difference of the two medians. */
const standsOut = 4;
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

/** Places a possible drop to the sample by least squares, and measures it by medians. */
function measureDrop(sound: Series, calmDb: Float64Array, possible: number): SoundDrop {
  const { timeS, value } = sound;
  const n = timeS.length;
  const from = Math.min(indexAt(timeS, (timeS[possible - 1] ?? NaN) - windowS), possible - fewestSamples);
  const to = Math.max(indexAt(timeS, (timeS[possible] ?? NaN) + windowS), possible + fewestSamples);
  const calm = calmDb.subarray(from, to);
  const { count } = splitTwoLines(timeS.subarray(from, to), calm, 3);
  const firstQuiet = from + count;
  const loudFrom = Math.max(
    0,
    Math.min(indexAt(timeS, (timeS[firstQuiet - 1] ?? NaN) - windowS), firstQuiet - fewestSamples),
  );
  const quietTo = Math.min(
    n,
    Math.max(indexAt(timeS, (timeS[firstQuiet] ?? NaN) + windowS), firstQuiet + fewestSamples),
  );
  const loudDb = medianOf(value, loudFrom, firstQuiet);
  const quietDb = medianOf(value, firstQuiet, quietTo);
  // From both sides at once: two seconds alone would be at the mercy of one clank.
  const scatterDb = scatterOf(value, Math.min(from, loudFrom), Math.max(to, quietTo));
  const spreadDb = medianPenalty * scatterDb * Math.sqrt(1 / (firstQuiet - loudFrom) + 1 / (quietTo - firstQuiet));
  return {
    lastLoud: firstQuiet - 1,
    dropDb: loudDb - quietDb,
    requiredDb: Math.max(leastDropDb, standsOut * spreadDb),
    midLevelDb: (loudDb + quietDb) / 2,
    explained: shareOfTwoLevels(calm),
  };
}

/** Gives every drop of the sound level that is large enough, the largest first. Linear time. */
export function soundDrops(sound: Series): SoundDrop[] {
  if (sound.timeS.length < 2 * fewestSamples) return [];
  const calmDb = runningMedianOfFive(sound.value);
  return possibleDrops({ timeS: sound.timeS, value: calmDb })
    .map((possible) => measureDrop(sound, calmDb, possible))
    .filter(({ lastLoud, dropDb, requiredDb }) => lastLoud + 1 >= fewestSamples && dropDb >= requiredDb)
    .sort((first, second) => second.dropDb - first.dropDb);
}
