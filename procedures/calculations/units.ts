import { requireInRange } from './argument-range';

/** What a unit measures; only units of one kind convert into each other. */
export type UnitKind =
  | 'pressure'
  | 'temperature'
  | 'volumeFlow'
  | 'massFlow'
  | 'volume'
  | 'distance'
  | 'torque'
  | 'voltage'
  | 'resistance'
  | 'time'
  | 'speed'
  | 'ratio'
  | 'frequency'
  | 'soundLevel';

/** A unit in terms of its kind's base unit: base = (value + offset) * scale. */
export interface UnitDefinition {
  readonly kind: UnitKind;
  /** The coherent SI unit of the kind, as it is written: Pa, K, m3/s, kg/s, m3, m, Nm, V, ohm, s, m/s, 1/s, 1 or dB. */
  readonly base: string;
  /** Base units in one of this unit. */
  readonly scale: number;
  /** Added to the value before scaling; zero for everything but the temperature scales that do not start at 0 K. */
  readonly offset: number;
}

// Exact by definition: NIST SP 811 (2008) Appendix B.8 and its footnotes.
const poundKg = 0.45359237;
const inchM = 0.0254;
const footM = 12 * inchM;
const mileM = 5280 * footM;
const standardGravityMPerS2 = 9.80665;
/** The conventional density of mercury, 13 595.1 kg/m3: not that of any real temperature. */
const mercuryKgPerM3 = 13595.1;
/** The conventional density of water, 1000 kg/m3. */
const waterKgPerM3 = 1000;
const poundForceN = poundKg * standardGravityMPerS2;

const unit =
  (kind: UnitKind, base: string) =>
  (scale: number, offset = 0): UnitDefinition => ({ kind, base, scale, offset });

const pressure = unit('pressure', 'Pa');
const temperature = unit('temperature', 'K');
const volumeFlow = unit('volumeFlow', 'm3/s');
const massFlow = unit('massFlow', 'kg/s');
const volume = unit('volume', 'm3');
const distance = unit('distance', 'm');
const torque = unit('torque', 'Nm');
const voltage = unit('voltage', 'V');
const resistance = unit('resistance', 'ohm');
const time = unit('time', 's');
const speed = unit('speed', 'm/s');
const ratio = unit('ratio', '1');
const frequency = unit('frequency', '1/s');
const soundLevel = unit('soundLevel', 'dB');

/**
 * Every unit that the product knows, from the exact definitions of NIST SP 811 (2008) Appendix B.8.
 *
 * inHg, inH2O and mmHg are the conventional ones, not those of 32 degF, 39.2 degF or 60 degF. `1` is a plain number.
 */
export const units = {
  kPa: pressure(1000),
  Pa: pressure(1),
  hPa: pressure(100),
  bar: pressure(100_000),
  psi: pressure(poundForceN / (inchM * inchM)),
  inHg: pressure(mercuryKgPerM3 * standardGravityMPerS2 * inchM),
  inH2O: pressure(waterKgPerM3 * standardGravityMPerS2 * inchM),
  mmHg: pressure((mercuryKgPerM3 * standardGravityMPerS2) / 1000),
  degC: temperature(1, 273.15),
  degF: temperature(5 / 9, 459.67),
  K: temperature(1),
  'L/min': volumeFlow(0.001 / 60),
  'ft3/min': volumeFlow((footM * footM * footM) / 60),
  'm3/s': volumeFlow(1),
  'g/s': massFlow(0.001),
  'kg/h': massFlow(1 / 3600),
  'lb/min': massFlow(poundKg / 60),
  L: volume(0.001),
  cm3: volume(1e-6),
  mm: distance(0.001),
  m: distance(1),
  km: distance(1000),
  mi: distance(mileM),
  Nm: torque(1),
  'lbf.ft': torque(poundForceN * footM),
  V: voltage(1),
  mV: voltage(0.001),
  ohm: resistance(1),
  kohm: resistance(1000),
  s: time(1),
  min: time(60),
  h: time(3600),
  'km/h': speed(1000 / 3600),
  mph: speed(mileM / 3600),
  '%': ratio(0.01),
  '1': ratio(1),
  rpm: frequency(1 / 60),
  dB: soundLevel(1),
} as const satisfies Record<string, UnitDefinition>;

