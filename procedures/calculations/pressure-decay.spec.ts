import * as fc from 'fast-check';
import { decayLeakRate } from './pressure-decay';

const test = { volumeL: 8, startKpa: 131.8, endKpa: 129.3, startC: 25, endC: 25, seconds: 60 };
const pressure = fc.double({ min: 0, max: 10_000, noNaN: true });
const temperature = fc.double({ min: -100, max: 1000, noNaN: true });

describe('decayLeakRate', () => {
  it('is V dp / dt when nothing changes its temperature', () => {
    // 8 L, 2.5 kPa in 60 s.
    expect(decayLeakRate({ ...test, referenceC: 25 }).paM3PerS).toBeCloseTo(1 / 3, 12);
  });

  it('is the loss of amount of substance n = p V / (R* T), whatever the states', () => {
    fc.assert(
      fc.property(pressure, pressure, temperature, temperature, (startKpa, endKpa, startC, endC) => {
        const gas = 8.314462618;
        const moles = (kpa: number, celsius: number) => (kpa * 8) / (gas * (celsius + 273.15));
        const lost = (moles(startKpa, startC) - moles(endKpa, endC)) / 60;
        const rate = decayLeakRate({ ...test, startKpa, endKpa, startC, endC });
        const scale = moles(startKpa, startC) + moles(endKpa, endC) + 1e-9;
        expect(Math.abs(rate.paM3PerS / (gas * 273.15) - lost)).toBeLessThan(1e-13 * scale);
      }),
    );
  });

  it('is exactly nothing between equal states, positive outwards and negative inwards', () => {
    expect(decayLeakRate({ ...test, endKpa: 131.8 })).toEqual({ paM3PerS: 0, standardCm3PerMin: 0 });
    expect(decayLeakRate(test).standardCm3PerMin).toBeGreaterThan(0);
    expect(decayLeakRate({ ...test, startKpa: 30, endKpa: 40 }).standardCm3PerMin).toBeLessThan(0);
  });

  it('refuses what no test has', () => {
    expect(() => decayLeakRate({ ...test, seconds: 0 })).toThrow('seconds is 0; allowed: 0.001 to 10000000');
    expect(() => decayLeakRate({ ...test, volumeL: 0 })).toThrow('volumeL is 0; allowed: 0.001 to 1000000');
    expect(() => decayLeakRate({ ...test, endC: -300 })).toThrow('endC is -300; allowed: -100 to 1000');
    expect(() => decayLeakRate({ ...test, startKpa: -2.5 })).toThrow('startKpa is -2.5; allowed: 0 to 10000');
    expect(() => decayLeakRate({ ...test, referenceKpa: 0 })).toThrow('referenceKpa is 0; allowed: 0.001 to 10000');
  });
});
