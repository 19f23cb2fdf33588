import { allCheckValues, titleOf, type CheckValue } from './check-values';
import { compare } from './compare';
import { reproductions } from './reproduce/all';
import { reproduces, resultsOf } from './reproduce/reproduction';
import { refusedUnitsPa } from './reproduce/unit-values';
import { convert, isUnit } from '../../procedures/calculations';

const sections: Readonly<Record<string, string>> = {
  a: 'standard atmosphere',
  b: 'station pressure from an altimeter setting',
  c: 'units, gauge and absolute pressure, standard flows',
  d: 'density of air and speed-density air flow',
  e: 'leak rate from a pressure decay',
  f: 'flow through a hole',
  g: 'straight lines',
  h: 'change points',
  i: 'uncertainty and decisions',
  j: 'vehicle identification numbers',
  k: 'data and codes of the vehicle',
};
const reproductionsOf = (value: CheckValue) => reproductions.filter((candidate) => reproduces(candidate, value));

describe.each(Object.entries(sections))('%s: %s', (topic) => {
  const rows = allCheckValues.filter((value) => value.topic === topic);

  it.each(rows.map((value) => [titleOf(value), value] as const))('%s', (_title, value) => {
    const [reproduction] = reproductionsOf(value);
    if (reproduction === undefined) throw new Error('no way to reproduce it');
    const { compared, differences } = compare(value, resultsOf(reproduction, value));
    expect(differences).toEqual([]);
    expect(compared).toBeGreaterThan(0);
  });
});

describe('the check values', () => {
  it('all have a section, a source and exactly one way to be reproduced', () => {
    expect(allCheckValues).toHaveLength(222);
    expect([...new Set(allCheckValues.map(({ topic }) => topic))].sort()).toEqual(Object.keys(sections));
    expect(allCheckValues.filter(({ source, how }) => source.trim() === '' || how.trim() === '')).toEqual([]);
    const others = allCheckValues.filter((value) => reproductionsOf(value).length !== 1);
    expect(others.map(titleOf)).toEqual([]);
  });

  it('leave no way to reproduce one unused', () => {
    const unused = reproductions.filter((candidate) => !allCheckValues.some((value) => reproduces(candidate, value)));
    expect(unused.map(({ topic, inputs }) => `${topic}: ${inputs.join(', ')}`)).toEqual([]);
  });

  it('are compared whole: a missing, an extra and a changed result are each found', () => {
    const value: CheckValue = {
      topic: 'a',
      case: 'invented',
      inputs: {},
      expected: { a: 1, b: { c: [2, 3], d: 'x' }, e: null },
      tolerance: { rel: 0.01, keys: { c: 0.5 } },
      source: 'none',
      how: 'invented',
    };
    const good = { a: 1.009, b: { c: [2.5, 3], d: 'x' }, e: null };
    expect(compare(value, good)).toEqual({ compared: 5, differences: [] });
    expect(compare(value, { ...good, a: 1.02 }).differences).toEqual(['a is 1.02, expected 1']);
    expect(compare(value, { ...good, a: NaN }).differences).toEqual(['a is NaN, expected 1']);
    expect(compare(value, { ...good, b: { c: [2.6], d: 'y' } }).differences).toEqual([
      'b.c.0 is 2.6, expected 2',
      'b.c.1 is undefined, expected 3',
      'b.d is y, expected x',
    ]);
    expect(compare(value, { ...good, z: 1 }).differences).toEqual(['z is not expected']);
  });
});

describe('what the check values say of the product beside them', () => {
  it.each(allCheckValues.filter(({ topic }) => topic === 'b').map((value) => [titleOf(value), value] as const))(
    'stands within 0.1 kPa of every published form: %s',
    (_title, { expected, tolerance }) => {
      // Form A is what the product gives (above); the others differ from it in their constants.
      const allowed = tolerance.any_formula_abs ?? 0;
      const apart = Object.values(expected).map((form) => Math.abs(Number(form) - Number(expected['station_pa_A'])));
      expect(Math.max(...apart)).toBeLessThanOrEqual(allowed);
    },
  );

  it('refuses the units that are not the conventional ones, however close they are', () => {
    for (const name of Object.keys(refusedUnitsPa)) expect(isUnit(name)).toBe(false);
    // The inch of mercury of 60 degF is 0.28 % smaller (NIST SP 811 (2008) B.8).
    expect(1 - (refusedUnitsPa['inHg_60F'] ?? NaN) / convert(1, 'inHg', 'Pa')).toBeCloseTo(0.0028, 4);
  });
});
