import { requireInRange } from './argument-range';

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

/** What the rise is taken from; samples without a gauge are passed over. */
interface GaugeSample {
  /** Seconds from any zero; never less than the sample before. */
  readonly timeS: number;
  /** Kilopascals above the station pressure. */
  readonly gaugeKpa?: number | undefined;
}

/** The samples that have a gauge pressure, all finite and in the order of time. */
function knownPressures(samples: readonly GaugeSample[]): { readonly timeS: number; readonly gaugeKpa: number }[] {
  let beforeS = -Number.MAX_VALUE;
  return samples.flatMap(({ timeS, gaugeKpa }, index) => {
    beforeS = requireInRange(`timeS of sample ${index}`, timeS, { low: beforeS });
    return gaugeKpa === undefined ? [] : [{ timeS, gaugeKpa: requireInRange(`gaugeKpa of sample ${index}`, gaugeKpa) }];
  });
}

/**
 * Gives the steepest mean rise of the gauge pressure over any stretch of 10 s, in kPa/s, and where it is.
 *
 *     largest of (p(t2) - p(t1)) / (t2 - t1),  t2 the first sample 10 s after t1 or later
 *
 * A series that is shorter counts as a whole; undefined for less than 2 s. Below 0 where the pressure only fell. Linear
 * time.
 *
 * Throws RangeError on a time or pressure that is not finite and on times that run backwards. Source: definition; the
 * 10 s are our choice.
 *
 * @example steepestRise(samples) // { kpaPerS: 0.3, fromS: 20, toS: 30 }
 */
export function steepestRise(samples: readonly GaugeSample[]): SteepestRise | undefined {
  const known = knownPressures(samples);
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
