import {
  decayLeakRate,
  orificeDiameter,
  orificeMassFlow,
  speedDensityAirflow,
  volumetricEfficiency,
} from '../../calculations/air-and-leaks';
import { elevationOf, standardPressure, stationPressure } from '../../calculations/for-a-run';
import type { PhysicalCalculation } from './expression';
import { plainNumber, pressure, quantityOf, type QuantityKind } from './kinds';

/** A calculation as the language knows it: kinds, and numbers in base units in and out. */
export interface Signature {
  readonly takes: readonly QuantityKind[];
  readonly gives: QuantityKind;
  /** Throws RangeError on what cannot be. */
  readonly calculate: (...values: readonly number[]) => number;
}

const absolute = pressure('absolute');
const distance = quantityOf('distance', 'difference');
const temperature = quantityOf('temperature', 'absolute');
const volume = quantityOf('volume', 'difference');
const massFlow = quantityOf('massFlow', 'difference');
const volumeFlow = quantityOf('volumeFlow', 'difference');
const turning = quantityOf('frequency', 'difference');
const time = quantityOf('time', 'difference');

const kpa = (pascals: number): number => pascals / 1000;
const celsius = (kelvins: number): number => kelvins - 273.15;
const litres = (cubicMetres: number): number => cubicMetres * 1000;
const cm3PerMinute = 1e-6 / 60;

function engineAir([volumeM3, perSecond, manifoldPa, intakeK]: readonly [number, number, number, number]) {
  return {
    displacementL: litres(volumeM3),
    rpm: perSecond * 60,
    manifoldKpa: kpa(manifoldPa),
    intakeC: celsius(intakeK),
  };
}

function orifice([upstreamPa, downstreamPa, upstreamK]: readonly [number, number, number]) {
  return { upstreamKpa: kpa(upstreamPa), downstreamKpa: kpa(downstreamPa), upstreamC: celsius(upstreamK) };
}

/** Every calculation whose arguments have fixed kinds, in the order of its form in `vocabulary.ts`. */
export const signatures: Readonly<Record<PhysicalCalculation, Signature>> = {
  standardPressure: {
    takes: [distance],
    gives: absolute,
    calculate: (elevationM = Number.NaN) => standardPressure(elevationM) * 1000,
  },
  stationPressure: {
    takes: [absolute, distance],
    gives: absolute,
    calculate: (settingPa = Number.NaN, elevationM = Number.NaN) =>
      stationPressure({ altimeterSettingKpa: kpa(settingPa), elevationM }) * 1000,
  },
  elevationOf: {
    takes: [absolute],
    gives: distance,
    calculate: (pressurePa = Number.NaN) => elevationOf(kpa(pressurePa)),
  },
  speedDensityAirflow: {
    takes: [volume, turning, absolute, temperature, plainNumber],
    gives: massFlow,
    calculate: (a = Number.NaN, b = Number.NaN, c = Number.NaN, d = Number.NaN, efficiency = Number.NaN) =>
      speedDensityAirflow({ ...engineAir([a, b, c, d]), volumetricEfficiency: efficiency }) / 1000,
  },
  volumetricEfficiency: {
    takes: [volume, turning, absolute, temperature, massFlow],
    gives: plainNumber,
    calculate: (a = Number.NaN, b = Number.NaN, c = Number.NaN, d = Number.NaN, flow = Number.NaN) =>
      volumetricEfficiency({ ...engineAir([a, b, c, d]), airflowGps: flow * 1000 }),
  },
  orificeMassFlow: {
    takes: [distance, absolute, absolute, temperature],
    gives: massFlow,
    calculate: (diameterM = Number.NaN, a = Number.NaN, b = Number.NaN, c = Number.NaN) =>
      orificeMassFlow({ diameterMm: diameterM * 1000, ...orifice([a, b, c]) }).gps / 1000,
  },
  orificeDiameter: {
    takes: [massFlow, absolute, absolute, temperature],
    gives: distance,
    calculate: (flow = Number.NaN, a = Number.NaN, b = Number.NaN, c = Number.NaN) =>
      orificeDiameter({ flowGps: flow * 1000, ...orifice([a, b, c]) }) / 1000,
  },
  decayLeakRate: {
    takes: [volume, absolute, absolute, temperature, temperature, time],
    gives: volumeFlow,
    calculate: (
      volumeM3 = Number.NaN,
      a = Number.NaN,
      b = Number.NaN,
      c = Number.NaN,
      d = Number.NaN,
      s = Number.NaN,
    ) =>
      decayLeakRate({
        volumeL: litres(volumeM3),
        startKpa: kpa(a),
        endKpa: kpa(b),
        startC: celsius(c),
        endC: celsius(d),
        seconds: s,
      }).standardCm3PerMin * cm3PerMinute,
  },
};

export function isPhysical(name: string): name is PhysicalCalculation {
  return Object.hasOwn(signatures, name);
}