/** The name of a unit of the table, as it is written in documents, readings and files. */
export type UnitName = keyof typeof units;

/** Whether the text names a unit of the table. */
export function isUnit(text: string): text is UnitName {
  return typeof text === 'string' && Object.hasOwn(units, text);
}

/**
 * Gives the kind of a unit: `unitKind('psi')` is `'pressure'`.
 *
 * Throws RangeError on a name that is not in the table.
 */
export function unitKind(name: UnitName): UnitKind {
  return definitionOf('name', name).kind;
}

/**
 * Gives a value in its kind's base unit: base = (value + offset) * scale. `toBase(20, 'degC')` is 293.15 (K).
 *
 * Throws RangeError on a value that is not finite, on a temperature below absolute zero and on an unknown unit.
 */
export function toBase(value: number, from: UnitName): number {
  const { kind, scale, offset } = definitionOf('from', from);
  requireInRange(`value in ${from}`, value, kind === 'temperature' ? { low: -offset } : {});
  return requireInRange(`value in ${from}, in its base unit`, (value + offset) * scale);
}

/**
 * Gives a base unit's value in another unit of the kind: value = base / scale - offset.
 *
 * Throws RangeError on a value that is not finite, on a temperature below 0 K and on an unknown unit.
 */
export function fromBase(baseValue: number, to: UnitName): number {
  const { kind, scale, offset } = definitionOf('to', to);
  requireInRange('baseValue', baseValue, kind === 'temperature' ? { low: 0 } : {});
  return requireInRange(`value in ${to}`, baseValue / scale - offset);
}

/**
 * Converts a value between two units of one kind: `convert(5, 'psi', 'kPa')` is 34.47378646584.
 *
 * For a difference, a spread or an uncertainty use `convertDifference`: 1 K of spread is 1.8 degF, not -457.87 degF.
 *
 * Throws RangeError on mismatched kinds, on a value that is not finite and on a temperature below absolute zero.
 * Source: NIST SP 811 (2008) Appendix B.8.
 */
export function convert(value: number, from: UnitName, to: UnitName): number {
  requireOneKind(from, to);
  const baseValue = toBase(value, from);
  return from === to ? value : fromBase(baseValue, to);
}

/**
 * Gives a difference in the kind's base unit: difference * scale, without the offset of a temperature scale.
 *
 * Throws RangeError on a value that is not finite and on an unknown unit.
 */
export function differenceToBase(difference: number, from: UnitName): number {
  return requireInRange(`difference in ${from}`, difference) * definitionOf('from', from).scale;
}

/**
 * Gives a base unit's difference in another unit of the kind: difference / scale.
 *
 * Throws RangeError on a value that is not finite and on an unknown unit.
 */
export function differenceFromBase(baseDifference: number, to: UnitName): number {
  return requireInRange(
    `difference in ${to}`,
    requireInRange('baseDifference', baseDifference) / definitionOf('to', to).scale,
  );
}

/**
 * Converts a difference, a spread or an uncertainty: `convertDifference(1, 'K', 'degF')` is 1.8.
 *
 * Throws RangeError on mismatched kinds and on a value that is not finite.
 */
export function convertDifference(difference: number, from: UnitName, to: UnitName): number {
  requireOneKind(from, to);
  const baseDifference = differenceToBase(difference, from);
  return from === to ? difference : differenceFromBase(baseDifference, to);
}

/** Names come from documents and files, so the type alone does not vouch for them. */
function definitionOf(argument: string, name: UnitName): UnitDefinition {
  if (!isUnit(name)) throw new RangeError(`${argument} is ${String(name)}; allowed: ${Object.keys(units).join(', ')}`);
  return units[name];
}

function requireOneKind(from: UnitName, to: UnitName): void {
  const { kind } = definitionOf('from', from);
  if (definitionOf('to', to).kind !== kind) {
    throw new RangeError(`to is ${to} (${unitKind(to)}); allowed: a unit of ${kind}, as ${from} is`);
  }
}
