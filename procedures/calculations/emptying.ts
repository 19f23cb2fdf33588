import { criticalPressureRatio, flowFunction } from './orifice';

/*
 * A rigid volume at one temperature that empties through a hole into the room, quasi-steady:
 *
 *     dp/dt = -k p phi(p_s / p),  k = Cd A sqrt(R T) / V
 *
 * In the dimensionless time theta = k t every volume and hole has the same curve, so the time left until the pressure
 * is gone is a function of q = p / p_s - 1 alone. For air (gamma = 1.4) it has a closed form. With
 * s^2 = (p / p_s)^(2/7) - 1, while the flow is not choked,
 *
 *     dtheta = -sqrt(7) (1 + s^2)^2 ds,  so theta left = sqrt(7) (s + 2 s^3 / 3 + s^5 / 5)
 *
 * and while it is choked, phi is constant and p falls exponentially.
 */

const gamma = 1.4;
const root = Math.sqrt(7);
const criticalRatio = criticalPressureRatio(gamma);
const chokedFlow = flowFunction(1, 0, gamma);
/** Overpressure over station pressure above which the flow is choked, 0.893, and the time left there. */
const chokedAbove = 1 / criticalRatio - 1;
const chokedBefore = subsonicTimeLeft(risenRoot(chokedAbove));

/** s of the overpressure q. */
function risenRoot(q: number): number {
  return Math.sqrt(Math.expm1((2 / 7) * Math.log1p(q)));
}

function subsonicTimeLeft(s: number): number {
  return root * s * (1 + s ** 2 * (2 / 3 + s ** 2 / 5));
}

/** Gives the dimensionless time theta left until an overpressure q (gauge over station pressure) is gone; 0 from 0 down. */
export function timeLeft(q: number): number {
  if (q <= 0) return 0;
  if (q <= chokedAbove) return subsonicTimeLeft(risenRoot(q));
  return chokedBefore + Math.log((1 + q) * criticalRatio) / chokedFlow;
}

/** Gives the overpressure q with this dimensionless time left: the inverse of `timeLeft`. */
export function overpressureAt(theta: number): number {
  if (theta <= 0) return 0;
  if (theta > chokedBefore) return Math.exp(chokedFlow * (theta - chokedBefore)) / criticalRatio - 1;
  // Newton's method from above on a function that rises and curves upwards: it comes down to the root, and the first
  // step that does not go down is rounding.
  let s = theta / root;
  for (;;) {
    const next = s - (subsonicTimeLeft(s) - theta) / (root * (1 + s ** 2) ** 2);
    if (!(next < s)) break;
    s = next;
  }
  return Math.expm1(3.5 * Math.log1p(s ** 2));
}

/** Gives how fast the overpressure q falls, -dq/dtheta = (p / p_s) phi; 0 from 0 down. */
export function fallRate(q: number): number {
  if (q <= 0) return 0;
  if (q > chokedAbove) return (1 + q) * chokedFlow;
  const s = risenRoot(q);
  return root * s * Math.sqrt(1 + s ** 2);
}
