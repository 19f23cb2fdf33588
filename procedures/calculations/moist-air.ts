import { requireInRange } from './argument-range';

/** A state of moist air. */
export interface MoistAir {
  /** Absolute pressure in kPa, 10 to 1000. */
  readonly pressureKpa: number;
  /** Temperature in degC, -40 to 100. */
  readonly temperatureC: number;
  /** Relative humidity over liquid water as a fraction, 0 to 1. */
  readonly relativeHumidity: number;
}

const pressureRangeKpa = { low: 10, high: 1000 };
const temperatureRangeC = { low: -40, high: 100 };

// CIPM-2007: Picard, Davis, Gläser, Fujii, Metrologia 45 (2008) 149-155, equations (1) to (3) and appendix A1.
const molarGasConstant = 8.314472;
/** Molar mass of dry air with 400 parts per million of carbon dioxide, kg/mol. */
const dryAirMolarMass = 28.96546e-3;
const waterMolarMass = 18.01528e-3;

/** Saturation vapour pressure over liquid water in Pa (CIPM-2007, A1.1), T in kelvin. */
function saturationPa(kelvin: number): number {
  return Math.exp(1.2378847e-5 * kelvin ** 2 - 1.9121316e-2 * kelvin + 33.93711047 - 6343.1645 / kelvin);
}

/** Enhancement factor: how much more vapour saturated air holds than the vapour pressure says (CIPM-2007, A1.2). */
function enhancementFactor(pressurePa: number, temperatureC: number): number {
  return 1.00062 + 3.14e-8 * pressurePa + 5.6e-7 * temperatureC ** 2;
}

/** Compressibility of moist air (CIPM-2007, A1.4); x is the mole fraction of water. */
function compressibility(pressurePa: number, temperatureC: number, kelvin: number, x: number): number {
  const t = temperatureC;
  const pOverT = pressurePa / kelvin;
  const first = 1.58123e-6 - 2.9331e-8 * t + 1.1043e-10 * t ** 2;
  const second = (5.707e-6 - 2.051e-8 * t) * x + (1.9898e-4 - 2.376e-6 * t) * x ** 2;
  return 1 - pOverT * (first + second) + pOverT ** 2 * (1.83e-11 - 0.765e-8 * x ** 2);
}

/**
 * Gives the mole fraction of water in moist air.
 *
 *     x = h f(p, t) p_sv(T) / p
 *
 * h is the relative humidity, f the enhancement factor, p_sv the saturation vapour pressure.
 *
 * Throws RangeError outside the ranges of `MoistAir` and when there would be more vapour than air: 95 degC and
 * saturation are not possible at 50 kPa. Source: CIPM-2007, Metrologia 45 (2008) 149, A1.1 to A1.3.
 */
export function waterMoleFraction({ pressureKpa, temperatureC, relativeHumidity }: MoistAir): number {
  requireInRange('pressureKpa', pressureKpa, pressureRangeKpa);
  requireInRange('temperatureC', temperatureC, temperatureRangeC);
  const pressurePa = pressureKpa * 1000;
  const saturated = (enhancementFactor(pressurePa, temperatureC) * saturationPa(temperatureC + 273.15)) / pressurePa;
  return requireInRange('relativeHumidity', relativeHumidity, { low: 0, high: Math.min(1, 1 / saturated) }) * saturated;
}

/**
 * Gives the density of moist air in kg/m3.
 *
 *     rho = p M_a / (Z R T) (1 - x (1 - M_v / M_a))
 *
 * p is the absolute pressure, T the absolute temperature, x the mole fraction of water (`waterMoleFraction`), M_a and
 * M_v the molar masses of dry air (with 400 parts per million of carbon dioxide) and water, Z the compressibility.
 *
 * The equation is recommended for 60 to 110 kPa and 15 to 27 degC, where its standard uncertainty is 22 parts in a
 * million. Outside it is an extrapolation: from 30 to 300 kPa and -20 to 60 degC it stays within 0.3 % of an ideal
 * mixture. At no humidity it lies 0.04 % above `dryAirDensity` near room conditions, for air's compressibility.
 *
 * Throws RangeError outside the ranges of `MoistAir` and for more vapour than air. Source: CIPM-2007, Metrologia 45
 * (2008) 149.
 *
 * @example moistAirDensity({ pressureKpa: 101.325, temperatureC: 20, relativeHumidity: 0.5 }) // 1.19931
 */
export function moistAirDensity(air: MoistAir): number {
  const x = waterMoleFraction(air);
  const pressurePa = air.pressureKpa * 1000;
  const kelvin = air.temperatureC + 273.15;
  const z = compressibility(pressurePa, air.temperatureC, kelvin, x);
  const dry = (pressurePa * dryAirMolarMass) / (z * molarGasConstant * kelvin);
  return dry * (1 - x * (1 - waterMolarMass / dryAirMolarMass));
}
