import { coveringSum } from './even-and-normal';
import { type EndReading } from './pressure-reading';
import { type Rest } from './ramp-rest';

/** Why no seal point can be told. */
export type NoSealReason =
  /** Too few samples, or none with a sound level. */
  | 'too-little-data'
  /** Without a gauge the manifold pressure needs some seconds of rest at the start to be measured from. */
  | 'no-rest'
  /** The sound level never rose above its background: no air was heard to flow. */
  | 'no-noise'
  /** The noise was there and never went away. */
  | 'never-quiet'
  /** The noise went away, but came back or was not listened to for long enough. */
  | 'quiet-too-short'
  /** The noise went away because the supply did. */
  | 'pressure-fell';

/** The pressure at which the noise goes away, or why there is none. */
export type SealPoint =
  | {
      readonly sealed: true;
      /** Time of the last sample before the noise went away, on the samples' own clock. */
      readonly timeS: number;
      /** Absolute pressure there: station pressure + `aboveStationKpa`. */
      readonly pressureKpa: number;
      /** The gauge's value there; without a gauge, the manifold pressure less its own value at rest. */
      readonly aboveStationKpa: number;
      /**
       * Expanded uncertainty of `aboveStationKpa` from resolution, sampling, scatter and the valve's way of closing: about
       * 95 % lies inside, that is k = 2 where the shares are normal and less where one that is even over a stretch
       * prevails. The instrument's accuracy is not in it, nor, for `pressureKpa`, the station pressure's uncertainty.
       */
      readonly uncertaintyKpa: number;
      /** Share of the sound level's variation around the drop that two levels explain, 0 to 1. */
      readonly confidence: number;
    }
  | { readonly sealed: false; readonly reason: NoSealReason };

/** What the analysis has to know beside the samples. */
export interface SealOptions {
  /** The station pressure of the place and hour, kPa absolute. */
  readonly stationKpa: number;
  /** Smallest step of the pressure that is used; found in the values themselves when it is left out. */
  readonly resolutionKpa?: number | undefined;
}

/** What a seal point is put together from, beside the reading. */
export interface SealFacts {
  readonly timeS: number;
  /** What the manifold pressure is measured from; none for a gauge. */
  readonly rest: Rest | undefined;
  readonly stationKpa: number;
  readonly resolutionKpa: number;
  readonly confidence: number;
  /** Whether both ends of what went unseen have to lie inside the uncertainty: they are no rarer than its middle. */
  readonly coversEnds?: boolean;
}

/** Puts a seal point together; without a rest the reading is a gauge's. */
export function sealAt(reading: EndReading, facts: SealFacts): SealPoint {
  const { timeS, rest, stationKpa, resolutionKpa, confidence, coversEnds = false } = facts;
  // The noise was still there at the reading and gone at the next sample: it went away in between, evenly anywhere.
  // The valve was shut at the next sample, so that the pressure there is the most it can have been.
  const mostKpa =
    Math.max(0, reading.nextKpa ?? Infinity) + 2 * Math.hypot(reading.deviationKpa, resolutionKpa / Math.sqrt(12));
  const travelKpa = Math.min(reading.travelKpa, mostKpa);
  const riseKpa = Math.min(reading.unseenRiseKpa, mostKpa - travelKpa);
  const halfStepKpa = Math.min(reading.unseenStepKpa, mostKpa - travelKpa - riseKpa) / 2;
  const halfGapKpa = (riseKpa - reading.unseenFallKpa) / 2;
  const aboveStationKpa =
    reading.valueKpa + travelKpa / 2 + (riseKpa + reading.unseenFallKpa) / 2 + halfStepKpa - (rest?.levelKpa ?? 0);
  const normalKpa = Math.hypot(
    reading.displayKpa,
    reading.scatterKpa,
    // Either it fell into the gap or it did not: two points, whose standard deviation is half of what is between them.
    halfStepKpa,
    ...(rest === undefined ? [] : [reading.displayKpa, rest.deviationKpa]),
  );
  const uncertaintyKpa = coversEnds
    ? 2 * Math.hypot(normalKpa, (halfGapKpa + travelKpa / 2) / Math.sqrt(3))
    : coveringSum(normalKpa, halfGapKpa, travelKpa / 2);
  return {
    sealed: true,
    timeS,
    pressureKpa: stationKpa + aboveStationKpa,
    aboveStationKpa,
    uncertaintyKpa,
    confidence,
  };
}
