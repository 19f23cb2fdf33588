import truths from '../reference/ramps/truth-demo.json';

/** What a ramp file was drawn with. */
export interface RampTruth {
  readonly station_kpa: number;
  readonly seal: boolean;
  readonly seal_time_s: number | null;
  readonly seal_gauge_kpa: number | null;
  readonly max_gauge_kpa: number;
}

/** The truth of a demo ramp: `rampTruth('demo-warm-seals')`. */
export function rampTruth(name: keyof typeof truths): RampTruth {
  return truths[name];
}
