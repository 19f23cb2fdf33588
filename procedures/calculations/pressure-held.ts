import { medianOf } from './median';
import { indexAt, scatterOf, type Series } from './ramp-series';

/** What the pressure before a drop is taken from. */
const beforeS = 3;
const fewestBefore = 8;
/** A single reading may be a flicker of the display; a second of them is not. */
const lookS = 1;
const fewestLooked = 3;
/** So long after the drop the pressure may still be on its way up. */
const settlesS = 0.5;
const leastFallKpa = 0.1;
/** A display that flickers between two steps shifts the mean by up to half a step to each side of where it was. */
const flickerShare = 0.6;

function meanOf({ value }: Series, from: number, to: number): number {
  let sum = 0;
  for (let index = from; index < to; index++) sum += value[index] ?? NaN;
  return sum / (to - from);
}

/**
 * Tells until when the pressure stays up after `timeS`, `longestS` at most: until the mean of a second of readings lies
 * below what the seconds before `timeS` had by more than scatter and display explain.
 */
export function heldUntil(pressure: Series, timeS: number, longestS: number, resolutionKpa: number): number {
  const { timeS: times, value } = pressure;
  const end = Math.max(1, indexAt(times, timeS));
  const start = Math.max(0, Math.min(indexAt(times, timeS - beforeS), end - fewestBefore));
  const mayFallKpa = Math.max(leastFallKpa, flickerShare * resolutionKpa, 4 * scatterOf(value, start, end));
  // Its end may be falling already: the mean of the stretch lags behind, its middle value is not moved by a swing.
  const leastKpa = Math.max(meanOf(pressure, start, end), medianOf(value, start, end)) - mayFallKpa;
  let from = indexAt(times, timeS + settlesS);
  let sum = 0;
  for (let index = from; index < times.length; index++) {
    const time = times[index] ?? NaN;
    if (time > timeS + longestS) break;
    sum += value[index] ?? NaN;
    while (index - from >= fewestLooked && time - (times[from] ?? NaN) > lookS) sum -= value[from++] ?? NaN;
    if (index - from + 1 >= fewestLooked && sum < leastKpa * (index - from + 1)) return times[from] ?? NaN;
  }
  return timeS + longestS;
}

/**
 * Whether the pressure fell between two moments, as it does when the valve opens again; undefined when the readings are
 * too few or too coarse to tell.
 */
export function fellBetween(pressure: Series, fromS: number, toS: number, resolutionKpa: number): boolean | undefined {
  const { timeS: times, value } = pressure;
  const [from, to] = [indexAt(times, fromS), indexAt(times, toS + 1e-9)];
  if (to - from < 2 || toS - fromS < shortestFallS || resolutionKpa > coarsestKpa) return undefined;
  const scatterKpa = scatterOf(value, Math.max(0, indexAt(times, fromS - 10)), to);
  return (value[to - 1] ?? NaN) - (value[from] ?? NaN) < -Math.max(resolutionKpa, 3 * scatterKpa);
}

/** A valve that opens lets the pressure down by some kilopascals a second: in this time enough to be seen. */
const shortestFallS = 0.15;
const coarsestKpa = 0.25;
