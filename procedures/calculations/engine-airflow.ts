import { requireInRange } from './argument-range';
import { dryAirDensity } from './dry-air';

/** A four-stroke engine at a steady speed and the air in its manifold. */
export interface EngineAir {
  /** Swept volume of all cylinders in litres, 0.01 to 100. */
  readonly displacementL: number;
  /** Crankshaft speed in revolutions per minute, 1 to 30 000. */
  readonly rpm: number;
  /** Absolute pressure in the manifold in kPa, 0.1 to 1000. */
  readonly manifoldKpa: number;
  /** Temperature of the air in the manifold in degC, -100 to 1000. */
  readonly intakeC: number;
}

const displacementRangeL = { low: 0.01, high: 100 };
const speedRangeRpm = { low: 1, high: 30_000 };
const manifoldRangeKpa = { low: 0.1, high: 1000 };
/** A fraction: a percentage in its place is refused. */
const efficiencyRange = { low: 0, high: 3 };
const airflowRangeGps = { low: 0, high: 10_000_000 };

/** The air that the cylinders would take in each second if they filled at manifold density, in g/s. */
function sweptAirGps({ displacementL, rpm, manifoldKpa, intakeC }: EngineAir): number {
  requireInRange('displacementL', displacementL, displacementRangeL);
  requireInRange('rpm', rpm, speedRangeRpm);
  requireInRange('manifoldKpa', manifoldKpa, manifoldRangeKpa);
  // Named here as the caller knows it.
  requireInRange('intakeC', intakeC, { low: -100, high: 1000 });
  const gramsPerL = dryAirDensity({ pressureKpa: manifoldKpa, temperatureC: intakeC });
  const cyclesPerSecond = rpm / 60 / 2;
  return gramsPerL * displacementL * cyclesPerSecond;
}

/**
 * Gives the air mass flow of a four-stroke engine in g/s, by the speed-density method.
 *
 *     m = VE rho V N / 2,  rho = p / (R T)
 *
 * VE is the volumetric efficiency as a fraction (0 to 3) **referred to the density in the manifold**, not to that of
 * the ambient air; V the displacement, N the revolutions per second, p and T those of the manifold. The air is taken
 * as dry: moist air makes the true mass flow smaller, by 0.7 % at 25 degC and 60 % relative humidity.
 *
 * Throws RangeError outside the ranges of `EngineAir`. Source: "Internal Combustion Engine Fundamentals", section on
 * volumetric efficiency (from memory); ideal gas law.
 *
 * @example
 * speedDensityAirflow({ displacementL: 2, rpm: 2000, manifoldKpa: 97.35, intakeC: 25, volumetricEfficiency: 0.88 })
 * // 33.366
 */
export function speedDensityAirflow(engine: EngineAir & { readonly volumetricEfficiency: number }): number {
  return requireInRange('volumetricEfficiency', engine.volumetricEfficiency, efficiencyRange) * sweptAirGps(engine);
}

/**
 * Gives the volumetric efficiency of a four-stroke engine as a fraction, referred to the density in the manifold: the
 * measured air mass flow over what the cylinders sweep at that density. The inverse of `speedDensityAirflow`.
 *
 *     VE = 2 m / (rho V N),  rho = p / (R T)
 *
 * `airflowGps` is 0 to 10 000 000 g/s. The result is not bounded: an efficiency far from 1 tells of a reading or a
 * displacement that cannot be right.
 *
 * Throws RangeError outside the ranges of `EngineAir`. Source: as `speedDensityAirflow`.
 *
 * @example
 * volumetricEfficiency({ displacementL: 1.4, rpm: 750, manifoldKpa: 33, intakeC: 42, airflowGps: 3.05 }) // 0.9556
 */
export function volumetricEfficiency(engine: EngineAir & { readonly airflowGps: number }): number {
  return requireInRange('airflowGps', engine.airflowGps, airflowRangeGps) / sweptAirGps(engine);
}
