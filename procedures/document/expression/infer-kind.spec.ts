import { inferKind } from './infer-kind';
import { declaredKind, kindInWords, truth, type Kind } from './kinds';
import { parseExpression } from './parse';

const names: Readonly<Record<string, Kind>> = {
  manifold: declaredKind('kPa', 'absolute'),
  boost: declaredKind('psi', 'absolute'),
  stationPressure: declaredKind('kPa', 'absolute'),
  sealPoint: declaredKind('kPa', 'gauge'),
  highest: declaredKind('inH2O', 'gauge'),
  rise: declaredKind('kPa'),
  coolant: declaredKind('degC'),
  ambient: declaredKind('degF'),
  within: declaredKind('K'),
  flow: declaredKind('g/s'),
  airFlow: declaredKind('L/min'),
  volume: declaredKind('L'),
  held: declaredKind('s'),
  elevation: declaredKind('m'),
  speed: declaredKind('rpm'),
  share: declaredKind('%'),
  loud: declaredKind('dB'),
  supply: declaredKind('V'),
  cold: truth,
  seals: truth,
};

function infer(source: string): { kind?: string; problem?: string } {
  const parsed = parseExpression(source);
  if (!parsed.ok) throw new Error(parsed.problem.message);
  const inferred = inferKind(parsed.expression, (name) => (Object.hasOwn(names, name) ? names[name] : undefined));
  return inferred.ok ? { kind: kindInWords(inferred.kind) } : { problem: inferred.problem.message };
}

describe('what an expression gives', () => {
  test.each([
    ['manifold', 'an absolute pressure'],
    ['manifold - boost', 'a pressure difference'],
    ['manifold - 2 kPa', 'an absolute pressure'],
    ['2 kPa + manifold', 'an absolute pressure'],
    ['100 kPa - manifold', 'a pressure difference'],
    ['manifold + rise', 'an absolute pressure'],
    ['manifold - rise', 'an absolute pressure'],
    ['sealPoint + 1 psi', 'a gauge pressure'],
    ['sealPoint - highest', 'a pressure difference'],
    ['sealPoint - rise', 'a gauge pressure'],
    ['1 kPa + 2 psi', 'a pressure'],
    ['-rise', 'a pressure difference'],
    ['-sealPoint', 'a gauge pressure'],
    ['2 * sealPoint', 'a gauge pressure'],
    ['manifold / 2', 'an absolute pressure'],
    ['manifold / boost', 'a plain number'],
    ['rise / manifold', 'a plain number'],
    ['abs(manifold - boost)', 'a pressure difference'],
    ['mean(manifold, boost)', 'an absolute pressure'],
    ['min(sealPoint, rise, 3 kPa)', 'a gauge pressure'],
    ['absolute(sealPoint)', 'an absolute pressure'],
    ['absolute(2 kPa) - manifold', 'a pressure difference'],
    ['gauge(manifold) - sealPoint', 'a pressure difference'],
    ['standardPressure(elevation)', 'an absolute pressure'],
    ['stationPressure(boost, elevation)', 'an absolute pressure'],
    ['stationPressure(1013.25 hPa, 640 m)', 'an absolute pressure'],
    ['uncertainty(manifold)', 'a pressure difference'],
    ['coolant', 'a temperature'],
    ['coolant - ambient', 'a difference of temperatures'],
    ['coolant - 5 K', 'a temperature'],
    ['uncertainty(coolant)', 'a difference of temperatures'],
    ['coolant / ambient', 'a plain number'],
    ['volume / held', 'a volume flow'],
    ['flow / volume', 'something in kg m-3 s-1'],
    ['1 / held', 'a number of turns in a time'],
    ['share * 2 + 5 %', 'a plain number'],
    ['loud - 6 dB', 'a sound level'],
    ['manifold > boost', 'something that holds or does not'],
    ['sealPoint >= 1.5 kPa', 'something that holds or does not'],
    ['manifold >= 90 kPa', 'something that holds or does not'],
    ['rise < sealPoint', 'something that holds or does not'],
    ['abs(coolant - ambient) <= within', 'something that holds or does not'],
    ['coolant >= 185 degF', 'something that holds or does not'],
    ['cold and not seals or measured(rise)', 'something that holds or does not'],
    ['inBand(sealPoint)', 'something that holds or does not'],
  ])('%s gives %s', (source, kind) => {
    expect(infer(source)).toEqual({ kind });
  });
});

