import { fitLine } from './fit';
import { scatterOf, type Series } from './ramp-series';

/** The supply's steps, and a slope that the short stretch cannot show, are looked for in this long a stretch. */
export const stepsS = 10;
/** A hand turns the supply a little further in about this time. */
const steepS = 0.4;
/** A slope shows through a display's steps once the pressure has passed so many of them. */
const stepsPassed = 3;
/** Over less the scatter of its two ends would choose the slope. */
const shortestSlopeS = 2;

/** A slope in kPa/s with its standard error. */
export interface Slope {
  readonly slope: number;
  readonly slopeError: number;
}

/** A line through a stretch of the series, as its end needs it. */
export interface EndLine extends Slope {
  readonly residualDeviation: number;
  readonly meanKpa: number;
  /** From the middle of the stretch to the moment of reading. */
  readonly meanLagS: number;
  readonly spanS: number;
}

/** The line through pressure[start..end), level where all its times are the same. */
export function lineThrough({ timeS: times, value }: Series, start: number, end: number, timeS: number): EndLine {
  const x = times.subarray(start, end).map((time) => time - timeS);
  const y = value.subarray(start, end);
  const meanLagS = -x.reduce((sum, time) => sum + time, 0) / x.length;
  if (x.length < 3 || x[0] === x.at(-1)) {
    const meanKpa = y.reduce((sum, reading) => sum + reading, 0) / y.length;
    return { slope: 0, slopeError: 0, residualDeviation: scatterOf(value, start, end), meanKpa, meanLagS, spanS: 0 };
  }
  const { slope, intercept, slopeError, residualDeviation } = fitLine(x, y);
  const meanKpa = intercept - slope * meanLagS;
  return { slope, slopeError, residualDeviation, meanKpa, meanLagS, spanS: (x.at(-1) ?? 0) - (x[0] ?? 0) };
}

/** The slope of a short stretch where it shows one that the longer stretch before has not, else that of the longer. */
export function slopeBeside(
  pressure: Series,
  short: EndLine,
  { first, start, end }: { first: number; start: number; end: number },
  resolutionKpa: number,
): Slope {
  const { timeS: times, value } = pressure;
  const endS = times[end - 1] ?? NaN;
  let from = start;
  while (
    from > first &&
    endS - (times[from - 1] ?? NaN) <= stepsS &&
    (endS - (times[from] ?? NaN) < shortestSlopeS ||
      Math.abs((value[end - 1] ?? NaN) - (value[from] ?? NaN)) < stepsPassed * resolutionKpa)
  )
    from--;
  const slopeError = Math.hypot(short.slopeError, resolutionKpa / Math.sqrt(12) / short.spanS);
  if (from === start) return { slope: short.slope, slopeError };
  const long = lineThrough(pressure, from, end, endS);
  const differs = Math.abs(short.slope - long.slope) > 2 * Math.hypot(slopeError, long.slopeError);
  return differs ? { slope: short.slope, slopeError } : long;
}

/**
 * How far the steepest rise (sign 1) or fall (-1) of [from..to) would take the pressure in `spanS`, less what scatter
 * and display explain. Looked for over `steepS` at least, in which they matter less.
 */
export function largestMove(
  { timeS: times, value }: Series,
  from: number,
  to: number,
  spanS: number,
  resolutionKpa: number,
  sign: 1 | -1,
): number {
  const noiseKpa = Math.max(resolutionKpa, 2 * scatterOf(value, from, to));
  const overS = Math.max(spanS, steepS);
  let largest = 0;
  let start = from;
  for (let index = from + 1; index < to; index++) {
    const time = times[index] ?? NaN;
    while (start < index - 1 && (times[start] ?? NaN) < time - overS - 1e-9) start++;
    const move = sign * ((value[index] ?? NaN) - (value[start] ?? NaN)) - noiseKpa;
    const lengthS = time - (times[start] ?? NaN);
    if (lengthS > 0) largest = Math.max(largest, move * Math.min(1, spanS / lengthS));
  }
  return largest;
}
