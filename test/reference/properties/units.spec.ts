import * as fc from 'fast-check';
import { unit as mathUnit } from 'mathjs';
import { convert, convertDifference, isUnit, unitKind, units, type UnitName } from '../../../procedures/calculations';
import { expectClose, readings, thousands } from './runs';

const names = Object.keys(units).filter(isUnit);

/** The table's units as mathjs writes them. It has no inHg and inH2O, and no decibel, rpm or percent as a unit. */
const inMathjs: Readonly<Partial<Record<UnitName, string>>> = {
  kPa: 'kPa',
  Pa: 'Pa',
  hPa: 'hPa',
  bar: 'bar',
  psi: 'psi',
  mmHg: 'mmHg',
  degC: 'degC',
  degF: 'degF',
  K: 'K',
  'L/min': 'L/minute',
  'ft3/min': 'ft^3/minute',
  'm3/s': 'm^3/s',
  'g/s': 'g/s',
  'kg/h': 'kg/hour',
  'lb/min': 'lb/minute',
  L: 'L',
  cm3: 'cm^3',
  mm: 'mm',
  m: 'm',
  km: 'km',
  mi: 'mi',
  Nm: 'N m',
  'lbf.ft': 'lbf ft',
  V: 'V',
  mV: 'mV',
  ohm: 'ohm',
  kohm: 'kohm',
  s: 's',
  min: 'minute',
  h: 'hour',
  'km/h': 'km/hour',
  mph: 'mi/hour',
};

/** Where mathjs is not exact: its own figure over the definition of NIST SP 811 (2008) B.8, less 1. */
const inexactInMathjs: Readonly<Partial<Record<UnitName, number>>> = {
  psi: 6894.75729276459 / 6894.757293168361 - 1,
  // The pound-force is exact in mathjs; the millimetre of mercury has six figures.
  mmHg: 133.322 / 133.322387415 - 1,
};

const exactPairs = names.flatMap((from) =>
  names
    .filter((to) => unitKind(from) === unitKind(to))
    .filter((to) => [from, to].every((name) => name in inMathjs && !(name in inexactInMathjs)))
    .map((to) => [from, to] as const),
);
const possible = (name: UnitName, value: number) => (name === 'K' ? Math.abs(value) : value);

describe('units against mathjs', () => {
  it('agree for every pair that mathjs has exactly', () => {
    expect(exactPairs.length).toBeGreaterThan(50);
    fc.assert(
      fc.property(fc.constantFrom(...exactPairs), readings(-250, 1e6), ([from, to], drawn) => {
        const value = possible(from, drawn);
        expectClose(convert(value, from, to), mathUnit(value, inMathjs[from]!).toNumber(inMathjs[to]!), 1e-12);
      }),
      thousands,
    );
  });

  it.each(Object.entries(inexactInMathjs))('differ for %s by just what mathjs lacks, %d', (name, lack) => {
    if (!isUnit(name)) throw new Error(`${name} is no unit`);
    const mathjsPa = mathUnit(1, inMathjs[name]!).toNumber('Pa');
    expect(Math.abs(mathjsPa / convert(1, name, 'Pa') - 1 - lack)).toBeLessThan(1e-13);
    expect(Math.abs(lack)).toBeGreaterThan(1e-11);
  });

  it('leave out only what mathjs does not have', () => {
    expect(names.filter((name) => !(name in inMathjs))).toEqual(['1', 'inHg', 'inH2O', '%', 'rpm', 'dB']);
    expect(() => mathUnit(1, 'inHg')).toThrow();
    expect(() => mathUnit(1, 'inH2O')).toThrow();
  });
});

describe('units there and back', () => {
  const pairs = names.flatMap((from) =>
    names.filter((to) => unitKind(from) === unitKind(to)).map((to) => [from, to] as const),
  );

  it.each(pairs)('%s to %s comes back to 1e-9', (from, to) => {
    fc.assert(
      fc.property(readings(-250, 1e6), (drawn) => {
        const value = possible(from, drawn);
        expectClose(convert(convert(value, from, to), to, from), value, 1e-9);
        expectClose(convertDifference(convertDifference(drawn, from, to), to, from), drawn, 1e-9);
      }),
      { numRuns: 500 },
    );
  });

  it('go the same way over a third unit', () => {
    const threes = pairs.flatMap(([from, to]) =>
      names.filter((by) => unitKind(by) === unitKind(from)).map((by) => [from, by, to] as const),
    );
    fc.assert(
      fc.property(fc.constantFrom(...threes), readings(-250, 1e6), ([from, by, to], drawn) => {
        const value = possible(from, drawn);
        expectClose(convert(convert(value, from, by), by, to), convert(value, from, to), 1e-9);
      }),
      thousands,
    );
  });
});
