import { all, create, type MathJsInstance } from 'mathjs';
import { compileEvaluation, declaredKind, inferKind, kindInWords, parseExpression } from '../../procedures/document';
import type { NamedValue, RunHeader } from '../../procedures/engine';
import { environmentOf } from '../../procedures/engine/environment';
import { atMost, type Report } from './budget';
import { measure, timing } from './measure';

const text = 'abs(map - boost) > 1.5 kPa';
const evaluations = 100_000;
const slowEvaluations = 5_000;
/** Beside the two that the condition asks for. */
const otherValues = 60;

/** A condition as the run evaluates it, beside mathjs's own compiled evaluation of the same text with its units. */
export function benchExpression(): Report {
  const parsed = parseExpression(text);
  if (!parsed.ok) throw new Error(parsed.problem.message);
  const inferred = inferKind(parsed.expression, () => declaredKind('kPa', 'absolute'));
  if (!inferred.ok) throw new Error(inferred.problem.message);
  const ours = compileEvaluation(parsed.expression, inferred.kind.kind);
  const math = create(all ?? {}) as MathJsInstance;
  const theirs = math.compile(text);

  const value = (name: string, pascal: number): NamedValue =>
    ({ name, value: pascal, uncertainty: 300, unit: 'kPa', sense: 'absolute' }) as unknown as NamedValue;
  const known = Array.from({ length: otherValues }, (_, index) => value(`pressure${index}`, 1_000 * index));
  // As in a run: four states, in which one value differs.
  const environments = [94, 95, 96, 97].map((map) => {
    const values = [...known, value('map', 1_000 * map), value('boost', 93_900)];
    const byName = Object.fromEntries(values.map((named) => [named.name, named]));
    return environmentOf({ values: byName, truths: {}, inputs: {}, verdict: undefined, header: {} as RunHeader });
  });
  const holdsOurs = (count: number): number => {
    let holds = 0;
    for (let index = 0; index < count; index += 1) {
      const outcome = ours(environments[index % 4]!);
      if (outcome.ok && outcome.value === true) holds += 1;
    }
    return holds;
  };
  const scopes = [0, 1, 2, 3].map((step) => ({ map: math.unit(94 + step, 'kPa'), boost: math.unit(93.9, 'kPa') }));
  const holdsTheirs = (count: number): number => {
    let holds = 0;
    for (let index = 0; index < count; index += 1) if (theirs.evaluate(scopes[index % 4]) === true) holds += 1;
    return holds;
  };
  if (holdsOurs(400) !== holdsTheirs(400)) throw new Error(`${kindInWords(inferred.kind)}: not the same`);

  const timings = measure([
    { name: 'expression closure', units: evaluations, work: () => holdsOurs(evaluations) },
    { name: 'compiled expression (mathjs)', units: slowEvaluations, work: () => holdsTheirs(slowEvaluations) },
  ]);
  const [closure, compiled] = [timing(timings, 'expression closure'), timing(timings, 'compiled expression (mathjs)')];
  return {
    timings,
    budgets: [
      atMost('expression closure: microseconds an evaluation', 0.5, closure.perUnitNs / 1000),
      atMost("expression closure: share of mathjs's compiled evaluation", 0.1, closure.perUnitNs / compiled.perUnitNs),
    ],
  };
}
