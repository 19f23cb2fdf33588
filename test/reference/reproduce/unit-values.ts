import { convert, dryAirDensity, isUnit, toAbsolute, type UnitName } from '../../../procedures/calculations';
import { type CheckValue } from '../check-values';
import { type Reproduction } from './reproduction';

/**
 * Units that the product refuses, in pascals, so that nobody takes them for the conventional ones: by definition, and
 * those of a temperature as NIST SP 811 (2008) B.8 prints them.
 */
export const refusedUnitsPa: Readonly<Record<string, number>> = {
  Torr: 101_325 / 760,
  'kgf/cm2': 9.80665 / 1e-4,
  inHg_60F: 3.37685e3,
  inHg_32F: 3.38638e3,
  'inH2O_39.2F': 2.49082e2,
  inH2O_60F: 2.4884e2,
};

const unitsOf = ({ inputs }: CheckValue) => [String(inputs['from']), String(inputs['to'])] as const;

function unitNamed(name: unknown): UnitName {
  const text = String(name);
  if (!isUnit(text)) throw new Error(`${text} is no unit of the product`);
  return text;
}

/** The states that a standard volume refers to. */
const references: Readonly<Record<string, { pressureKpa: number; temperatureC: number }>> = {
  '0C_101.325kPa': { pressureKpa: 101.325, temperatureC: 0 },
  '20C_101.325kPa': { pressureKpa: 101.325, temperatureC: 20 },
  '60F_101.325kPa': { pressureKpa: 101.325, temperatureC: convert(60, 'degF', 'degC') },
  '70F_14.7psia': { pressureKpa: convert(14.7, 'psi', 'kPa'), temperatureC: convert(70, 'degF', 'degC') },
  ISO8778_20C_100kPa: { pressureKpa: 100, temperatureC: 20 },
};

function densityAt(reference: unknown): number {
  const state = references[String(reference)];
  if (state === undefined) throw new Error(`${String(reference)} is no reference`);
  return dryAirDensity(state);
}

const litresPerMinute = (massGps: number, reference: string): number =>
  convert(massGps / 1000 / densityAt(reference), 'm3/s', 'L/min');

const standardUnits: Readonly<Record<string, UnitName>> = { scfm: 'ft3/min', slpm: 'L/min' };

/** Section c: units, gauge and absolute pressure, standard flows. */
export const unitValues: readonly Reproduction[] = [
  {
    topic: 'c',
    inputs: ['value', 'from', 'to'],
    only: (value) => unitsOf(value).every(isUnit),
    give: (given, value) => {
      const [from, to] = unitsOf(value).map(unitNamed);
      return { value: convert(given('value'), from!, to!) };
    },
  },
  {
    topic: 'c',
    inputs: ['value', 'from', 'to'],
    only: (value) => !unitsOf(value).every(isUnit),
    give: (given, value) => {
      const [from, to] = unitsOf(value);
      return { value: convert(given('value') * refusedUnitsPa[from]!, 'Pa', unitNamed(to)) };
    },
  },
  {
    topic: 'c',
    inputs: ['gauge', 'gauge_unit', 'baro', 'baro_unit'],
    give: (given, { inputs }) => {
      const inKpa = (name: string) => convert(given(name), unitNamed(inputs[`${name}_unit`]), 'kPa');
      return { absolute_kpa: toAbsolute(inKpa('gauge'), inKpa('baro')) };
    },
  },
  {
    topic: 'c',
    inputs: ['value', 'unit', 'reference'],
    give: (given, { inputs, expected }) => {
      const volumeM3PerS = convert(given('value'), standardUnits[String(inputs['unit'])]!, 'm3/s');
      const massGps = volumeM3PerS * densityAt(inputs['reference']) * 1000;
      const others = Object.keys(expected).filter((key) => key.startsWith('slpm_at_'));
      const flows = others.map((key) => [key, litresPerMinute(massGps, key.replace('slpm_at_', ''))]);
      return { mass_flow_g_s: massGps, ...Object.fromEntries(flows) };
    },
  },
  {
    topic: 'c',
    inputs: ['actual_l_min', 'pressure_abs_kpa', 'temperature_c', 'reference'],
    give: (given, { inputs }) => {
      const state = { pressureKpa: given('pressure_abs_kpa'), temperatureC: given('temperature_c') };
      const massGps = convert(given('actual_l_min'), 'L/min', 'm3/s') * dryAirDensity(state) * 1000;
      return { mass_flow_g_s: massGps, standard_l_min: litresPerMinute(massGps, String(inputs['reference'])) };
    },
  },
  {
    topic: 'c',
    inputs: ['standard_ft3_min', 'p_std_pa', 't_std_k', 'R'],
    give: (given) => {
      const volumeM3PerS = convert(given('standard_ft3_min'), 'ft3/min', 'm3/s');
      return {
        volume_flow_m3_s: volumeM3PerS,
        molar_flow_mol_s: (volumeM3PerS * given('p_std_pa')) / (given('R') * given('t_std_k')),
      };
    },
  },
  {
    topic: 'c',
    inputs: ['mass_flow_kg_min', 'molar_mass_g_mol'],
    give: (given) => {
      const massGps = convert(given('mass_flow_kg_min') * 60, 'kg/h', 'g/s');
      return { mass_flow_g_s: massGps, molar_flow_mol_s: massGps / given('molar_mass_g_mol') };
    },
  },
];
