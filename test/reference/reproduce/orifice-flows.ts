import { dryAirDensity, orificeDiameter, orificeMassFlow } from '../../../procedures/calculations';
import { criticalPressureRatio, flowFunction } from '../../../procedures/calculations/orifice';
import { criticalVenturiCoefficient, pneumaticGps, venturiCoefficient } from '../published-formulas';
import { type Given, type Reproduction } from './reproduction';

const conditionsOf = (given: Given) => ({
  upstreamKpa: given('p1_abs_kpa'),
  downstreamKpa: given('p2_abs_kpa'),
  upstreamC: given('t1_c'),
  dischargeCoefficient: given('cd'),
});
const standardGramsPerL = dryAirDensity({ pressureKpa: 101.325, temperatureC: 0 });
/** The flow function of the product without a pipe before the hole is the regulation's with beta 0. */
const coefficientWithoutPipe = (gamma: number, ratio: number) => flowFunction(1, ratio, gamma);

/** Section f: compressible flow through a hole. */
export const orificeFlows: readonly Reproduction[] = [
  {
    topic: 'f',
    inputs: ['cd', 'diameter_mm', 'p1_abs_kpa', 't1_c', 'p2_abs_kpa'],
    give: (given) => {
      const { gps, choked } = orificeMassFlow({ ...conditionsOf(given), diameterMm: given('diameter_mm') });
      return {
        regime: choked ? 'choked' : 'subsonic',
        pressure_ratio: given('p2_abs_kpa') / given('p1_abs_kpa'),
        mass_flow_g_s: gps,
        slpm_0C_101325: (gps / standardGramsPerL) * 60,
      };
    },
  },
  {
    topic: 'f',
    inputs: ['flow_slpm_0C_101325', 'cd', 'p1_abs_kpa', 't1_c', 'p2_abs_kpa'],
    give: (given) => {
      const flowGps = (given('flow_slpm_0C_101325') * standardGramsPerL) / 60;
      const diameterMm = orificeDiameter({ ...conditionsOf(given), flowGps });
      return { diameter_mm: diameterMm, area_mm2: (Math.PI / 4) * diameterMm ** 2 };
    },
  },
  {
    topic: 'f',
    inputs: ['C_dm3_s_bar', 'b', 'p1_abs_kpa', 't1_c', 'p2_abs_kpa'],
    give: (given) => {
      const state = [given('p1_abs_kpa'), given('t1_c'), given('p2_abs_kpa')] as const;
      const gps = pneumaticGps(given('C_dm3_s_bar'), given('b'), ...state);
      return { mass_flow_g_s: gps, anr_l_min: (gps / 1.185) * 60 };
    },
  },
  {
    topic: 'f',
    inputs: ['gamma'],
    give: (given) => ({
      critical_pressure_ratio: criticalPressureRatio(given('gamma')),
      choked_flow_function: flowFunction(1, 0, given('gamma')),
    }),
  },
  {
    topic: 'f',
    inputs: ['gamma', 'beta', 'regime'],
    give: (given) => ({
      flow_coefficient:
        given('beta') === 0
          ? flowFunction(1, 0, given('gamma'))
          : criticalVenturiCoefficient(given('gamma'), given('beta')),
    }),
  },
  {
    topic: 'f',
    inputs: ['gamma', 'beta', 'p_in_kpa', 'dp_kpa'],
    give: (given) => {
      const ratio = 1 - given('dp_kpa') / given('p_in_kpa');
      // The pipe's term, on top of what the product has without one.
      const [gamma, beta] = [given('gamma'), given('beta')];
      const withPipe = venturiCoefficient(gamma, beta, ratio) / venturiCoefficient(gamma, 0, ratio);
      return { flow_coefficient: coefficientWithoutPipe(gamma, ratio) * withPipe };
    },
  },
  {
    topic: 'f',
    inputs: ['cd', 'flow_coefficient', 'throat_area_m2', 'p_in_pa', 'molar_mass_kg_mol', 't_in_k', 'R'],
    give: (given) => ({ molar_flow_mol_s: venturiMolarFlow(given) }),
  },
  {
    topic: 'f',
    inputs: [
      'cd',
      'flow_coefficient',
      'throat_area_m2',
      'p_in_pa',
      'molar_mass_kg_mol',
      't_in_k',
      't_std_k',
      'p_std_pa',
      'R',
    ],
    give: (given) => ({
      standard_volume_flow_m3_s: (venturiMolarFlow(given) * given('R') * given('t_std_k')) / given('p_std_pa'),
    }),
  },
  {
    topic: 'f',
    inputs: ['gamma', 'mach'],
    give: (given) => {
      const [gamma, mach] = [given('gamma'), given('mach')];
      const temperatureRatio = 1 / (1 + ((gamma - 1) / 2) * mach ** 2);
      const pressureRatio = temperatureRatio ** (gamma / (gamma - 1));
      return {
        p_over_pt: pressureRatio,
        t_over_tt: temperatureRatio,
        // The narrowest place takes the choked flow; here the same flow needs this much more area.
        area_ratio: flowFunction(1, 0, gamma) / flowFunction(1, pressureRatio, gamma),
      };
    },
  },
];

/** 40 CFR 1065.640: n = Cd Cf At p / sqrt(M R T), with a compressibility of 1. */
function venturiMolarFlow(given: Given): number {
  const driven = given('cd') * given('flow_coefficient') * given('throat_area_m2') * given('p_in_pa');
  return driven / Math.sqrt(given('molar_mass_kg_mol') * given('R') * given('t_in_k'));
}
