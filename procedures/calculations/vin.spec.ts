import * as fc from 'fast-check';
import { checkVin, modelYear, vinCheckDigit } from './vin';

const allowed = 'ABCDEFGHJKLMNPRSTUVWXYZ0123456789';
const vinCharacters = fc.string({ unit: fc.constantFrom(...allowed), minLength: 17, maxLength: 17 });
const withRightDigit = (vin: string) => vin.slice(0, 8) + vinCheckDigit(vin) + vin.slice(9);

describe('vinCheckDigit', () => {
  it('does not depend on what stands in its own place', () => {
    fc.assert(
      fc.property(vinCharacters, fc.constantFrom(...allowed), (vin, character) => {
        expect(vinCheckDigit(vin.slice(0, 8) + character + vin.slice(9))).toBe(vinCheckDigit(vin));
      }),
    );
  });

  it('sees every single digit that is misread as another digit', () => {
    fc.assert(
      fc.property(vinCharacters, fc.nat(16), fc.nat(9), fc.nat(9), (drawn, index, digit, other) => {
        fc.pre(index !== 8 && digit !== other);
        const vin = drawn.slice(0, index) + digit + drawn.slice(index + 1);
        const misread = drawn.slice(0, index) + other + drawn.slice(index + 1);
        expect(vinCheckDigit(misread)).not.toBe(vinCheckDigit(vin));
      }),
    );
  });

  it.each(['', '1ZZBT4CK4LR20481', '1ZZBT4CK4LR2048171', '1zzbt4ck4lr204817', '1ZZBT4CK4LR20481O'])(
    'refuses %p',
    (vin) => {
      expect(() => vinCheckDigit(vin)).toThrow(RangeError);
    },
  );
});

describe('checkVin', () => {
  it('takes a right check digit and names a wrong one', () => {
    fc.assert(
      fc.property(vinCharacters, fc.constantFrom(...allowed), (drawn, character) => {
        const vin = withRightDigit(drawn);
        expect(checkVin(vin).problems).not.toContain('check-digit');
        fc.pre(character !== vin.charAt(8));
        expect(checkVin(vin.slice(0, 8) + character + vin.slice(9)).problems).toContain('check-digit');
      }),
    );
  });

  it('names both problems when the check digit and the year code are wrong', () => {
    expect(checkVin('1ZZBT4CK4UR204817')).toEqual({ valid: false, problems: ['check-digit', 'year-code'] });
  });

  it('never throws, whatever is typed', () => {
    fc.assert(
      fc.property(fc.string(), (text) => {
        const { valid, problems } = checkVin(text);
        expect(valid).toBe(problems.length === 0);
      }),
    );
  });
});

describe('modelYear', () => {
  it('tells the cycle by position 7', () => {
    expect(modelYear('1ZZBT4CK4LR204817', { notAfter: 2039 })).toBe(2020);
    expect(modelYear('1ZZBT44K4LR204817', { notAfter: 2039 })).toBe(1990);
  });

  it('gives no year that lies after the bound, and none for a code that is none', () => {
    expect(modelYear('1ZZBT4CK4LR204817', { notAfter: 2019 })).toBeUndefined();
    expect(modelYear('7ZZAK1XN6U9126685', { notAfter: 2039 })).toBeUndefined();
  });

  it('refuses a number of the wrong length and a bound that is no year', () => {
    expect(() => modelYear('1ZZ', { notAfter: 2030 })).toThrow(RangeError);
    expect(() => modelYear('1ZZBT4CK4LR204817', { notAfter: NaN })).toThrow('notAfter is NaN');
    expect(() => modelYear('1ZZBT4CK4LR204817', { notAfter: 2020.5 })).toThrow(RangeError);
  });
});
