import * as fc from 'fast-check';
import { dryAirDensity } from './dry-air';

const pressure = fc.double({ min: 0.001, max: 10_000, noNaN: true });
const temperature = fc.double({ min: -100, max: 1000, noNaN: true });

describe('dryAirDensity', () => {
  it('is the sea-level density of the standard atmosphere (ISO 2533:1975, 1.225 kg/m3)', () => {
    expect(dryAirDensity({ pressureKpa: 101.325, temperatureC: 15 })).toBeCloseTo(1.225, 6);
  });

  it('agrees with the molar form p M / (R* T), constants of the U.S. Standard Atmosphere 1976', () => {
    fc.assert(
      fc.property(pressure, temperature, (pressureKpa, temperatureC) => {
        const molar = (pressureKpa * 28.9644) / (8.31432 * (temperatureC + 273.15));
        expect(Math.abs(dryAirDensity({ pressureKpa, temperatureC }) / molar - 1)).toBeLessThan(2e-6);
      }),
    );
  });

  it('refuses what no air has', () => {
    expect(() => dryAirDensity({ pressureKpa: 0, temperatureC: 20 })).toThrow(
      'pressureKpa is 0; allowed: 0.001 to 10000',
    );
    expect(() => dryAirDensity({ pressureKpa: 100, temperatureC: -274 })).toThrow(
      'temperatureC is -274; allowed: -100 to 1000',
    );
    expect(() => dryAirDensity({ pressureKpa: NaN, temperatureC: 20 })).toThrow(RangeError);
  });
});
