import type { Environment } from './environment';
import { stationPressureName, type Expression } from './expression';
import { partsOf } from './names-in';
import { numberPart } from './number-part';

/** The step for the differences, as a part of the name's uncertainty: small against it, large against rounding. */
const stepOfUncertainty = 0.01;
/** How far the slopes of both sides differ, as a part of the steeper, where a function has a corner. */
const cornerRatio = 0.1;

/**
 * Gives the expanded uncertainty (k = 2) of a number, in its base unit, from those of the names that it is made of.
 *
 *     U^2 = sum over the names of (df/dx U_x)^2,  df/dx = (f(x + h) - f(x - h)) / 2h
 *
 * The names are taken as independent, and the function as a straight line within their uncertainties; at the corner of
 * `abs`, `min` and `max` the steeper of the two sides counts. A name without an uncertainty adds nothing. Throws
 * RangeError where the expression has no value: evaluate it first. Source: JCGM 100:2008, 5.1.2 (eq. 10) and 6.2.1.
 *
 * @example a - b with U(a) = 0.3 kPa and U(b) = 0.4 kPa has U = 500 Pa
 */
export function expandedUncertaintyOf(expression: Expression): (environment: Environment) => number {
  const part = numberPart(expression);
  const names = valueNames(expression);
  return (environment) => {
    const middle = part(environment);
    if (middle === undefined) throw new RangeError('the expression has no value; allowed: one that evaluates');
    let squares = 0;
    for (const name of names) {
      const uncertainty = environment.uncertainty(name) ?? 0;
      const value = environment.number(name);
      if (uncertainty === 0 || value === undefined) continue;
      const step = uncertainty * stepOfUncertainty;
      const above = part(withNumber(environment, name, value + step));
      const below = part(withNumber(environment, name, value - step));
      squares += (slopeOf(below, middle, above, step) * uncertainty) ** 2;
    }
    return Math.sqrt(squares);
  };
}

/** The central difference; the steeper side at a corner, the one side at the end of a calculation's range. */
function slopeOf(below: number | undefined, middle: number, above: number | undefined, step: number): number {
  const rising = above === undefined ? undefined : (above - middle) / step;
  const falling = below === undefined ? undefined : (middle - below) / step;
  if (rising === undefined || falling === undefined) return rising ?? falling ?? 0;
  const steeper = Math.max(Math.abs(rising), Math.abs(falling));
  return Math.abs(rising - falling) > cornerRatio * steeper ? steeper : (rising + falling) / 2;
}

/** The names whose values, not only whose results, the number rests on. */
function valueNames(expression: Expression): readonly string[] {
  const names = new Set<string>();
  const visit = (node: Expression): void => {
    if (node.node === 'name') names.add(node.name);
    if (node.node === 'call' && (node.calls === 'absolute' || node.calls === 'gauge')) names.add(stationPressureName);
    partsOf(node).forEach(visit);
  };
  visit(expression);
  return [...names];
}

/** Written out, not spread: judging a reading does this for every name of its band's ends. */
function withNumber(environment: Environment, changed: string, value: number): Environment {
  const { truth, result, uncertainty, isMeasured } = environment;
  const number = (name: string): number | undefined => (name === changed ? value : environment.number(name));
  return { number, truth, result, uncertainty, isMeasured };
}
