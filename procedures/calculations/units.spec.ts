import * as fc from 'fast-check';
import {
  convert,
  convertDifference,
  differenceFromBase,
  differenceToBase,
  fromBase,
  isUnit,
  toBase,
  unitKind,
  units,
  type UnitName,
} from './units';

const names = Object.keys(units).filter(isUnit);
const unitName = fc.constantFrom(...names);
const pairOfOneKind = unitName.chain((from) =>
  fc.constantFrom(...names.filter((name) => unitKind(name) === unitKind(from))).map((to) => [from, to] as const),
);
const reading = fc.double({ min: -250, max: 1e6, noNaN: true });
/** -250 is possible in every unit but kelvin. */
const possibleIn = (name: UnitName, value: number) => (name === 'K' ? Math.abs(value) : value);

describe('convert', () => {
  it.each([
    [5, 'psi', 'kPa', 34.47378646584],
    [1, 'inHg', 'Pa', 3386.388640341],
    [1, 'inH2O', 'Pa', 249.08891],
    [1, 'mmHg', 'Pa', 133.322387415],
    [212, 'degF', 'degC', 100],
    [-40, 'degF', 'degC', -40],
    [1, 'ft3/min', 'L/min', 28.316846592],
    [1, 'lb/min', 'g/s', 7.55987283333],
    [1, 'kg/h', 'g/s', 0.27777777778],
    [1, 'mi', 'km', 1.609344],
    [1, 'lbf.ft', 'Nm', 1.3558179483314],
    [1, 'mph', 'km/h', 1.609344],
    [50, '%', '1', 0.5],
  ] as const)('gives %d %s in %s as NIST SP 811 (2008) Appendix B.8 and B.9 have it', (value, from, to, expected) => {
    expect(Math.abs(convert(value, from, to) - expected)).toBeLessThanOrEqual(1e-10 * Math.abs(expected));
  });

  it('comes back to the value it started from, for every pair of units of one kind', () => {
    fc.assert(
      fc.property(pairOfOneKind, reading, ([from, to], drawn) => {
        const value = possibleIn(from, drawn);
        const there = convert(value, from, to);
        expect(Math.abs(convert(there, to, from) - value)).toBeLessThanOrEqual(1e-9 * Math.max(1, Math.abs(value)));
      }),
    );
  });

  it('refuses units of different kinds, naming both', () => {
    fc.assert(
      fc.property(unitName, unitName, (from, to) => {
        fc.pre(unitKind(from) !== unitKind(to));
        expect(() => convert(1, from, to)).toThrow(RangeError);
      }),
    );
    expect(() => convert(1, 'kPa', 'degC')).toThrow('to is degC (temperature); allowed: a unit of pressure, as kPa is');
  });

  it('refuses numbers that are none, names outside the table and temperatures below absolute zero', () => {
    expect(() => convert(NaN, 'kPa', 'kPa')).toThrow('value in kPa is NaN; allowed: a finite number');
    expect(() => convert(Infinity, 'kPa', 'psi')).toThrow(RangeError);
    expect(() => convert(-274, 'degC', 'K')).toThrow('value in degC is -274; allowed: -273.15 or more');
    expect(() => convert(-1, 'K', 'K')).toThrow(RangeError);
    expect(() => convert(1, 'toString' as UnitName, 'kPa')).toThrow(RangeError);
    expect(() => convert(1e305, 'bar', 'Pa')).toThrow(RangeError);
  });
});

describe('convertDifference', () => {
  it('leaves out the offset of a temperature scale', () => {
    expect(convertDifference(1, 'K', 'degF')).toBeCloseTo(1.8, 12);
    expect(convertDifference(9, 'degF', 'degC')).toBeCloseTo(5, 12);
    expect(convertDifference(-300, 'degC', 'K')).toBe(-300);
  });

  it('is the difference of two converted values', () => {
    fc.assert(
      fc.property(pairOfOneKind, reading, reading, ([from, to], ...drawn) => {
        const [first = 0, second = 0] = drawn.map((value) => possibleIn(from, value));
        const expected = convert(first, from, to) - convert(second, from, to);
        const scale =
          Math.abs(convert(first, from, to)) + Math.abs(convert(second, from, to)) + Math.abs(expected) + 1e-9;
        // 459.67 enters both values of a temperature, so its rounding is part of the bound.
        expect(Math.abs(convertDifference(first - second, from, to) - expected)).toBeLessThanOrEqual(
          1e-12 * (scale + 1000),
        );
      }),
    );
  });

  it('refuses what is no number and mismatched kinds', () => {
    expect(() => convertDifference(NaN, 'kPa', 'psi')).toThrow(RangeError);
    expect(() => convertDifference(1, 'kPa', 's')).toThrow(RangeError);
  });
});

describe('the base unit', () => {
  it('is reached and left again without loss', () => {
    fc.assert(
      fc.property(unitName, reading, (name, drawn) => {
        const value = possibleIn(name, drawn);
        const tolerance = 1e-9 * Math.max(1, Math.abs(value));
        expect(Math.abs(fromBase(toBase(value, name), name) - value)).toBeLessThanOrEqual(tolerance);
        expect(Math.abs(differenceFromBase(differenceToBase(value, name), name) - value)).toBeLessThanOrEqual(
          tolerance,
        );
      }),
    );
  });

  it('is one per kind', () => {
    const baseOfKind = new Map<string, string>();
    for (const name of names) {
      const { kind, base } = units[name];
      expect(baseOfKind.get(kind) ?? base).toBe(base);
      baseOfKind.set(kind, base);
    }
    expect(baseOfKind.get('pressure')).toBe('Pa');
  });
});

describe('isUnit', () => {
  it('knows the table and nothing that every object carries', () => {
    expect(isUnit('lbf.ft')).toBe(true);
    expect(['', 'kpa', 'constructor', 'hasOwnProperty'].filter(isUnit)).toEqual([]);
  });
});
