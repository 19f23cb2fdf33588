/** The public face of the calculations: pure functions in double precision, with the units in their names. */
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
export { dryAirDensity, type DryAir } from './dry-air';
export { speedDensityAirflow, volumetricEfficiency, type EngineAir } from './engine-airflow';
export { fitLine, fitRobustLine, type LineFit } from './fit';
export { fitDecay, type DecayFit, type DecaySample, type DecayVolume } from './fit-decay';
export { moistAirDensity, type MoistAir } from './moist-air';
export { orificeDiameter, orificeMassFlow, type OrificeConditions, type OrificeFlow } from './orifice';
export { parseScanLog } from './parse-scan-log';
export { decodePid, type PidReading } from './pid';
export { decayLeakRate, type DecayTest, type LeakRate } from './pressure-decay';
export { type RampSample } from './ramp-series';
export { type Monitor, type Readiness } from './readiness';
export { type LogChannel, type LogHints, type LogProblem, type ScanLog } from './scan-log';
export { sealPointFromMarks, type SealMarks } from './seal-marks';
export { findSealPoint } from './seal-point';
export { type NoSealReason, type SealOptions, type SealPoint } from './seal-result';
export { steepestRise, type SteepestRise } from './steepest-rise';
export { trackSensors, type SensorSeries, type SensorTracking, type Tracking } from './sensor-tracking';
export { decodeTroubleCode, describeTroubleCode } from './trouble-code';
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
export { checkVin, modelYear, vinCheckDigit, type VinCheck, type VinProblem } from './vin';
