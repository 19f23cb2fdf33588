/** What k = 2 covers of a normal distribution: 95.45 %. */
const covered = 0.9544997361036416;

/** Density and distribution of the normal law; the latter by Abramowitz and Stegun 26.2.17, right to 7.5e-8. */
const density = (z: number): number => Math.exp((-z * z) / 2) / Math.sqrt(2 * Math.PI);
function distribution(z: number): number {
  if (z < 0) return 1 - distribution(-z);
  const t = 1 / (1 + 0.2316419 * z);
  const series = t * (0.31938153 + t * (-0.356563782 + t * (1.781477937 + t * (-1.821255978 + t * 1.330274429))));
  return 1 - density(z) * series;
}

/** The integral of the distribution up to z. */
const underDistribution = (z: number): number => z * distribution(z) + density(z);

/** Share of a normal error (deviation 1) plus an even one (within +/- halfWidth) that lies within +/- reach. */
function shareWithin(reach: number, halfWidth: number): number {
  return (underDistribution(reach + halfWidth) - underDistribution(reach - halfWidth)) / halfWidth - 1;
}

/**
 * Gives the half-width of the interval that covers 95.45 % of a normal error plus one that lies evenly within
 * +/- `halfWidth`: twice `deviation` when there is nothing but the normal one, 0.9545 `halfWidth` when there is nothing
 * but the even one, in between what the convolution of both gives. Units are those of the arguments; both 0 or more.
 *
 * Twice the combined standard uncertainty would cover all of an even error and so overstate it. Source: propagation of
 * distributions, JCGM 101:2008; EA-4/02 M:2022 names the case of one dominant rectangular contribution.
 *
 * @example coveringHalfWidth(0.05, 0) // 0.1
 */
export function coveringHalfWidth(deviation: number, halfWidth: number): number {
  if (halfWidth < 1e-3 * deviation) return 2 * deviation;
  if (deviation < 1e-3 * halfWidth) return covered * halfWidth;
  const even = halfWidth / deviation;
  let [low, high] = [0, even + 4];
  for (let step = 0; step < 40; step++) {
    const middle = (low + high) / 2;
    if (shareWithin(middle, even) < covered) low = middle;
    else high = middle;
  }
  return high * deviation;
}

/** The same for a normal error plus two even ones: the larger of them gives the sum its shape. */
export function coveringSum(deviation: number, oneHalfWidth: number, otherHalfWidth: number): number {
  const smaller = Math.min(oneHalfWidth, otherHalfWidth) / Math.sqrt(3);
  return coveringHalfWidth(Math.hypot(deviation, smaller), Math.max(oneHalfWidth, otherHalfWidth));
}
