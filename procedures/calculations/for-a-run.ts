/**
 * The calculations that a run needs from its first step on. Inside the product import them from here: what the whole
 * face has beside them, such as the reader of logs and what looks through a ramp, would come with the first step too.
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
export { judge, type JudgedReading, type Verdict } from './decision';
export { type LogChannel, type LogHints, type LogProblem, type ScanLog } from './scan-log';
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
