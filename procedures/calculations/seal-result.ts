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
       * Expanded uncertainty (k = 2) of `aboveStationKpa` from resolution, sampling and scatter. The instrument's
       * accuracy is not in it, nor, for `pressureKpa`, the station pressure's uncertainty.
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

const coverageFactor = 2;
/**
 * A valve begins to close before it is shut, and runs the rest of the way by itself between two samples: as far as this
 * above the last pressure at which it was heard (our allowance; no source).
 */
const closingTravelKpa = 0.2;

/** Standard uncertainty of a display's step: half of it as a rectangular half-width. */
const stepUncertainty = (resolutionKpa: number): number => resolutionKpa / Math.sqrt(12);

/** What a seal point is put together from, beside the reading. */
export interface SealFacts {
  readonly timeS: number;
  /** What the manifold pressure is measured from; none for a gauge. */
  readonly rest: Rest | undefined;
  readonly stationKpa: number;
  readonly resolutionKpa: number;
  readonly confidence: number;
}

/** Puts a seal point together; without a rest the reading is a gauge's. */
export function sealAt(reading: EndReading, facts: SealFacts): SealPoint {
  const { timeS, rest, stationKpa, resolutionKpa, confidence } = facts;
  // The noise was still there at the reading and gone at the next sample: it went away in between.
  const halfRiseKpa = (reading.unseenRiseKpa + closingTravelKpa) / 2;
  const aboveStationKpa = reading.valueKpa + halfRiseKpa - (rest?.levelKpa ?? 0);
  const parts = [
    stepUncertainty(resolutionKpa),
    reading.scatterKpa,
    halfRiseKpa / Math.sqrt(3),
    ...(rest === undefined ? [] : [stepUncertainty(resolutionKpa), rest.deviationKpa]),
  ];
  const uncertaintyKpa = coverageFactor * Math.hypot(...parts);
  return {
    sealed: true,
    timeS,
    pressureKpa: stationKpa + aboveStationKpa,
    aboveStationKpa,
    uncertaintyKpa,
    confidence,
  };
}
