import { loudRuns, type LoudRun } from './loud-runs';
import { medianInPlace } from './median';
import { fellBetween } from './pressure-held';
import { indexAt, type RampSeries, type Series } from './ramp-series';

/** How far the scan looks to each side of a possible drop, and what the two levels are taken from. */
export const windowS = 4;
/** Of eight samples the median stands even where a clank has caught three. */
export const fewestSamples = 8;
/** A quiet shorter than this before the noise comes back is the valve's chatter. */
export const shortestQuietS = 3;
/** How far behind a possible drop the noise may come back. */
const placingS = 10;
/** A cough or a clank takes a second at most; it is half a second more to the first samples beside it at 4 Hz. */
export const longestBurstS = 1.5;
export const leastBurstDb = 4;

/** Whether the sample at an index is part of a cough or a clank. */
export type IsBurst = (index: number) => boolean;

/** The index range of the seconds before `index` or, from it on, after; some samples at least. */
export const windowBefore = ({ timeS }: Series, index: number): number =>
  Math.max(0, Math.min(indexAt(timeS, (timeS[index - 1] ?? NaN) - windowS), index - fewestSamples));
export const windowAfter = ({ timeS }: Series, index: number, spanS = windowS): number =>
  Math.min(timeS.length, Math.max(indexAt(timeS, (timeS[index] ?? NaN) + spanS), index + fewestSamples));

/** Air through a valve that opens again may hiss a little louder than before; a burst is louder still, and short. */
export function burstsOf({ value }: Series, calmDb: Float64Array, loudDb: number, scatterDb: number): IsBurst {
  const leastDb = Math.max(leastBurstDb, 3 * scatterDb);
  return (index) => {
    const level = value[index] ?? NaN;
    return level > loudDb + leastDb && level > (calmDb[index] ?? NaN) + leastBurstDb;
  };
}

/** A drop's place with its two levels. */
export interface PlacedDrop {
  readonly lastLoud: number;
  readonly loudFrom: number | undefined;
  /** What was as loud, but not this valve. */
  readonly others: readonly LoudRun[];
  readonly loudDb: number;
  readonly quietDb: number;
}

/** The end of the first loud run that a lasting quiet follows, or of the last one where none does. */
function sealingRun({ timeS }: Series, runs: readonly LoudRun[], to: number): number {
  const lasting = runs.findIndex(({ to: quietFrom }, rank) => {
    const quietTo = runs[rank + 1]?.from ?? to;
    return (timeS[quietTo - 1] ?? NaN) - (timeS[quietFrom] ?? NaN) >= shortestQuietS;
  });
  return lasting < 0 ? runs.length - 1 : lasting;
}

/**
 * Whether a loud run can be the valve, open again: not when it is only the slopes of a cough, nor when it is short and
 * the pressure did not fall, which it does as soon as the valve is open.
 */
function mayBeThisValve(
  { sound: { timeS, value }, pressure }: RampSeries,
  run: LoudRun,
  isBurst: IsBurst,
  resolutionKpa: number,
): boolean {
  let { from, to } = run;
  while (from > 0 && isBurst(from - 1)) from--;
  while (to < value.length && isBurst(to)) to++;
  let bursts = 0;
  for (let index = from; index < to; index++) if (isBurst(index)) bursts++;
  if (2 * bursts > to - from) return false;
  const [fromS, toS] = [timeS[from - 1] ?? NaN, timeS[to - 1] ?? NaN];
  return toS - fromS > longestBurstS || fellBetween(pressure, fromS, toS, resolutionKpa) !== false;
}

/**
 * Moves a drop to where the noise went away for the last time: a valve may chatter before it is shut, and one cut in
 * the middle of that is the best that two levels alone can do.
 */
export function placeAmongRuns(
  series: RampSeries,
  calmDb: Float64Array,
  drop: PlacedDrop,
  scatterDb: number,
  resolutionKpa: number,
): PlacedDrop {
  const { sound } = series;
  const { value } = sound;
  const from = windowBefore(sound, drop.lastLoud + 1);
  const to = windowAfter(sound, drop.lastLoud + 1, placingS);
  const isBurst = burstsOf(sound, calmDb, drop.loudDb, scatterDb);
  const heard = loudRuns(value, from, to, { ...drop, scatterDb }, isBurst);
  const runs = heard.filter((run) => run.from === from || mayBeThisValve(series, run, isBurst, resolutionKpa));
  const rank = sealingRun(sound, runs, to);
  const run = runs[rank];
  if (run === undefined || run.to >= to) return drop;
  const near = [windowBefore(sound, run.to), windowAfter(sound, run.to)] as const;
  const isLoud = new Uint8Array(near[1] - near[0]);
  for (const loud of runs) isLoud.fill(1, Math.max(0, loud.from - near[0]), Math.max(0, loud.to - near[0]));
  // What lies before the stretch that was told apart was loud when that began loud.
  if (runs[0]?.from === from) isLoud.fill(1, 0, Math.max(0, from - near[0]));
  const levelsOf = (state: 0 | 1): Float64Array =>
    value.subarray(near[0], near[1]).filter((_, index) => isLoud[index] === state && !isBurst(near[0] + index));
  const [loud, quiet] = [levelsOf(1), levelsOf(0)];
  return {
    lastLoud: run.to - 1,
    others: heard.filter((other) => !runs.includes(other)),
    loudFrom: rank === 0 ? undefined : run.from,
    loudDb: loud.length === 0 ? drop.loudDb : medianInPlace(loud),
    quietDb: quiet.length === 0 ? drop.quietDb : medianInPlace(quiet),
  };
}
