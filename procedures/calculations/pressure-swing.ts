import { scatterBehindDisplay } from './display-step';
import { type EndReading } from './pressure-reading';
import { indexAt, scatterOf, type Series } from './ramp-series';
import { largestMove, lineThrough, stepsS } from './ramp-slopes';

/** A chattering valve needs as long as this to open and shut again (our allowance; no source). */
export const quickestTurnS = 0.3;
/** How far back a swing of the pressure tells of a valve that chatters. */
const swingS = 3;
/** What tells how fast the pressure was falling. */
const fallS = 0.2;
/** Where most neighbours on a display are alike, their scatter hides behind a share of its step. */
export const hiddenShare = 0.25;

/**
 * The last reading of a short opening of the valve: the pressure was on its way down from where the shut valve had let
 * it rise, as fast as its last moments tell or, where there is one only, as fast as it ever fell shortly before. A
 * valve that chatters slams: it has no way to run in which the pressure would rise.
 */
export function lastOfRun(
  pressure: Series,
  { first, end, longAgo }: { first: number; end: number; longAgo: number },
  gapS: number,
  resolutionKpa: number,
  next: number | undefined,
): EndReading {
  const { timeS: times, value } = pressure;
  const valueKpa = value[end - 1] ?? NaN;
  const deviationKpa = Math.max(
    scatterOf(value, longAgo, end),
    scatterBehindDisplay(pressure, 0, end, resolutionKpa),
    hiddenShare * resolutionKpa,
  );
  const certainty = { scatterKpa: deviationKpa, deviationKpa, displayKpa: resolutionKpa / Math.sqrt(12) };
  const nextKpa = next === undefined ? undefined : next - valueKpa;
  if (gapS > quickestTurnS) {
    // It may have shut and opened any number of times: anywhere from the lowest that it came down to up to the next.
    const lowest = value.subarray(longAgo, end).reduce((least, reading) => Math.min(least, reading), valueKpa);
    const range = { unseenFallKpa: lowest - valueKpa, unseenRiseKpa: Math.max(0, nextKpa ?? 0) };
    return { valueKpa, ...certainty, ...range, travelKpa: 0, unseenStepKpa: 0, nextKpa };
  }
  const from = Math.max(0, first, Math.min(end - 2, indexAt(times, (times[end - 1] ?? NaN) - fallS)));
  const spanS = (times[end - 1] ?? NaN) - (times[from] ?? NaN);
  let fallKpa = largestMove(pressure, longAgo, end, gapS, 0, -1);
  if (end - from > 2) fallKpa = -lineThrough(pressure, from, end, times[end - 1] ?? NaN).slope * gapS;
  else if (end - first > 1 && spanS > 0) fallKpa = (((value[from] ?? NaN) - valueKpa) * gapS) / spanS;
  return {
    valueKpa,
    ...certainty,
    unseenFallKpa: -Math.max(0, fallKpa),
    unseenRiseKpa: Math.max(0, -fallKpa),
    travelKpa: 0,
    unseenStepKpa: 0,
    nextKpa,
  };
}

/**
 * Reads the pressure of the `gapS` from `timeS` on as anywhere between its lowest and highest reading there, where it
 * swung down in the seconds before the end of that: a valve that chatters. Undefined where it did not.
 */
export function readSwing(
  pressure: Series,
  { timeS, gapS, resolutionKpa }: { timeS: number; gapS: number; resolutionKpa: number },
): EndReading | undefined {
  const { timeS: times, value } = pressure;
  const [from, to] = [indexAt(times, timeS + gapS - swingS), indexAt(times, timeS + gapS + 1e-9)];
  const deviationKpa = scatterOf(value, indexAt(times, timeS + gapS - swingS - stepsS), from);
  let [highest, fallKpa] = [-Infinity, 0];
  for (let index = from; index < to; index++) {
    highest = Math.max(highest, value[index] ?? NaN);
    fallKpa = Math.max(fallKpa, highest - (value[index] ?? NaN));
  }
  if (fallKpa <= 2.1 * resolutionKpa + 5 * deviationKpa) return undefined;
  const seen = value.subarray(Math.max(from, indexAt(times, timeS) - 1), to);
  const lowest = seen.reduce((least, reading) => Math.min(least, reading), Infinity);
  const most = seen.reduce((largest, reading) => Math.max(largest, reading), -Infinity);
  return {
    valueKpa: lowest,
    scatterKpa: deviationKpa,
    displayKpa: resolutionKpa / Math.sqrt(12),
    deviationKpa,
    unseenFallKpa: 0,
    unseenRiseKpa: most - lowest,
    travelKpa: 0,
    unseenStepKpa: 0,
    nextKpa: undefined,
  };
}
