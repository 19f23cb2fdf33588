import type { Environment, EvaluationProblem } from './environment';
import { stationPressureName, type Expression } from './expression';
import { partsOf } from './names-in';
import { numberPart } from './number-part';
import { truthPart } from './truth-part';

/** Why an expression has no value: walks down to the first part that has none while its own parts have. */
export function whyNoValue(
  expression: Expression,
  gives: 'truth' | 'quantity',
  environment: Environment,
): EvaluationProblem {
  const { start, end } = expression;
  for (const part of partsOf(expression)) {
    const partGives = givesOf(part, expression);
    const value = partGives === 'truth' ? truthPart(part)(environment) : numberPart(part)(environment);
    if (value === undefined) return whyNoValue(part, partGives, environment);
  }
  const name = missingName(expression, gives, environment);
  if (name !== undefined) return { code: 'not-measured', name, message: `not measured: ${name}`, start, end };
  return { code: 'no-value', message: 'its numbers lie outside what can be calculated', start, end };
}

/** What a part has to give follows from what it is part of. */
function givesOf(part: Expression, whole: Expression): 'truth' | 'quantity' {
  return part.node !== 'number' && (whole.node === 'logic' || whole.node === 'not') ? 'truth' : 'quantity';
}

function missingName(node: Expression, gives: 'truth' | 'quantity', environment: Environment): string | undefined {
  if (node.node === 'about') return node.name;
  if (node.node === 'name') return gives === 'quantity' ? node.name : undefined;
  const readsStation = node.node === 'call' && (node.calls === 'absolute' || node.calls === 'gauge');
  return readsStation && environment.number(stationPressureName) === undefined ? stationPressureName : undefined;
}
