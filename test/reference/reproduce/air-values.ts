import {
  dryAirDensity,
  moistAirDensity,
  speedDensityAirflow,
  volumetricEfficiency,
} from '../../../procedures/calculations';
import { waterMoleFraction } from '../../../procedures/calculations/moist-air';
import { magnusDensity, oimlDensity, saturationKpa } from '../published-formulas';
import { type Given, type Reproduction } from './reproduction';

const engineOf = (given: Given) => ({
  displacementL: given('displacement_l'),
  rpm: given('engine_speed_rpm'),
  manifoldKpa: given('map_kpa'),
  intakeC: given('iat_c'),
});
const engineInputs = ['displacement_l', 'engine_speed_rpm', 'map_kpa', 'iat_c'];

/** Section d: density of air, speed-density air flow. */
export const airValues: readonly Reproduction[] = [
  {
    topic: 'd',
    inputs: ['pressure_abs_kpa', 'temperature_c'],
    give: (given) => ({
      density_kg_m3: dryAirDensity({ pressureKpa: given('pressure_abs_kpa'), temperatureC: given('temperature_c') }),
    }),
  },
  {
    topic: 'd',
    inputs: ['pressure_abs_kpa', 'temperature_c', 'relative_humidity_pct'],
    give: (given) => {
      const air = {
        pressureKpa: given('pressure_abs_kpa'),
        temperatureC: given('temperature_c'),
        relativeHumidity: given('relative_humidity_pct') / 100,
      };
      const state = [air.pressureKpa, air.temperatureC, air.relativeHumidity] as const;
      return {
        density_cipm2007_kg_m3: moistAirDensity(air),
        density_magnus_kg_m3: magnusDensity(...state),
        density_oiml_r111_kg_m3: oimlDensity(...state),
        density_dry_kg_m3: dryAirDensity(air),
        water_mole_fraction: waterMoleFraction(air),
      };
    },
  },
  {
    topic: 'd',
    inputs: [...engineInputs, 'volumetric_efficiency'],
    give: (given) => ({
      air_mass_flow_g_s: speedDensityAirflow({
        ...engineOf(given),
        volumetricEfficiency: given('volumetric_efficiency'),
      }),
    }),
  },
  {
    topic: 'd',
    inputs: [...engineInputs, 'maf_g_s'],
    give: (given) => ({
      volumetric_efficiency: volumetricEfficiency({ ...engineOf(given), airflowGps: given('maf_g_s') }),
    }),
  },
  {
    topic: 'd',
    inputs: ['x_h2o', 'm_air_g_mol', 'm_h2o_g_mol'],
    give: (given) => ({
      m_mix_g_mol: given('m_air_g_mol') * (1 - given('x_h2o')) + given('m_h2o_g_mol') * given('x_h2o'),
    }),
  },
  {
    topic: 'd',
    inputs: ['dewpoint_c', 'p_abs_kpa'],
    give: (given) => {
      const vapourKpa = saturationKpa(given('dewpoint_c'));
      return { p_h2o_kpa: vapourKpa, x_h2o: vapourKpa / given('p_abs_kpa') };
    },
  },
  {
    topic: 'd',
    inputs: ['relative_humidity_pct', 't_c', 'p_abs_kpa'],
    give: (given) => {
      const saturated = saturationKpa(given('t_c'));
      const x = ((given('relative_humidity_pct') / 100) * saturated) / given('p_abs_kpa');
      return { p_h2o_sat_kpa: saturated, x_h2o: x };
    },
  },
];
