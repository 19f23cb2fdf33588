import { type Series } from './ramp-series';

/** Harmonics of the step that are summed; what lies beyond them is 1 % of the whole where nothing scatters. */
const harmonics = 60;
/** Below this share of a step's square the differences tell of single flips between two steps. */
const flipsOnly = 0.17;

/**
 * The scatter of a reading before the display cut it into steps, from the differences of neighbours in [from..to), over
 * which the pressure should have passed some steps. 0 where there is nothing to tell it from.
 *
 * Half the mean squared difference is s^2 + step^2 / 12 for a scatter s of a third of a step and more, and in the mean
 * over all places between two steps s x step / sqrt(pi) for less.
 */
export function scatterBehindDisplay({ value }: Series, from: number, to: number, stepKpa: number): number {
  if (to - from < 2 || stepKpa === 0) return 0;
  let squares = 0;
  for (let index = from + 1; index < to; index++) squares += ((value[index] ?? NaN) - (value[index - 1] ?? NaN)) ** 2;
  const half = squares / (to - from - 1) / 2;
  if (half < flipsOnly * stepKpa ** 2) return (half * Math.sqrt(Math.PI)) / stepKpa;
  return Math.sqrt(half - stepKpa ** 2 / 12);
}

/**
 * Standard uncertainty of a mean of readings from the display's step alone: half a step as a rectangular half-width
 * where they do not scatter, and less where their scatter takes them over the step's edges, for then the mean sees
 * through it.
 *
 * u^2 = sum over k of step^2 / (2 pi^2 k^2) x exp(-4 pi^2 k^2 s^2 / step^2), which is step^2 / 12 for s = 0. Source:
 * JCGM 100:2008, F.2.2.1; Widrow and Kollar, Quantization Noise (2008), for a normal dither.
 */
export function displayUncertainty(stepKpa: number, scatterKpa: number): number {
  if (!(stepKpa > 0)) return 0;
  if (!(scatterKpa > 0)) return stepKpa / Math.sqrt(12);
  let square = 0;
  for (let k = 1; k <= harmonics; k++) {
    square += Math.exp(-((2 * Math.PI * k * scatterKpa) ** 2) / stepKpa ** 2) / (2 * (Math.PI * k) ** 2);
  }
  return stepKpa * Math.sqrt(square);
}