describe('gauge and absolute are different kinds', () => {
  test.each([
    'manifold > sealPoint',
    'manifold - sealPoint',
    'sealPoint - manifold',
    'manifold + sealPoint',
    'manifold == highest',
    'min(manifold, sealPoint)',
    'mean(sealPoint, boost, 2 kPa)',
    'manifold / sealPoint',
    'manifold - boost > manifold',
    'rise > manifold',
    'rise - manifold',
    'uncertainty(manifold) < boost',
  ])('%s is refused', (source) => {
    expect(infer(source).problem).toMatch(/absolute\(\.\.\.\)|subtract two absolute pressures/);
  });

  test.each([
    ['absolute(manifold)', /takes a gauge pressure here, not an absolute pressure/],
    ['gauge(sealPoint)', /takes an absolute pressure here, not a gauge pressure/],
    ['manifold + boost', /mean\(a, b\)/],
    ['-manifold', /no negative/],
    ['abs(manifold)', /`abs` takes a difference/],
    ['stationPressure(sealPoint, elevation)', /takes an absolute pressure here/],
  ])('%s is refused', (source, message) => {
    expect(infer(source).problem).toMatch(message);
  });

  it('needs the air of the place for a conversion', () => {
    const parsed = parseExpression('absolute(x)');
    if (!parsed.ok) throw new Error(parsed.problem.message);
    const inferred = inferKind(parsed.expression, (name) => (name === 'x' ? declaredKind('kPa', 'gauge') : undefined));
    expect(inferred).toMatchObject({ ok: false, problem: { message: expect.stringContaining('stationPressure') } });
  });
});

describe('temperatures and their differences', () => {
  test.each([
    ['coolant - ambient < 5 degC', /write a difference in K/],
    ['coolant + ambient', /difference in K/],
    ['coolant + 5 degC', /difference in K/],
    ['2 * coolant', /not multiplied/],
    ['coolant / 2', /not multiplied/],
    ['-coolant', /no negative/],
    ['-(40 degC)', /no negative/],
    ['uncertainty(coolant) > coolant', /difference in K/],
  ])('%s is refused', (source, message) => {
    expect(infer(source).problem).toMatch(message);
  });
});

describe('what does not fit together', () => {
  test.each([
    ['manifold > 2', /write the number with its unit/],
    ['manifold + coolant', /their units measure different things/],
    ['flow > airFlow', /A mass flow and a volume flow cannot be compared/],
    ['loud > 3', /unit/],
    ['speed > 2000', /unit/],
    ['standardPressure(held)', /takes a distance here, not a time/],
    ['cold > 2 kPa', /not compared/],
    ['cold == seals', /not compared/],
    ['cold + 1', /cannot be calculated with/],
    ['abs(cold)', /cannot be given to abs/],
    ['manifold and cold', /`and` needs what holds/],
    ['not manifold', /`not` needs what holds/],
    ['not manifold > boost', /brackets around a comparison after not/],
    ['inBand(cold)', /write it alone/],
    ['unheardOf > 2 kPa', /`unheardOf` is not declared/],
    ['measured(unheardOf)', /`unheardOf` is not declared/],
  ])('%s is refused', (source, message) => {
    expect(infer(source).problem).toMatch(message);
  });

  it('points at the part that does not fit', () => {
    const source = 'cold and manifold - sealPoint > 1 kPa';
    const parsed = parseExpression(source);
    if (!parsed.ok) throw new Error(parsed.problem.message);
    const inferred = inferKind(parsed.expression, (name) => names[name]);
    if (inferred.ok) throw new Error('accepted');
    expect(source.slice(inferred.problem.start, inferred.problem.end)).toBe('manifold - sealPoint');
  });
});
