/** How fast a pressure was raised, over the stretch of the ramp where it rose fastest. */
export interface SteepestRise {
  readonly kpaPerS: number;
  readonly fromS: number;
  readonly toS: number;
}

/** A rise counts that is kept up for so long: the next tap, or a sample's scatter, is none. */
const keptUpS = 10;
/** A shorter ramp says nothing about its rate. */
const shortestS = 2;

/**
 * The steepest mean rise over any stretch of 10 s (the whole series where it is shorter), seconds and kilopascals of
 * gauge pressure. Samples without a gauge are passed over; undefined for less than 2 s. Times never fall. Linear time.
 */
export function steepestRise(
  samples: readonly { readonly timeS: number; readonly gaugeKpa?: number | undefined }[],
): SteepestRise | undefined {
  const known = samples.flatMap(({ timeS, gaugeKpa }) => (gaugeKpa === undefined ? [] : [{ timeS, gaugeKpa }]));
  const lengthS = (known.at(-1)?.timeS ?? NaN) - (known[0]?.timeS ?? NaN);
  if (!(lengthS >= shortestS)) return undefined;
  const stretchS = Math.min(keptUpS, lengthS);
  let steepest: SteepestRise | undefined;
  let end = 0;
  for (const from of known) {
    while (end < known.length && (known[end]?.timeS ?? Infinity) - from.timeS < stretchS) end += 1;
    const to = known[end];
    if (to === undefined) break;
    const kpaPerS = (to.gaugeKpa - from.gaugeKpa) / (to.timeS - from.timeS);
    if (steepest === undefined || kpaPerS > steepest.kpaPerS) steepest = { kpaPerS, fromS: from.timeS, toS: to.timeS };
  }
  return steepest;
}
