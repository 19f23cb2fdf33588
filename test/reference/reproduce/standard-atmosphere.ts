import { dryAirDensity, elevationOf, standardPressure } from '../../../procedures/calculations';
import { type Reproduction } from './reproduction';

// ISO 2533:1975.
const earthRadiusM = 6_356_766;
const gravity = 9.80665;
const gasConstant = 287.05287;
const geometricOf = (geopotentialM: number) => (earthRadiusM * geopotentialM) / (earthRadiusM - geopotentialM);
const geopotentialOf = (geometricM: number) => (earthRadiusM * geometricM) / (earthRadiusM + geometricM);

/** Temperature from the pressures 5 m above and below, by the hydrostatic law dp/dH = -p g0 / (R T). */
function kelvinFromPressure(geopotentialM: number): number {
  const at = (metres: number) => standardPressure(geometricOf(metres));
  const logSlope = Math.log(at(geopotentialM + 5) / at(geopotentialM - 5)) / 10;
  return -gravity / (gasConstant * logSlope);
}

function stateAt(geopotentialM: number) {
  const pressureKpa = standardPressure(geometricOf(geopotentialM));
  const kelvin = kelvinFromPressure(geopotentialM);
  return {
    pressure_pa: pressureKpa * 1000,
    temperature_k: kelvin,
    density_kg_m3: dryAirDensity({ pressureKpa, temperatureC: kelvin - 273.15 }),
  };
}

/** Section a: the standard atmosphere. */
export const standardAtmosphere: readonly Reproduction[] = [
  {
    topic: 'a',
    inputs: ['altitude_geometric_m', 'altitude_geometric_ft?'],
    give: (given) => stateAt(geopotentialOf(given('altitude_geometric_m'))),
  },
  { topic: 'a', inputs: ['altitude_geopotential_m'], give: (given) => stateAt(given('altitude_geopotential_m')) },
  {
    topic: 'a',
    inputs: ['pressure_pa'],
    give: (given) => {
      const geometricM = elevationOf(given('pressure_pa') / 1000);
      return { altitude_geometric_m: geometricM, altitude_geopotential_m: geopotentialOf(geometricM) };
    },
  },
];
