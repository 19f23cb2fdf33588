import * as fc from 'fast-check';
import { dryAirDensity } from './dry-air';
import { moistAirDensity, waterMoleFraction } from './moist-air';

const humidity = fc.double({ min: 0, max: 1, noNaN: true });
const pressure = fc.double({ min: 30, max: 300, noNaN: true });
const temperature = fc.double({ min: -20, max: 60, noNaN: true });

/** Density of the ideal mixture with the saturation pressure of WMO-No. 8 (Magnus form, over water). */
function idealMixture(pressureKpa: number, temperatureC: number, relativeHumidity: number): number {
  const vapourKpa = relativeHumidity * 0.6112 * Math.exp((17.62 * temperatureC) / (243.12 + temperatureC));
  const kelvin = temperatureC + 273.15;
  return (
    ((pressureKpa - vapourKpa) * 1000) / (287.05287 * kelvin) +
    (vapourKpa * 1000 * 18.01528e-3) / (8.314462618 * kelvin)
  );
}

describe('moistAirDensity', () => {
  it('stays within 0.3 % of the ideal mixture where the doc comment says so', () => {
    fc.assert(
      fc.property(pressure, temperature, humidity, (pressureKpa, temperatureC, relativeHumidity) => {
        const ideal = idealMixture(pressureKpa, temperatureC, relativeHumidity);
        const density = moistAirDensity({ pressureKpa, temperatureC, relativeHumidity });
        expect(Math.abs(density / ideal - 1)).toBeLessThan(0.003);
      }),
      { numRuns: 2000 },
    );
  });

  it('falls as the humidity rises, since water is lighter than air', () => {
    fc.assert(
      fc.property(pressure, temperature, (pressureKpa, temperatureC) => {
        const at = (relativeHumidity: number) => moistAirDensity({ pressureKpa, temperatureC, relativeHumidity });
        expect(at(1)).toBeLessThan(at(0.5));
        expect(at(0.5)).toBeLessThan(at(0));
      }),
    );
  });

  it('lies 0.04 % above the ideal dry gas at no humidity', () => {
    const dry = moistAirDensity({ pressureKpa: 101.325, temperatureC: 20, relativeHumidity: 0 });
    expect(dry / dryAirDensity({ pressureKpa: 101.325, temperatureC: 20 }) - 1).toBeCloseTo(0.000375, 5);
  });

  it('refuses a percentage for a fraction, and more vapour than there is air', () => {
    const air = { pressureKpa: 101.325, temperatureC: 20, relativeHumidity: 50 };
    expect(() => moistAirDensity(air)).toThrow('relativeHumidity is 50; allowed: 0 to 1');
    expect(() => moistAirDensity({ pressureKpa: 50, temperatureC: 95, relativeHumidity: 1 })).toThrow(
      /^relativeHumidity is 1; allowed: 0 to 0\.58/,
    );
    expect(() => moistAirDensity({ ...air, pressureKpa: -1 })).toThrow('pressureKpa is -1; allowed: 10 to 1000');
    expect(() => moistAirDensity({ ...air, temperatureC: 140 })).toThrow('temperatureC is 140; allowed: -40 to 100');
  });
});

describe('waterMoleFraction', () => {
  it('is 1 at most, where saturated vapour is all there is', () => {
    const air = { pressureKpa: 50, temperatureC: 95 };
    const [, most = ''] = /0 to (\S+)$/.exec(messageOf(() => waterMoleFraction({ ...air, relativeHumidity: 1 }))) ?? [];
    expect(waterMoleFraction({ ...air, relativeHumidity: Number(most) })).toBeCloseTo(1, 12);
  });
});

function messageOf(call: () => unknown): string {
  try {
    call();
  } catch (error) {
    if (error instanceof RangeError) return error.message;
    throw error;
  }
  throw new Error('nothing was thrown');
}
