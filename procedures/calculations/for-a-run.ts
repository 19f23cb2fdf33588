/**
 * The calculations that a run needs from its first step on. Inside the product import them from here: what the whole
 * face has beside them, the reader of logs and the list of codes, would come with the first step otherwise.
 */
export {
  elevationOf,
  standardPressure,
  stationPressure,
  stationUncertainty,
  toAbsolute,
  toGauge,
  type AltimeterReport,
  type StationPressureSource,
} from './atmosphere';
export { channelQuantity, type ChannelQuantity } from './channel-quantity';
export { judge, type JudgedReading, type Verdict } from './decision';
export { fitLine, fitRobustLine, type LineFit } from './fit';
export { type RampSample } from './ramp-series';
export { type LogChannel, type LogHints, type LogProblem, type ScanLog } from './scan-log';
export { sealPointFromMarks, type SealMarks } from './seal-marks';
export { findNoiseBegin } from './noise-begin';
export { findSealPoint } from './seal-point';
export { type NoSealReason, type SealOptions, type SealPoint } from './seal-result';
export { steepestRise, type SteepestRise } from './steepest-rise';
export { trackSensors, type SensorSeries, type SensorTracking, type Tracking } from './sensor-tracking';
export { expandedUncertainty, type UncertaintySources } from './uncertainty';
export {
  convert,
  convertDifference,
  differenceFromBase,
  differenceToBase,
  fromBase,
  isUnit,
  toBase,
  unitKind,
  units,
  type UnitDefinition,
  type UnitKind,
  type UnitName,
} from './units';
