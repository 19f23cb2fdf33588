import { calculations } from './vocabulary';
import { compileEvaluation } from './evaluate';
import type { Environment } from './environment';
import { inferKind } from './infer-kind';
import { declaredKind, kindInWords, type Kind } from './kinds';
import { parseExpression } from './parse';
import { signatures } from './signatures';

const kinds: Readonly<Record<string, Kind>> = {
  displacement: declaredKind('L'),
  speed: declaredKind('rpm'),
  manifold: declaredKind('kPa', 'absolute'),
  rise: declaredKind('kPa', 'gauge'),
  intake: declaredKind('degC'),
  airflow: declaredKind('g/s'),
  hold: declaredKind('s'),
};
const nothing: Environment = {
  number: () => undefined,
  truth: () => false,
  result: () => undefined,
  uncertainty: () => undefined,
  isMeasured: () => false,
};

function kindOf(source: string): string {
  const parsed = parseExpression(source);
  if (!parsed.ok) throw new Error(parsed.problem.message);
  const inferred = inferKind(parsed.expression, (name) => kinds[name]);
  return inferred.ok ? kindInWords(inferred.kind) : inferred.problem.message;
}

function value(source: string): unknown {
  const parsed = parseExpression(source);
  if (!parsed.ok) throw new Error(parsed.problem.message);
  const evaluation = compileEvaluation(parsed.expression, 'quantity')(nothing);
  return evaluation.ok ? evaluation.value : evaluation.problem;
}

describe('the calculations that an expression may call', () => {
  it('are checked by what their arguments measure', () => {
    expect(kindOf('speedDensityAirflow(displacement, speed, manifold, intake, 0.85)')).toBe('a mass flow');
    expect(kindOf('volumetricEfficiency(displacement, speed, manifold, intake, airflow)')).toBe('a plain number');
    expect(kindOf('orificeDiameter(airflow, manifold, 94 kPa, intake)')).toBe('a distance');
    expect(kindOf('orificeMassFlow(1 mm, manifold, 94 kPa, intake)')).toBe('a mass flow');
    expect(kindOf('decayLeakRate(8 L, manifold, 100 kPa, intake, 20 degC, hold)')).toBe('a volume flow');
    expect(kindOf('elevationOf(manifold)')).toBe('a distance');
  });

  it('refuse a gauge pressure, a difference of temperatures and what is in the wrong place, and say what they take', () => {
    expect(kindOf('speedDensityAirflow(displacement, speed, rise, intake, 0.85)')).toBe(
      '`speedDensityAirflow` takes an absolute pressure here, not a gauge pressure.',
    );
    expect(kindOf('orificeMassFlow(1 mm, manifold, 94 kPa, intake - 20 degC)')).toBe(
      '`orificeMassFlow` takes a temperature here, not a difference of temperatures.',
    );
    expect(kindOf('volumetricEfficiency(speed, displacement, manifold, intake, airflow)')).toMatch(
      /takes a volume here, not a number of turns in a time/,
    );
  });

  it('have as many arguments as their form names', () => {
    for (const [name, { takes }] of Object.entries(signatures)) {
      const { least, most, form } = calculations[name as keyof typeof signatures];
      expect([name, least, most, form.split(',').length]).toEqual([name, takes.length, takes.length, takes.length]);
    }
  });

  // The values are those of the calculations' own reference tests, in base units.
  it('give what the calculations give, in base units', () => {
    expect(value('speedDensityAirflow(2 L, 2000 rpm, 97.35 kPa, 25 degC, 0.88)')).toBeCloseTo(0.033366, 5);
    expect(value('volumetricEfficiency(1.4 L, 750 rpm, 33 kPa, 42 degC, 3.05 g/s)')).toBeCloseTo(0.9556, 4);
    expect(
      value('orificeDiameter(orificeMassFlow(1 mm, 108 kPa, 94 kPa, 20 degC), 108 kPa, 94 kPa, 20 degC)'),
    ).toBeCloseTo(0.001, 12);
    expect(value('decayLeakRate(8 L, 108 kPa, 108 kPa, 20 degC, 20 degC, 60 s)')).toBe(0);
  });

  it('have no value where there is none', () => {
    expect(value('orificeDiameter(1 g/s, 94 kPa, 94 kPa, 20 degC)')).not.toEqual(expect.any(Number));
    expect(value('speedDensityAirflow(-2 L, 2000 rpm, 97.35 kPa, 25 degC, 0.88)')).not.toEqual(expect.any(Number));
  });
});
