import * as fc from 'fast-check';
import { decodePid } from './pid';
import { isUnit } from './units';

const oneByte = [0x04, 0x05, 0x06, 0x07, 0x08, 0x09, 0x0b, 0x0d, 0x0f, 0x11, 0x33];
const twoBytes = [0x0c, 0x10, 0x42];
const byte = fc.integer({ min: 0, max: 255 });

describe('decodePid', () => {
  it('gives finite values that rise with the bytes, in a unit of the table', () => {
    for (const pid of [...oneByte, ...twoBytes]) {
      const size = twoBytes.includes(pid) ? 2 : 1;
      let before = -Infinity;
      for (let raw = 0; raw < 256 ** size; raw++) {
        const found = decodePid(pid, Uint8Array.from(size === 2 ? [raw >> 8, raw & 255] : [raw]));
        if (!('value' in found)) throw new Error('no value');
        if (!(found.value > before && Number.isFinite(found.value) && isUnit(found.unit))) throw new Error(`${pid}`);
        before = found.value;
      }
      expect(before).toBeGreaterThan(0);
    }
  });

  it('reads the ends of the scales (SAE J1979 / ISO 15031-5)', () => {
    expect(decodePid(0x11, Uint8Array.of(255))).toEqual({ value: 100, unit: '%', name: 'Throttle position' });
    expect(decodePid(0x08, Uint8Array.of(0))).toMatchObject({ value: -100, unit: '%' });
    expect(decodePid(0x0f, Uint8Array.of(0))).toMatchObject({ value: -40, unit: 'degC' });
    expect(decodePid(0x0c, Uint8Array.of(255, 255))).toMatchObject({ value: 16_383.75, unit: 'rpm' });
    expect(decodePid(0x42, Uint8Array.of(255, 255))).toMatchObject({ value: 65.535, unit: 'V' });
  });

  it('lists a monitor exactly when it is supported, and is ready when none of them is incomplete', () => {
    fc.assert(
      fc.property(byte, byte, byte, byte, (a, b, c, d) => {
        const found = decodePid(0x01, Uint8Array.of(a, b, c, d));
        if (!('monitors' in found)) throw new Error('no monitors');
        const isCompression = (b & 8) !== 0;
        expect(found.ignition).toBe(isCompression ? 'compression' : 'spark');
        const bits = (number: number) => [...number.toString(2)].filter((bit) => bit === '1').length;
        // Bits 2 and 4 are reserved in the set of compression ignition.
        const used = isCompression ? 0b11101011 : 0xff;
        expect(Object.keys(found.monitors)).toHaveLength(bits(b & 7) + bits(c & used));
        const incomplete = bits(b & (b >> 4) & 7) + bits(c & d & used);
        expect(Object.values(found.monitors).filter((state) => state === 'incomplete')).toHaveLength(incomplete);
        expect(found).toMatchObject({ ready: incomplete === 0, mil: a > 127, codeCount: a % 128 });
      }),
      { numRuns: 2000 },
    );
  });

  it('refuses parameters it does not know and data of another length', () => {
    expect(() => decodePid(0x02, Uint8Array.of(0))).toThrow(/^pid is 2; allowed: 0x01, 0x04, .*0x42$/);
    expect(() => decodePid(NaN, Uint8Array.of(0))).toThrow('pid is NaN');
    expect(() => decodePid(0x0c, Uint8Array.of(1))).toThrow('bytes is 1 long; allowed: 2 bytes of data');
    expect(() => decodePid(0x0b, Uint8Array.of(0x41, 0x0b, 0x61))).toThrow('bytes is 3 long; allowed: 1 byte of data');
    expect(() => decodePid(0x01, Uint8Array.of())).toThrow('bytes is 0 long; allowed: 4 bytes of data');
    expect(() => decodePid(0x0b, [300] as unknown as Uint8Array)).toThrow('bytes[0] is 300; allowed: 0 to 255');
    expect(() => decodePid(0x0b, null as unknown as Uint8Array)).toThrow('bytes is null; allowed: 1 byte of data');
  });
});
