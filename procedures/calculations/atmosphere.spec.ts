import * as fc from 'fast-check';
import {
  elevationOf,
  standardPressure,
  stationPressure,
  stationUncertainty,
  toAbsolute,
  toGauge,
  type StationPressureSource,
} from './atmosphere';

const elevation = fc.double({ min: -1000, max: 11_000, noNaN: true });

describe('standardPressure', () => {
  it('is 101.325 kPa at sea level and falls with the elevation', () => {
    expect(standardPressure(0)).toBe(101.325);
    fc.assert(
      fc.property(elevation, elevation, (first, second) => {
        fc.pre(second - first > 1e-6);
        expect(standardPressure(second)).toBeLessThan(standardPressure(first));
      }),
    );
  });

  it('follows the hydrostatic law dp/dZ = -rho g, integrated step by step', () => {
    // dp/dH = -p g0 / (R T(H)) by the midpoint rule, over geopotential metres; nothing of the closed form is in it.
    let pressureKpa = 101.325;
    const stepM = 0.5;
    for (let geopotentialM = 0; geopotentialM < 2000; geopotentialM += stepM) {
      const slope = (p: number, h: number) => (-p * 9.80665) / (287.05287 * (288.15 - 0.0065 * h));
      const middle = pressureKpa + (slope(pressureKpa, geopotentialM) * stepM) / 2;
      pressureKpa += slope(middle, geopotentialM + stepM / 2) * stepM;
    }
    const geometricM = (6_356_766 * 2000) / (6_356_766 - 2000);
    expect(Math.abs(standardPressure(geometricM) - pressureKpa)).toBeLessThan(1e-7);
  });

  it.each([-1001, 11_001, NaN, Infinity])('refuses an elevation of %d m', (elevationM) => {
    expect(() => standardPressure(elevationM)).toThrow(`elevationM is ${elevationM}; allowed: -1000 to 11000`);
  });
});

describe('elevationOf', () => {
  it('undoes standardPressure', () => {
    fc.assert(
      fc.property(elevation, (elevationM) => {
        expect(Math.abs(elevationOf(standardPressure(elevationM)) - elevationM)).toBeLessThan(1e-7);
      }),
    );
  });

  it.each([0, -5, 22, 115, NaN])('refuses %d kPa', (pressureKpa) => {
    expect(() => elevationOf(pressureKpa)).toThrow(RangeError);
  });
});

describe('stationPressure', () => {
  it('is the setting itself at sea level', () => {
    fc.assert(
      fc.property(fc.double({ min: 85, max: 110, noNaN: true }), (altimeterSettingKpa) => {
        const station = stationPressure({ altimeterSettingKpa, elevationM: 0 });
        expect(Math.abs(station - altimeterSettingKpa)).toBeLessThan(1e-9 * altimeterSettingKpa);
      }),
    );
  });

  it('is the standard pressure under the standard setting, geopotential apart', () => {
    const station = stationPressure({ altimeterSettingKpa: 101.325, elevationM: 640 });
    expect(Math.abs(station - standardPressure(640))).toBeLessThan(0.001);
  });

  it('refuses a setting in another unit and an elevation off the map', () => {
    expect(() => stationPressure({ altimeterSettingKpa: 29.92, elevationM: 0 })).toThrow(
      'altimeterSettingKpa is 29.92',
    );
    expect(() => stationPressure({ altimeterSettingKpa: 1013, elevationM: 0 })).toThrow(RangeError);
    expect(() => stationPressure({ altimeterSettingKpa: 101, elevationM: NaN })).toThrow('elevationM is NaN');
  });
});

describe('stationUncertainty', () => {
  it('is 2 kPa from the elevation alone and 0.3 kPa from a setting', () => {
    expect(stationUncertainty('elevation')).toBe(2);
    expect(stationUncertainty('altimeter-setting')).toBe(0.3);
    expect(() => stationUncertainty('guess' as StationPressureSource)).toThrow(RangeError);
  });
});

describe('toAbsolute and toGauge', () => {
  it('undo each other', () => {
    const station = fc.double({ min: 20, max: 115, noNaN: true });
    const absolute = fc.double({ min: 0, max: 2000, noNaN: true });
    fc.assert(
      fc.property(absolute, station, (absoluteKpa, stationKpa) => {
        expect(Math.abs(toAbsolute(toGauge(absoluteKpa, stationKpa), stationKpa) - absoluteKpa)).toBeLessThan(1e-9);
      }),
    );
  });

  it('refuse less than a vacuum and a place without air', () => {
    expect(() => toAbsolute(-98, 97.35)).toThrow('gaugeKpa is -98; allowed: -97.35 to 10000');
    expect(() => toGauge(-0.1, 97.35)).toThrow(RangeError);
    expect(() => toAbsolute(1, 0)).toThrow('stationKpa is 0; allowed: above 0 to 10000');
    expect(() => toGauge(NaN, 97)).toThrow(RangeError);
  });
});
