import * as fc from 'fast-check';
import { genericTroubleCodes } from './generic-trouble-codes';
import { decodeTroubleCode, describeTroubleCode } from './trouble-code';

const byte = fc.integer({ min: 0, max: 255 });

describe('decodeTroubleCode', () => {
  it('writes every pair of bytes as a code that leads back to them', () => {
    fc.assert(
      fc.property(byte, byte, (high, low) => {
        fc.pre(high + low > 0);
        const [system = '', first = '', ...rest] = decodeTroubleCode(high, low) ?? '';
        const bits = ('PCBU'.indexOf(system) << 14) + (Number(first) << 12) + parseInt(rest.join(''), 16);
        expect([bits >> 8, bits & 255]).toEqual([high, low]);
      }),
    );
  });

  it('takes 00 00 for filling', () => {
    expect(decodeTroubleCode(0, 0)).toBeUndefined();
  });

  it.each([-1, 256, 1.5, NaN])('refuses %d as a byte', (value) => {
    expect(() => decodeTroubleCode(value, 0)).toThrow(/high is .*; allowed: /);
    expect(() => decodeTroubleCode(0, value)).toThrow(RangeError);
  });
});

describe('describeTroubleCode', () => {
  it('knows the codes about air metering', () => {
    const codes = ['P0068', 'P0101', 'P0106', 'P0171', 'P0299', 'P2279'];
    expect(codes.filter((code) => describeTroubleCode(code) === undefined)).toEqual([]);
    expect(describeTroubleCode(' p0171 ')).toBe('System too lean (bank 1)');
  });

  it('keeps silent about what it does not know', () => {
    expect(['P1234', 'P3456', '', 'nonsense', 'P01'].map(describeTroubleCode)).toEqual(Array(5).fill(undefined));
  });

  it('lists well-formed generic codes alone, each once, in order', () => {
    const codes = [...genericTroubleCodes.keys()];
    expect(codes.filter((code) => !/^([PCB]0|P2|P34|U0)[0-9A-F]{2,3}$/.test(code))).toEqual([]);
    expect(codes).toEqual([...codes].sort());
  });
});
