import {
  convert,
  elevationOf,
  isUnit,
  standardPressure,
  stationPressure,
  toAbsolute,
} from '../../procedures/calculations';
import { allowance, checkValues, expectWithin, numberOf, type CheckValue } from './check-values';

describe('standard atmosphere', () => {
  it.each(checkValues('a', 'altitude_geometric_m'))('%s', (_title, value) => {
    expectWithin(value, 'pressure_pa', standardPressure(numberOf(value.inputs, 'altitude_geometric_m')) * 1000);
  });

  it.each(checkValues('a', 'altitude_geopotential_m'))('%s', (_title, value) => {
    const geopotentialM = numberOf(value.inputs, 'altitude_geopotential_m');
    const geometricM = (6_356_766 * geopotentialM) / (6_356_766 - geopotentialM);
    expectWithin(value, 'pressure_pa', standardPressure(geometricM) * 1000);
  });

  it.each(checkValues('a', 'pressure_pa'))('%s', (_title, value) => {
    expectWithin(value, 'altitude_geometric_m', elevationOf(numberOf(value.inputs, 'pressure_pa') / 1000));
  });
});

describe('station pressure from an altimeter setting', () => {
  const reportOf = ({ inputs }: CheckValue) =>
    'qnh_hpa' in inputs
      ? { altimeterSettingKpa: numberOf(inputs, 'qnh_hpa') / 10, elevationM: numberOf(inputs, 'elevation_m') }
      : {
          altimeterSettingKpa: convert(numberOf(inputs, 'altimeter_setting_inhg'), 'inHg', 'kPa'),
          elevationM: numberOf(inputs, 'elevation_ft') * 0.3048,
        };

  it.each(checkValues('b'))('%s', (_title, value) => {
    const stationPa = stationPressure(reportOf(value)) * 1000;
    expectWithin(value, 'station_pa_A', stationPa);
    // The other published forms differ in their constants; the value says by how much at most.
    const anyFormulaPa = value.tolerance.any_formula_abs ?? allowance(value, 'station_pa_A');
    for (const form of ['station_pa_B', 'station_pa_C', 'station_pa_D']) {
      expect(Math.abs(stationPa - numberOf(value.expected, form))).toBeLessThanOrEqual(anyFormulaPa);
    }
  });
});

describe('gauge and absolute pressure', () => {
  it.each(checkValues('c', 'gauge', 'baro'))('%s', (_title, value) => {
    const inKpa = (key: string) => {
      const unit = String(value.inputs[`${key}_unit`]);
      if (!isUnit(unit)) throw new Error(`${unit} is not in the table`);
      return convert(numberOf(value.inputs, key), unit, 'kPa');
    };
    expectWithin(value, 'absolute_kpa', toAbsolute(inKpa('gauge'), inKpa('baro')));
  });
});
