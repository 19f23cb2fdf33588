import { standardPressure, stationPressure, units, type UnitName } from '../../calculations';
import type { Environment, Evaluation } from './environment';
import { compileEvaluation } from './evaluate';
import { inferKind } from './infer-kind';
import { declaredKind, truth, type Kind } from './kinds';
import { parseExpression } from './parse';

const kinds: Readonly<Record<string, Kind>> = {
  manifold: declaredKind('kPa', 'absolute'),
  boost: declaredKind('kPa', 'absolute'),
  stationPressure: declaredKind('kPa', 'absolute'),
  sealPoint: declaredKind('kPa', 'gauge'),
  missing: declaredKind('kPa', 'absolute'),
  coolant: declaredKind('degC'),
  elevation: declaredKind('m'),
  count: declaredKind('1'),
  nothing: declaredKind('1'),
  cold: truth,
  warm: truth,
};
const values: Readonly<Record<string, number>> = {
  manifold: 93_900,
  boost: 95_100,
  stationPressure: 94_000,
  sealPoint: 2_600,
  coolant: 358.15,
  elevation: 640,
  count: 3,
  nothing: 0,
};
const environment: Environment = {
  number: (name) => (Object.hasOwn(values, name) ? values[name] : undefined),
  truth: (name) => name === 'cold',
  result: (name) => (({ manifold: 'in', boost: 'out', sealPoint: 'too-close' }) as const)[name as 'manifold'],
  uncertainty: (name) => (name === 'manifold' ? 600 : undefined),
  isMeasured: (name) => Object.hasOwn(values, name),
};

function evaluate(source: string, given: Environment = environment): Evaluation {
  const parsed = parseExpression(source);
  if (!parsed.ok) throw new Error(parsed.problem.message);
  const inferred = inferKind(parsed.expression, (name) => kinds[name]);
  if (!inferred.ok) throw new Error(inferred.problem.message);
  return compileEvaluation(parsed.expression, inferred.kind.kind)(given);
}

describe('numbers come in base units', () => {
  test.each([
    ['manifold', 93_900],
    ['manifold - boost', -1_200],
    ['abs(manifold - boost) / 2', 600],
    ['2 kPa + 3 hPa', 2_300],
    ['-sealPoint', -2_600],
    ['-40 degC', 233.15],
    ['coolant - 20 degC', 65],
    ['min(manifold, boost, 94.5 kPa)', 93_900],
    ['max(manifold, boost, 94.5 kPa)', 95_100],
    ['mean(manifold, boost)', 94_500],
    ['absolute(sealPoint)', 96_600],
    ['gauge(boost)', 1_100],
    ['standardPressure(elevation)', standardPressure(640) * 1_000],
    [
      'stationPressure(1013.25 hPa, elevation)',
      stationPressure({ altimeterSettingKpa: 101.325, elevationM: 640 }) * 1_000,
    ],
    ['uncertainty(manifold)', 600],
    ['50 % * count', 1.5],
  ])('%s', (source, expected) => {
    const outcome = evaluate(source);
    if (!outcome.ok || typeof outcome.value !== 'number') throw new Error(`no number: ${JSON.stringify(outcome)}`);
    expect(outcome.value).toBeCloseTo(expected, 9);
  });
});

describe('truths', () => {
  test.each([
    ['cold', true],
    ['warm', false],
    ['cold and not warm', true],
    ['sealPoint >= 1.5 kPa and sealPoint <= 5 kPa', true],
    ['manifold == 93.9 kPa', true],
    ['manifold != 93.9 kPa', false],
    ['manifold < 93.9 kPa', false],
    ['manifold <= 939 hPa', true],
    ['coolant >= 85 degC', true],
    ['coolant > 185 degF', false],
    ['inBand(manifold)', true],
    ['outOfBand(boost)', true],
    ['tooClose(sealPoint)', true],
    ['inBand(sealPoint)', false],
    ['inBand(coolant) or outOfBand(coolant) or tooClose(coolant)', false],
    ['measured(manifold)', true],
    ['measured(missing)', false],
    ['uncertainty(manifold) <= 0.5 kPa', false],
  ])('%s is %s', (source, value) => {
    expect(evaluate(source)).toEqual({ ok: true, value });
  });

  it('does not let the last bits of a conversion decide', () => {
    const names = Object.keys(units).filter((name) => units[name as UnitName].kind === 'pressure');
    for (const name of names) {
      const text = `${34_500 / units[name as UnitName].scale} ${name}`;
      expect([text, evaluate(`34.5 kPa <= ${text}`)]).toEqual([text, { ok: true, value: true }]);
      expect([text, evaluate(`34.5 kPa < ${text}`)]).toEqual([text, { ok: true, value: false }]);
    }
  });
});

describe('what was not measured', () => {
  test.each([
    'missing',
    'missing > 2 kPa',
    'manifold - missing',
    'max(manifold, boost, missing)',
    'gauge(missing)',
    'inBand(missing)',
    'not outOfBand(missing)',
    'cold and missing > 2 kPa',
    'warm or inBand(missing)',
  ])('%s says which name', (source) => {
    expect(evaluate(source)).toMatchObject({
      ok: false,
      problem: { code: 'not-measured', name: 'missing', message: 'not measured: missing' },
    });
  });

  it('names the air of the place behind a conversion', () => {
    const outcome = evaluate('absolute(sealPoint)', {
      ...environment,
      number: (name) => (name === 'sealPoint' ? 2_600 : undefined),
    });
    expect(outcome).toMatchObject({ ok: false, problem: { name: 'stationPressure' } });
  });

  test.each([
    ['warm and missing > 2 kPa', false],
    ['missing > 2 kPa and warm', false],
    ['cold or missing > 2 kPa', true],
    ['inBand(missing) or cold', true],
    ['measured(missing) and missing > 2 kPa', false],
    ['missing > 2 kPa and measured(missing)', false],
    ['not (warm and inBand(missing))', true],
  ])('%s is decided by the other side alone', (source, value) => {
    expect(evaluate(source)).toEqual({ ok: true, value });
  });
});

describe('what cannot be calculated', () => {
  test.each([
    'count / nothing',
    'nothing / nothing',
    '1e200 * 1e200 * count',
    'standardPressure(20 km)',
    'absolute(-200 kPa)',
    'count / nothing > 3',
    'not (count / nothing > 3)',
  ])('%s has no value, never NaN or an infinity', (source) => {
    expect(evaluate(source)).toMatchObject({ ok: false, problem: { code: 'no-value' } });
  });

  test.each([Number.NaN, Number.POSITIVE_INFINITY])('an environment that gives %s counts as not measured', (bad) => {
    const outcome = evaluate('manifold > 2 kPa', { ...environment, number: () => bad });
    expect(outcome).toMatchObject({ ok: false, problem: { code: 'not-measured', name: 'manifold' } });
  });
});
