import { convert, stationPressure } from '../../../procedures/calculations';
import { airportStationInHg, shortStationPressure, smithsonianStationHpa } from '../published-formulas';
import { type Reproduction, type Results } from './reproduction';

const footM = 0.3048;

/** Form A is the product's; the others are reproduced so that its distance from them can be seen. */
function formsOf(settingHpa: number, elevationM: number): Results {
  const settingInHg = convert(settingHpa, 'hPa', 'inHg');
  return {
    station_pa_A: stationPressure({ altimeterSettingKpa: settingHpa / 10, elevationM }) * 1000,
    station_pa_B: smithsonianStationHpa(settingHpa, elevationM) * 100,
    station_pa_C: shortStationPressure(settingHpa, elevationM) * 100,
    station_pa_D: convert(airportStationInHg(settingInHg, elevationM / footM), 'inHg', 'Pa'),
  };
}

/** Section b: station pressure from an altimeter setting. */
export const stationPressures: readonly Reproduction[] = [
  {
    topic: 'b',
    inputs: ['altimeter_setting_inhg', 'elevation_ft'],
    give: (given) => formsOf(convert(given('altimeter_setting_inhg'), 'inHg', 'hPa'), given('elevation_ft') * footM),
  },
  { topic: 'b', inputs: ['qnh_hpa', 'elevation_m'], give: (given) => formsOf(given('qnh_hpa'), given('elevation_m')) },
];
