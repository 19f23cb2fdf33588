import { requireInRange } from './argument-range';
import { dryAirGasConstant } from './dry-air';

// ISO 2533:1975, clause 2 (U.S. Standard Atmosphere 1976 agrees below 32 km).
/** Nominal radius of the earth, which turns geometric into geopotential altitude. */
const earthRadiusM = 6_356_766;
const seaLevelKelvin = 288.15;
const lapseKelvinPerM = 0.0065;
const seaLevelKpa = 101.325;
const standardGravityMPerS2 = 9.80665;
/** g0 / (R L) = 5.255880. */
const pressureExponent = standardGravityMPerS2 / (dryAirGasConstant * lapseKelvinPerM);

/** The one layer of the model in use here: from below the lowest road to the tropopause. */
const elevationRangeM = { low: -1000, high: 11_000 };
/** Lowest and highest absolute pressure on a vehicle or its test supply that is still plausible, in kPa. */
const pressureRangeKpa = { low: 0, high: 10_000, aboveLow: true };
/** The altimeter settings that weather services report lie well inside; a unit mistake lies outside. */
const altimeterSettingRangeKpa = { low: 85, high: 110 };

const geopotentialOf = (geometricM: number): number => (earthRadiusM * geometricM) / (earthRadiusM + geometricM);
const geometricOf = (geopotentialM: number): number => (earthRadiusM * geopotentialM) / (earthRadiusM - geopotentialM);

/**
 * Gives the standard atmosphere's pressure at an elevation, in kPa absolute.
 *
 *     H = r0 Z / (r0 + Z);  p = p0 ((T0 - L H) / T0)^(g0 / (R L))
 *
 * Z is the geometric elevation in metres above sea level, -1000 to 11 000; H the geopotential one; p0 = 101.325 kPa,
 * T0 = 288.15 K, L = 0.0065 K/m. The weather moves the true pressure by about 2 kPa either way: `stationUncertainty`.
 *
 * Throws RangeError outside that range. Source: ISO 2533:1975; U.S. Standard Atmosphere 1976.
 *
 * @example standardPressure(365.76) // 97.00775, 1200 ft
 */
export function standardPressure(elevationM: number): number {
  const geopotentialM = geopotentialOf(requireInRange('elevationM', elevationM, elevationRangeM));
  return seaLevelKpa * (1 - (lapseKelvinPerM * geopotentialM) / seaLevelKelvin) ** pressureExponent;
}

const elevationPressureRangeKpa = {
  low: standardPressure(elevationRangeM.high),
  high: standardPressure(elevationRangeM.low),
};

/**
 * Gives the geometric elevation in metres at which the standard atmosphere has this absolute pressure in kPa: the
 * inverse of `standardPressure`.
 *
 * Throws RangeError for a pressure that the model has nowhere between -1000 m and 11 000 m (22.7 to 113.9 kPa).
 * Source: ISO 2533:1975, solved for the altitude.
 *
 * @example elevationOf(97) // 366.43
 */
export function elevationOf(pressureKpa: number): number {
  const pressureRatio = requireInRange('pressureKpa', pressureKpa, elevationPressureRangeKpa) / seaLevelKpa;
  return geometricOf((seaLevelKelvin / lapseKelvinPerM) * (1 - pressureRatio ** (1 / pressureExponent)));
}

/** What a station pressure is worked out from when no barometer stands in the bay. */
export interface AltimeterReport {
  /** The altimeter setting (QNH) of a weather report in kPa, 85 to 110. */
  readonly altimeterSettingKpa: number;
  /** Geometric elevation of the bay in metres, -1000 to 11 000. */
  readonly elevationM: number;
}

/**
 * Gives the barometric pressure at a place, in kPa absolute, from the altimeter setting and the elevation.
 *
 *     p = p0 ((QNH / p0)^n - L h / T0)^(1 / n),  n = R L / g0 = 0.190263
 *
 * This is the definition of QNH in the standard atmosphere, with the elevation h taken as geopotential, as weather
 * services do. Published short forms differ from it by up to 0.1 kPa, which `stationUncertainty` carries.
 *
 * Throws RangeError outside the ranges of `AltimeterReport`. Source: WMO-No. 8, part I, chapter 3, and the altimeter
 * formulas of the national weather services.
 *
 * @example stationPressure({ altimeterSettingKpa: 102.3, elevationM: 366 }) // 97.9460
 */
export function stationPressure({ altimeterSettingKpa, elevationM }: AltimeterReport): number {
  requireInRange('altimeterSettingKpa', altimeterSettingKpa, altimeterSettingRangeKpa);
  requireInRange('elevationM', elevationM, elevationRangeM);
  const root = 1 / pressureExponent;
  const ratio = (altimeterSettingKpa / seaLevelKpa) ** root - (lapseKelvinPerM * elevationM) / seaLevelKelvin;
  return seaLevelKpa * ratio ** pressureExponent;
}

/** Where a station pressure came from; a barometer brings its own uncertainty. */
export type StationPressureSource = 'elevation' | 'altimeter-setting';

/**
 * Gives the expanded uncertainty (k = 2) of a station pressure in kPa: 2 from the elevation alone, because of the
 * weather (common practice, no source); 0.3 from an altimeter setting, from its last digit (0.01 inHg or 1 hPa), the
 * 0.1 kPa between the published formulas and the age of the report (our estimate).
 */
export function stationUncertainty(source: StationPressureSource): number {
  switch (source) {
    case 'elevation':
      return 2;
    case 'altimeter-setting':
      return 0.3;
    default:
      throw new RangeError(`source is ${String(source satisfies never)}; allowed: elevation, altimeter-setting`);
  }
}

/**
 * Gives the absolute pressure in kPa of a gauge pressure: p_abs = p_gauge + p_station, where the station pressure is
 * that of the place and hour, not 101.325 kPa.
 *
 * Throws RangeError when the station pressure is not above 0 kPa or the gauge shows less than a vacuum.
 * Source: definition; NIST SP 811 (2008) 8.5 on gauge and absolute pressure.
 *
 * @example toAbsolute(34.474, 97.35) // 131.824
 */
export function toAbsolute(gaugeKpa: number, stationKpa: number): number {
  requireInRange('stationKpa', stationKpa, pressureRangeKpa);
  return requireInRange('gaugeKpa', gaugeKpa, { low: -stationKpa, high: pressureRangeKpa.high }) + stationKpa;
}

/**
 * Gives the gauge pressure in kPa of an absolute pressure: p_gauge = p_abs - p_station.
 *
 * Throws RangeError when the station pressure is not above 0 kPa or the absolute pressure is below 0 kPa.
 * Source: definition; NIST SP 811 (2008) 8.5.
 *
 * @example toGauge(99.95, 97.35) // 2.60
 */
export function toGauge(absoluteKpa: number, stationKpa: number): number {
  requireInRange('stationKpa', stationKpa, pressureRangeKpa);
  return requireInRange('absoluteKpa', absoluteKpa, { low: 0, high: 2 * pressureRangeKpa.high }) - stationKpa;
}
