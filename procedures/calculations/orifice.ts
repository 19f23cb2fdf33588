import { requireInRange } from './argument-range';
import { airKelvin, airPressureRangeKpa, dryAirGasConstant } from './dry-air';

/** Air on both sides of a hole. */
export interface OrificeConditions {
  /** Absolute stagnation pressure before the hole in kPa, 0.001 to 10 000. */
  readonly upstreamKpa: number;
  /** Absolute pressure behind it in kPa, 0 to `upstreamKpa`. */
  readonly downstreamKpa: number;
  /** Stagnation temperature before it in degC, -100 to 1000. */
  readonly upstreamC: number;
  /** Effective over geometric area, above 0 to 1; about 0.61 for a sharp edge, 0.8 and more for rounded holes. */
  readonly dischargeCoefficient?: number;
  /** Ratio of the specific heats, 1.01 to 1.7; 1.4 for air near room temperature. */
  readonly gamma?: number;
}

/** What `orificeMassFlow` gives. */
export interface OrificeFlow {
  /** Mass flow in g/s. */
  readonly gps: number;
  /** Whether the speed of sound is reached in the hole: a lower pressure behind it then changes nothing. */
  readonly choked: boolean;
}

const diameterRangeMm = { low: 0, high: 1000 };
const flowRangeGps = { low: 0, high: 1_000_000 };
const coefficientRange = { low: 0.001, high: 1 };
const gammaRange = { low: 1.01, high: 1.7 };

/** The pressure ratio at and below which the flow is choked: (2 / (g + 1))^(g / (g - 1)), 0.52828 for g = 1.4. */
export function criticalPressureRatio(gamma: number): number {
  return (2 / (gamma + 1)) ** (gamma / (gamma - 1));
}

/**
 * Gives the flow function phi, dimensionless: m = Cd A p1 phi / sqrt(R T1).
 *
 *     phi^2 = 2 g / (g - 1) (r^(2 / g) - r^((g + 1) / g)),  r = p2 / p1, not below the critical ratio
 *
 * The difference of the powers is taken as r^(2 / g) (1 - r^((g - 1) / g)), and that by `expm1` and `log1p`: a
 * pressure difference of a few pascals keeps all its figures.
 */
export function flowFunction(upstreamKpa: number, downstreamKpa: number, gamma: number): number {
  const critical = criticalPressureRatio(gamma);
  const isChoked = downstreamKpa <= critical * upstreamKpa;
  const logRatio = isChoked ? Math.log(critical) : Math.log1p((downstreamKpa - upstreamKpa) / upstreamKpa);
  const kinetic = -Math.expm1(((gamma - 1) / gamma) * logRatio);
  return Math.sqrt(((2 * gamma) / (gamma - 1)) * kinetic) * Math.exp(logRatio / gamma);
}

/** Mass flow in g/s through each square millimetre of hole; 1 mm2 kPa / sqrt(J/kg) is 1 g/s. */
function gpsPerMm2({
  upstreamKpa,
  downstreamKpa,
  upstreamC,
  dischargeCoefficient = 1,
  gamma = 1.4,
}: OrificeConditions): number {
  requireInRange('upstreamKpa', upstreamKpa, airPressureRangeKpa);
  requireInRange('downstreamKpa', downstreamKpa, { low: 0, high: upstreamKpa });
  requireInRange('dischargeCoefficient', dischargeCoefficient, coefficientRange);
  requireInRange('gamma', gamma, gammaRange);
  const speed = Math.sqrt(dryAirGasConstant * airKelvin('upstreamC', upstreamC));
  return (dischargeCoefficient * upstreamKpa * flowFunction(upstreamKpa, downstreamKpa, gamma)) / speed;
}

/**
 * Gives the mass flow of air through a round hole in g/s, and whether it is choked.
 *
 *     m = Cd A p1 phi(r) / sqrt(R T1),  A = pi d^2 / 4,  r = p2 / p1
 *     r above (2 / (g + 1))^(g / (g - 1)):  phi^2 = 2 g / (g - 1) (r^(2 / g) - r^((g + 1) / g))
 *     otherwise choked:                     phi^2 = g (2 / (g + 1))^((g + 1) / (g - 1))
 *
 * d is `diameterMm`, 0 to 1000; p1, T1 the stagnation state upstream, p2 the pressure downstream, all absolute;
 * R = 287.05287 J/(kg K). Cd is 1 when left out, which makes d the diameter of an ideal nozzle with the same flow.
 *
 * Throws RangeError outside the ranges of `OrificeConditions`; air does not flow to the higher pressure, so a
 * `downstreamKpa` above `upstreamKpa` is refused too. Source: one-dimensional isentropic nozzle flow, NACA Report 1135
 * (1953); R of ISO 2533:1975.
 *
 * @example
 * orificeMassFlow({ diameterMm: 1, upstreamKpa: 300, downstreamKpa: 97.35, upstreamC: 20, dischargeCoefficient: 0.8 })
 * // { gps: 0.44493, choked: true }
 */
export function orificeMassFlow(orifice: OrificeConditions & { readonly diameterMm: number }): OrificeFlow {
  const { diameterMm, upstreamKpa, downstreamKpa, gamma = 1.4 } = orifice;
  requireInRange('diameterMm', diameterMm, diameterRangeMm);
  return {
    gps: (Math.PI / 4) * diameterMm ** 2 * gpsPerMm2(orifice),
    choked: downstreamKpa <= criticalPressureRatio(gamma) * upstreamKpa,
  };
}

/**
 * Gives the diameter in mm of the round hole with this mass flow of air (`flowGps`, 0 to 1 000 000): the inverse of
 * `orificeMassFlow`. The flow grows with the square of the diameter, so this is a closed form.
 *
 *     d = sqrt(4 m sqrt(R T1) / (pi Cd p1 phi(r)))
 *
 * Throws RangeError as `orificeMassFlow` does, and for equal pressures: nothing flows between them, whatever the hole.
 * Source: as `orificeMassFlow`.
 *
 * @example
 * orificeDiameter({ flowGps: 0.4449, upstreamKpa: 300, downstreamKpa: 97.35, upstreamC: 20, dischargeCoefficient: 0.8 })
 * // 0.99996
 */
export function orificeDiameter(orifice: OrificeConditions & { readonly flowGps: number }): number {
  const { flowGps, upstreamKpa, downstreamKpa } = orifice;
  requireInRange('flowGps', flowGps, flowRangeGps);
  const perMm2 = gpsPerMm2(orifice);
  if (downstreamKpa === upstreamKpa) {
    throw new RangeError(`downstreamKpa is ${downstreamKpa}; allowed: 0 to below upstreamKpa, ${upstreamKpa}`);
  }
  return Math.sqrt((4 * flowGps) / (Math.PI * perMm2));
}
