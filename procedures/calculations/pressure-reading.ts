import { fitLine } from './fit';
import { indexAt, scatterOf, type Series } from './ramp-series';

/** The pressure just before the drop is read from a short stretch, so that a step of a hand-turned supply shows. */
const readingS = 0.5;
const fewestReadingSamples = 8;
/** The supply's steps are looked for in this long a stretch before the drop. */
const stepsS = 10;

/** A pressure read off the end of a stretch of the series. */
export interface EndReading {
  readonly valueKpa: number;
  /** Standard uncertainty from how far the stretch is from a straight rise. */
  readonly scatterKpa: number;
  /** How far the pressure may rise within the gap that follows, unseen; never below 0. */
  readonly unseenRiseKpa: number;
}

/**
 * Reads the pressure at `timeS` from the samples before it, since one alone would carry all of its scatter, and tells
 * how far it may rise in the `gapS` that follows.
 */
export function readPressureAt(pressure: Series, timeS: number, gapS: number, resolutionKpa: number): EndReading {
  const { timeS: times, value } = pressure;
  const end = Math.max(1, indexAt(times, timeS + 1e-9));
  const before = value[end - 1];
  const after = value[end];
  // Typed points stand seconds apart: a line through them would take a pause for a rise. The truth lies between the two.
  if (before !== undefined && after !== undefined && timeS - (times[end - 1] ?? timeS) > readingS + 1e-9) {
    return { valueKpa: before, scatterKpa: 0, unseenRiseKpa: Math.max(0, after - before) };
  }
  const start = Math.max(0, Math.min(indexAt(times, timeS - readingS), end - fewestReadingSamples));
  const x = times.subarray(start, end).map((time) => time - timeS);
  const y = value.subarray(start, end);
  if (x.length < 3 || x[0] === x[x.length - 1])
    return { valueKpa: y[y.length - 1] ?? NaN, scatterKpa: 0, unseenRiseKpa: 0 };
  const { slope, intercept, residualDeviation } = fitLine(x, y);
  // Not divided by the root of n: neighbours stray together while a valve begins to move.
  const stepKpa = largestRise(pressure, Math.min(start, indexAt(times, timeS - stepsS)), end, gapS) - resolutionKpa;
  return { valueKpa: intercept, scatterKpa: residualDeviation, unseenRiseKpa: Math.max(0, slope * gapS, stepKpa) };
}

/** The largest rise within `spanS`, or between neighbours, in [from..to), less what their common scatter explains. */
function largestRise({ timeS: times, value }: Series, from: number, to: number, spanS: number): number {
  let largest = 0;
  let start = from;
  for (let index = from + 1; index < to; index++) {
    while (start < index - 1 && (times[start] ?? NaN) < (times[index] ?? NaN) - spanS - 1e-9) start++;
    largest = Math.max(largest, (value[index] ?? NaN) - (value[start] ?? NaN));
  }
  return Math.max(0, largest - 2 * Math.SQRT2 * scatterOf(value, from, to));
}
