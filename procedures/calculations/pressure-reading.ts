import { displayUncertainty, scatterBehindDisplay } from './display-step';
import { hiddenShare, lastOfRun } from './pressure-swing';
import { indexAt, scatterOf, type Series } from './ramp-series';
import { largestMove, lineThrough, slopeBeside, stepsS, type EndLine } from './ramp-slopes';

/** The pressure just before the drop is read from a short stretch, so that a step of a hand-turned supply shows. */
const readingS = 0.5;
const fewestReadingSamples = 8;
const independentReadings = 4;
/** Half-width of the confidence intervals in standard deviations. */
const agreeing = 3;
/** By hand the pressure goes up in steps, several times as steep as in the mean: the last reading is worth the most. */
const byHand = 2;
const agreeingByHand = 1;

/**
 * A valve begins to close before it is shut, and runs the rest of the way by itself between two samples: as far as this
 * above the last pressure at which it was heard (our allowance; no source).
 */
const closingTravelKpa = 0.2;

/** A pressure read off the end of a stretch of the series. */
export interface EndReading {
  readonly valueKpa: number;
  /** Standard uncertainty from the scatter of the stretch. */
  readonly scatterKpa: number;
  /** Standard uncertainty from the display's step. */
  readonly displayKpa: number;
  /** Standard deviation of a single reading of it. */
  readonly deviationKpa: number;
  /** How far the pressure may have fallen (0 or less) and risen (0 or more) within the gap that follows, unseen. */
  readonly unseenFallKpa: number;
  readonly unseenRiseKpa: number;
  /** How far the valve may have gone on closing, and the pressure rising, until it was shut; 0 or more. */
  readonly travelKpa: number;
  /** How much further a step of a hand-turned supply would have taken it, if one fell into the gap; 0 or more. */
  readonly unseenStepKpa: number;
  /** The reading at which the gap ends, less `valueKpa`; undefined at the end of the series. */
  readonly nextKpa: number | undefined;
}

/** Where and how to read a pressure. */
export interface ReadingPlace {
  readonly timeS: number;
  /** How long nothing is known after that. */
  readonly gapS: number;
  /** When the valve was shut for certain; the end of the gap when it is left out. */
  readonly shutByS?: number | undefined;
  readonly resolutionKpa: number;
  /** Before this the pressure went another way: the valve was shut for a moment. */
  readonly sinceS?: number | undefined;
}

const alone = (valueKpa: number, resolutionKpa: number, riseKpa = 0): EndReading => ({
  valueKpa,
  scatterKpa: 0,
  displayKpa: resolutionKpa / Math.sqrt(12),
  deviationKpa: 0,
  unseenFallKpa: 0,
  unseenRiseKpa: riseKpa,
  travelKpa: closingTravelKpa,
  unseenStepKpa: 0,
  nextKpa: undefined,
});

/**
 * Reads the pressure at `timeS` from the samples before it, since one alone would carry all of its scatter, and tells
 * how far it may go in the `gapS` that follows.
 */
export function readPressureAt(pressure: Series, place: ReadingPlace): EndReading {
  const { timeS, gapS, shutByS = timeS + gapS, resolutionKpa, sinceS } = place;
  const { timeS: times, value } = pressure;
  const end = Math.max(1, indexAt(times, timeS + 1e-9));
  const before = value[end - 1];
  const after = value[end];
  // Typed points stand seconds apart: a line through them would take a pause for a rise. The truth lies between the two.
  if (before !== undefined && after !== undefined && timeS - (times[end - 1] ?? timeS) > readingS + 1e-9) {
    return alone(before, resolutionKpa, Math.max(0, after - before));
  }
  const longAgo = Math.min(end - 1, indexAt(times, timeS - stepsS));
  const next = value[indexAt(times, shutByS - 1e-9)];
  if (sinceS !== undefined) {
    return lastOfRun(pressure, { end, longAgo, first: indexAt(times, sinceS) }, gapS, resolutionKpa, next);
  }
  const start = Math.max(0, Math.min(indexAt(times, timeS - readingS), end - fewestReadingSamples));
  if (end - start < 3 || times[start] === times[end - 1]) return alone(value[end - 1] ?? NaN, resolutionKpa);
  const line = lineThrough(pressure, start, end, timeS);
  const slope = slopeBeside(pressure, line, { first: longAgo, start, end }, resolutionKpa);
  const deviationKpa = Math.max(scatterOf(value, longAgo, end), resolutionKpa / 2);
  const steepestKpa = largestMove(pressure, Math.min(start, longAgo), end, gapS, resolutionKpa, 1);
  const isByHand = steepestKpa > byHand * Math.max(0, slope.slope * gapS);
  const reach = (isByHand ? agreeingByHand : agreeing) * deviationKpa;
  const { valueKpa, count, lagS, disagreeing } = agreeingEnd(pressure, { start, end, timeS }, slope.slope, reach);
  const turnedFrom = end - Math.max(3, disagreeing);
  const turning = disagreeing > 0 ? lineThrough(pressure, turnedFrom, end, timeS).slope : 0;
  const riseKpa = Math.max(0, slope.slope * gapS, turning * gapS);
  return {
    valueKpa,
    scatterKpa: Math.hypot(deviationOfMean(line, count, resolutionKpa), slope.slopeError * lagS),
    displayKpa: displayUncertainty(resolutionKpa, scatterBehindDisplay(pressure, 0, end, resolutionKpa)),
    deviationKpa: line.residualDeviation,
    unseenFallKpa: 0,
    unseenRiseKpa: riseKpa,
    travelKpa: closingTravelKpa,
    unseenStepKpa: Math.max(0, steepestKpa - riseKpa),
    nextKpa: next === undefined ? undefined : next - valueKpa,
  };
}

interface EndMean {
  readonly valueKpa: number;
  readonly count: number;
  /** From the middle of the readings to the moment of reading. */
  readonly lagS: number;
  /** How many of the last readings no longer agreed; 0 when all did. */
  readonly disagreeing: number;
}

/**
 * The pressure at `timeS` by the mean of the last readings of [start..end), carried on along the slope: of as many as
 * agree with each other, for a hand may just have begun to turn the supply.
 *
 * Source: the intersection of confidence intervals (Goldenshluger and Nemirovski, 1997), growing by doubling.
 */
function agreeingEnd(
  { timeS: times, value }: Series,
  { start, end, timeS }: { start: number; end: number; timeS: number },
  slope: number,
  reachOfOneKpa: number,
): EndMean {
  let best = { valueKpa: NaN, count: 0, lagS: 0, disagreeing: 0 };
  let [low, high] = [-Infinity, Infinity];
  let [sum, lag, count] = [0, 0, 0];
  for (let wanted = 1; count < end - start; wanted *= 2) {
    for (; count < Math.min(wanted, end - start); count++) {
      const index = end - 1 - count;
      sum += value[index] ?? NaN;
      lag += timeS - (times[index] ?? NaN);
    }
    const valueKpa = (sum + slope * lag) / count;
    const reachKpa = reachOfOneKpa / Math.sqrt(count);
    [low, high] = [Math.max(low, valueKpa - reachKpa), Math.min(high, valueKpa + reachKpa)];
    if (low > high) return { ...best, disagreeing: count };
    best = { valueKpa, count, lagS: lag / count, disagreeing: 0 };
  }
  return best;
}

/** Neighbours stray together: their mean is no better than that of a few. */
const deviationOfMean = ({ residualDeviation }: EndLine, count: number, resolutionKpa: number): number =>
  Math.max(residualDeviation, hiddenShare * resolutionKpa) / Math.sqrt(Math.min(count, independentReadings));
