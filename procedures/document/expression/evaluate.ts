import type { Environment, Evaluation } from './environment';
import type { Expression } from './expression';
import { numberPart } from './number-part';
import { truthPart } from './truth-part';
import { whyNoValue } from './why-no-value';

/**
 * Compiles a checked expression (one that `inferKind` accepts) to a closure on numbers in base units. What it gives is
 * a truth or a number, as its kind says, or the reason why there is none: never NaN, never an infinity.
 *
 * Where something was not measured, `and` and `or` still answer when the other side decides alone (strong Kleene
 * logic), so `measured(x) and x > 2 kPa` does not depend on the order.
 */
export function compileEvaluation(
  expression: Expression,
  gives: 'truth' | 'quantity',
): (environment: Environment) => Evaluation {
  const part = gives === 'truth' ? truthPart(expression) : numberPart(expression);
  return (environment) => {
    const value = part(environment);
    if (value !== undefined) return { ok: true, value };
    return { ok: false, problem: whyNoValue(expression, gives, environment) };
  };
}
