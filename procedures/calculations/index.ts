/** The public face of the calculations: pure functions in double precision, with the units in their names. */
export * from './air-and-leaks';
export * from './for-a-run';
export * from './ramps';
export { decodePid, type PidReading } from './pid';
export { type Monitor, type Readiness } from './readiness';
export { parseScanLog } from './parse-scan-log';
export { decodeTroubleCode, describeTroubleCode } from './trouble-code';
export { checkVin, modelYear, vinCheckDigit, type VinCheck, type VinProblem } from './vin';
