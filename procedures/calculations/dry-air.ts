import { requireInRange } from './argument-range';

/** Specific gas constant of dry air in J/(kg K), as ISO 2533:1975 has it. */
export const dryAirGasConstant = 287.05287;

/** 0 degC in kelvin, by definition (NIST SP 811 (2008) B.8). */
const iceKelvin = 273.15;

/** Absolute pressures of air in and around an engine, in kPa: below 1 Pa a gas no longer flows as a continuum. */
export const airPressureRangeKpa = { low: 0.001, high: 10_000 };
/** Where dry air is close to an ideal gas: from well above its condensation to hot exhaust, in degC. */
const airTemperatureRangeC = { low: -100, high: 1000 };

/** Gives the absolute temperature in kelvin of air; throws RangeError, by the argument's name, outside -100 to 1000 degC. */
export function airKelvin(name: string, temperatureC: number): number {
  return requireInRange(name, temperatureC, airTemperatureRangeC) + iceKelvin;
}

/** A state of dry air. */
export interface DryAir {
  /** Absolute pressure in kPa, 0.001 to 10 000. */
  readonly pressureKpa: number;
  /** Temperature in degC, -100 to 1000. */
  readonly temperatureC: number;
}

/**
 * Gives the density of dry air in kg/m3.
 *
 *     rho = p / (R T),  R = 287.05287 J/(kg K)
 *
 * p is the absolute pressure, T the absolute temperature. Between 30 and 300 kPa and from -20 to 60 degC real air
 * differs from the ideal gas by less than 0.3 %.
 *
 * Throws RangeError outside the ranges of `DryAir`. Source: ideal gas law; ISO 2533:1975 for R.
 *
 * @example dryAirDensity({ pressureKpa: 101.325, temperatureC: 15 }) // 1.2250
 */
export function dryAirDensity({ pressureKpa, temperatureC }: DryAir): number {
  requireInRange('pressureKpa', pressureKpa, airPressureRangeKpa);
  return (pressureKpa * 1000) / (dryAirGasConstant * airKelvin('temperatureC', temperatureC));
}
