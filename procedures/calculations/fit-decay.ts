import { requireInRange } from './argument-range';
import { airKelvin, dryAirGasConstant } from './dry-air';
import { fallRate, overpressureAt, timeLeft } from './emptying';
import { vesselRangeL } from './pressure-decay';

/** The pressure of a closed volume at one moment. */
export interface DecaySample {
  /** Seconds on any clock, rising from sample to sample. */
  readonly timeS: number;
  /** Pressure above the station pressure in kPa, -10 to 2000; a little below 0 is noise around empty. */
  readonly gaugeKpa: number;
}

/** What the fit has to know beside the samples. */
export interface DecayVolume {
  /** The volume in litres, 0.001 to 1 000 000. */
  readonly volumeL: number;
  /** Expanded uncertainty (k = 2) of the volume in litres, 0 to `volumeL`; 0 when left out. */
  readonly volumeUncertaintyL?: number;
  /** Station pressure, kPa absolute, 10 to 200. */
  readonly stationKpa: number;
  /** Temperature of the gas in degC, -100 to 1000, the same throughout. */
  readonly temperatureC: number;
}

/** The hole that empties the volume as it was seen to empty. */
export interface DecayFit {
  /** Diameter of the equivalent round hole (discharge coefficient 1); 0 when the pressure does not fall. */
  readonly orificeMm: number;
  /** Expanded uncertainty (k = 2) of the diameter, from the scatter about the curve and from the volume. */
  readonly uncertaintyMm: number;
  /** Throughput V dp/dt at the fitted pressure of the first sample, of gas at its own temperature. */
  readonly leakPaM3PerS: number;
  /** sqrt(sum of squared residuals / (n - 2)), in kPa. */
  readonly residualDeviation: number;
}

const coverageFactor = 2;
const fewestSamples = 3;
const shortestSpanS = 0.01;
const clockRangeS = { low: -1e10, high: 1e10 };
const gaugeRangeKpa = { low: -10, high: 2000 };
const stationRangeKpa = { low: 10, high: 200 };
/** A pressure of a thousandth of a pascal tells nothing about the hole: the volume counts as empty there. */
const emptyKpa = 1e-6;
const mostSteps = 50;

/** The emptying curve: theta left = start - rate t, from the first sample on. */
interface Curve {
  readonly start: number;
  readonly rate: number;
}

/** One sample in the curve's own terms: seconds after the first, and overpressure over station pressure. */
interface Point {
  readonly t: number;
  readonly q: number;
}

/** How a curve lies among the points, and the sums for the next step of least squares. */
interface Closeness {
  /** Sum of the squared residuals, in q. */
  readonly squares: number;
  /** How strongly all points together answer the start, and their mean time by that weight. */
  readonly weight: number;
  readonly meanT: number;
  /** Weighted sum of squared times about that mean: how well the rate is told. */
  readonly spread: number;
  /** The residuals' sums, as they pull at the start and at the rate. */
  readonly pull: number;
  readonly turn: number;
}

function requirePoints(samples: readonly DecaySample[], stationKpa: number): readonly Point[] {
  if (!Array.isArray(samples)) throw new RangeError(`samples is ${String(samples)}; allowed: a list of samples`);
  requireInRange('length of samples', samples.length, { low: fewestSamples });
  let before = -Infinity;
  const points = samples.map(({ timeS, gaugeKpa }: DecaySample, index) => {
    requireInRange(`timeS of sample ${index}`, timeS, clockRangeS);
    if (timeS <= before) throw new RangeError(`timeS of sample ${index} is ${timeS}; allowed: above ${before}`);
    before = timeS;
    requireInRange(`gaugeKpa of sample ${index}`, gaugeKpa, gaugeRangeKpa);
    return { t: timeS - (samples[0]?.timeS ?? timeS), q: gaugeKpa / stationKpa };
  });
  const filled = points.filter(({ q }) => q * stationKpa > emptyKpa);
  requireInRange(`count of samples with gaugeKpa above ${emptyKpa}`, filled.length, { low: fewestSamples });
  const spanS = (filled.at(-1)?.t ?? NaN) - (filled[0]?.t ?? NaN);
  requireInRange(`seconds of timeS with gaugeKpa above ${emptyKpa}`, spanS, { low: shortestSpanS });
  return points;
}

/** In theta the curve is straight: a line through it, weighted by how well the pressure tells theta. */
function firstGuess(points: readonly Point[]): Curve {
  const largest = points.reduce((found, { q }) => Math.max(found, fallRate(q)), 0);
  let [w, wt, wy] = [0, 0, 0];
  const weighted = points.map(({ t, q }) => ({ t, y: timeLeft(q), weight: (fallRate(q) / largest) ** 2 }));
  for (const { t, y, weight } of weighted) {
    w += weight;
    wt += weight * t;
    wy += weight * y;
  }
  const [meanT, meanY] = [wt / w, wy / w];
  let [stt, sty] = [0, 0];
  for (const { t, y, weight } of weighted) {
    stt += weight * (t - meanT) ** 2;
    sty += weight * (t - meanT) * (y - meanY);
  }
  const rate = stt > 0 ? -sty / stt : 0;
  return { start: meanY + rate * meanT, rate };
}

