import { requireInRange } from './argument-range';
import { requireSeriesPair } from './finite-series';
import { fitLine } from './fit';

/** Readings of one moment at one index: the test gauge and two sensors of absolute pressure. */
export interface SensorSeries {
  /** Pressure above the station pressure by the test gauge, in kPa. */
  readonly gaugeKpa: readonly number[];
  /** The first sensor, such as manifold pressure, in kPa absolute. */
  readonly firstKpa: readonly number[];
  /** The second sensor, such as boost pressure, in kPa absolute. */
  readonly secondKpa: readonly number[];
  /** The station pressure of the place and hour, in kPa absolute. */
  readonly stationKpa: number;
}

/** How one instrument follows another: gap = offset + (gain - 1) gauge, gap = what it reads beyond the other. */
export interface Tracking {
  /** The gap at rest, gauge at 0 kPa. */
  readonly offsetKpa: number;
  readonly offsetUncertaintyKpa: number;
  /** Kilopascals that it rises for each kilopascal of the other; 1 when they rise together. */
  readonly gain: number;
  readonly gainUncertainty: number;
  /** The gap of the largest size among the readings, with its sign. */
  readonly worstGapKpa: number;
  readonly worstGapUncertaintyKpa: number;
}

/** What `trackSensors` gives: each sensor against the gauge, and the second against the first. */
export interface SensorTracking {
  readonly first: Tracking;
  readonly second: Tracking;
  readonly between: Tracking;
}

const coverageFactor = 2;
/** Two readings leave nothing to judge a line by. */
const fewestReadings = 3;

/** The gap's line over the gauge's pressure: the gauge is the finest of the three, so it stands on the x axis. */
function trackingOf(gaugeKpa: readonly number[], gapsKpa: readonly number[]): Tracking {
  const { slope, intercept, slopeError, interceptError, residualDeviation } = fitLine(gaugeKpa, gapsKpa);
  return {
    offsetKpa: intercept,
    offsetUncertaintyKpa: coverageFactor * interceptError,
    gain: 1 + slope,
    gainUncertainty: coverageFactor * slopeError,
    worstGapKpa: gapsKpa.reduce((worst, gap) => (Math.abs(gap) > Math.abs(worst) ? gap : worst), 0),
    worstGapUncertaintyKpa: coverageFactor * residualDeviation,
  };
}

/**
 * Tells how two absolute-pressure sensors follow the test gauge and each other while the pressure is raised.
 *
 *     gap = sensor - (gauge + station), or second - first;  gap = offset + (gain - 1) gauge  by least squares
 *
 * The uncertainties are expanded ones (k = 2) from the scatter about that line; the station pressure's own
 * uncertainty and the gauge's accuracy are not in them and have to be added to the offsets against the gauge. The
 * gap between the sensors is free of both. For `between`, gain is to first order the ratio of the two gains.
 *
 * Throws RangeError on fewer than 3 readings, on series of different lengths, on a value that is not finite, on a
 * station pressure that is not above 0 kPa and when the gauge shows one pressure only.
 * Source: ordinary least squares (`fitLine`); JCGM 100:2008, 6.2 and H.3 on the calibration line.
 */
export function trackSensors({ gaugeKpa, firstKpa, secondKpa, stationKpa }: SensorSeries): SensorTracking {
  requireInRange('stationKpa', stationKpa, { low: 0, aboveLow: true });
  requireSeriesPair(['gaugeKpa', gaugeKpa], ['firstKpa', firstKpa], fewestReadings);
  requireSeriesPair(['gaugeKpa', gaugeKpa], ['secondKpa', secondKpa], fewestReadings);
  if (gaugeKpa.every((gauge) => gauge === gaugeKpa[0])) {
    throw new RangeError(`gaugeKpa are all ${gaugeKpa[0]}; allowed: at least two different values`);
  }
  const gapsTo = (sensorKpa: readonly number[], otherKpa: readonly number[]): number[] =>
    sensorKpa.map((sensor, index) => sensor - (otherKpa[index] ?? NaN));
  const absoluteKpa = gaugeKpa.map((gauge) => gauge + stationKpa);
  return {
    first: trackingOf(gaugeKpa, gapsTo(firstKpa, absoluteKpa)),
    second: trackingOf(gaugeKpa, gapsTo(secondKpa, absoluteKpa)),
    between: trackingOf(gaugeKpa, gapsTo(secondKpa, firstKpa)),
  };
}
