/** The calculations that look through a series: where a seal is, how steeply it rose, how sensors kept up. */
export { channelQuantity, type ChannelQuantity } from './channel-quantity';
export { fitLine, fitRobustLine, type LineFit } from './fit';
export { type RampSample } from './ramp-series';
export { sealPointFromMarks, type SealMarks } from './seal-marks';
export { findNoiseBegin } from './noise-begin';
export { findSealPoint } from './seal-point';
export { type NoSealReason, type SealOptions, type SealPoint } from './seal-result';
export { steepestRise, type SteepestRise } from './steepest-rise';
export { trackSensors, type SensorSeries, type SensorTracking, type Tracking } from './sensor-tracking';