function closenessOf(points: readonly Point[], { start, rate }: Curve): Closeness {
  const answers = points.map(({ t, q }) => {
    const fitted = overpressureAt(start - rate * t);
    return { t, residual: q - fitted, slope: fallRate(fitted) };
  });
  let [squares, weight, wt, pull] = [0, 0, 0, 0];
  for (const { t, residual, slope } of answers) {
    squares += residual ** 2;
    weight += slope ** 2;
    wt += slope ** 2 * t;
    pull += slope * residual;
  }
  const meanT = wt / weight;
  let [spread, turn] = [0, 0];
  for (const { t, residual, slope } of answers) {
    spread += (slope * (t - meanT)) ** 2;
    turn += slope * residual * (t - meanT);
  }
  return { squares, weight, meanT, spread, pull, turn };
}

/** Whether more than one point lies where the curve still falls: one alone is met by any rate. */
const tellsRate = ({ spread, weight, meanT }: Closeness): boolean => spread > 1e-25 * weight * meanT ** 2;

/** Gauss and Newton's method, with a shorter step where a whole one makes it worse. */
function fitCurve(points: readonly Point[]): { readonly curve: Curve; readonly closeness: Closeness } {
  let curve = firstGuess(points);
  let closeness = closenessOf(points, curve);
  let share = 1;
  for (let step = 0; step < mostSteps && share > 1e-6 && tellsRate(closeness); step++) {
    const turn = (share * closeness.turn) / closeness.spread;
    const start = curve.start + (share * closeness.pull) / closeness.weight - turn * closeness.meanT;
    const next = { start, rate: curve.rate - turn };
    const nextCloseness = closenessOf(points, next);
    if (nextCloseness.squares < closeness.squares) [curve, closeness, share] = [next, nextCloseness, 1];
    else share /= 4;
  }
  if (!tellsRate(closeness)) {
    throw new RangeError('samples have no gaugeKpa along an emptying curve; allowed: two or more of one that falls');
  }
  return { curve, closeness };
}

/**
 * Fits the hole through which a closed volume empties into the room to the whole curve of its pressure.
 *
 *     V dp/dt = -Cd A sqrt(R T) p phi(p_s / p)      phi as in `orificeMassFlow`, gamma 1.4
 *
 * p is the absolute pressure, p_s the station pressure. The two unknowns, A and the pressure at the first sample, are
 * fitted to the gauge pressure by least squares; the curve itself is a closed form. The flow is quasi-steady, the
 * volume rigid and the gas at one temperature: wait after filling until it has taken on that of the walls.
 *
 * The diameter is that of an ideal hole (Cd = 1), as `orificeDiameter` gives it; a sharp-edged one with Cd 0.61 is
 * 1.28 times as wide. The uncertainty assumes that the samples scatter independently of each other. A pressure that
 * does not fall gives 0 mm, with the widest hole that the scatter could hide as its uncertainty.
 *
 * Throws RangeError outside the ranges of `DecaySample` and `DecayVolume`, on times that do not rise, and on fewer
 * than 3 samples above 1e-6 kPa, less than 0.01 s between them, or pressures so unlike an emptying volume's that they
 * tell no rate.
 *
 * Source: quasi-steady isentropic flow from a vessel at constant temperature (textbook; the solution in closed form
 * is derived in emptying.ts); JCGM 100:2008, 5.1.2, for the uncertainty.
 *
 * @example
 * fitDecay(samples, { volumeL: 8, volumeUncertaintyL: 0.8, stationKpa: 93.9, temperatureC: 20 })
 * // { orificeMm: 1.0, uncertaintyMm: 0.05, leakPaM3PerS: 11.5, residualDeviation: 0.03 }
 */
export function fitDecay(samples: readonly DecaySample[], volume: DecayVolume): DecayFit {
  const { volumeL, volumeUncertaintyL = 0, stationKpa, temperatureC } = volume;
  requireInRange('volumeL', volumeL, vesselRangeL);
  requireInRange('volumeUncertaintyL', volumeUncertaintyL, { low: 0, high: volumeL });
  requireInRange('stationKpa', stationKpa, stationRangeKpa);
  const speed = Math.sqrt(dryAirGasConstant * airKelvin('temperatureC', temperatureC));
  const points = requirePoints(samples, stationKpa);
  const { curve, closeness } = fitCurve(points);
  const residual = Math.sqrt(closeness.squares / (points.length - 2));
  const rateDeviation = residual / Math.sqrt(closeness.spread);
  const rate = Math.max(0, curve.rate);
  // 1e3 mm2 m/s is one litre a second: k V = A sqrt(R T).
  const mm2 = (perS: number): number => (perS * volumeL * 1000) / speed;
  const relativeVolume = volumeUncertaintyL / volumeL;
  const areaUncertainty = mm2(Math.hypot(coverageFactor * rateDeviation, rate * relativeVolume));
  return {
    orificeMm: diameterOf(mm2(rate)),
    uncertaintyMm: diameterUncertainty(mm2(rate), areaUncertainty),
    leakPaM3PerS: volumeL * rate * stationKpa * fallRate(overpressureAt(curve.start)),
    residualDeviation: residual * stationKpa,
  };
}

const diameterOf = (mm2: number): number => Math.sqrt((4 * mm2) / Math.PI);

/** The farther of the diameters at both ends of the area's interval; near no hole at all a slope would be boundless. */
function diameterUncertainty(mm2: number, uncertaintyMm2: number): number {
  const diameter = diameterOf(mm2);
  const above = diameterOf(mm2 + uncertaintyMm2) - diameter;
  const below = diameter - diameterOf(Math.max(0, mm2 - uncertaintyMm2));
  return Math.max(above, below);
}
