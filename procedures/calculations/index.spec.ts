import * as calculations from '.';
import {
  type LogHints,
  type PidReading,
  type RampSample,
  type Readiness,
  type ScanLog,
  type SealPoint,
  type StationPressureSource,
  type Tracking,
  type UnitName,
  type Verdict,
  type VinCheck,
} from '.';

/** Whether two types are one and the same, with every name, optional mark and readonly. */
type Same<A, B> = (<T>() => T extends A ? 1 : 2) extends <T>() => T extends B ? 1 : 2 ? true : false;

/** Spells a record out in one level, so that an intersection or interface compares by its members. */
type Plain<T> = T extends readonly unknown[] ? T : T extends object ? { readonly [K in keyof T]: T[K] } : T;

/** The arguments and the result of a function as the face promises them, each in one level. */
type Promised<F> = F extends (...given: infer A) => infer R ? [{ [I in keyof A]: Plain<A[I]> }, Plain<R>] : never;

type Series = ArrayLike<number>;
interface Line {
  readonly slope: number;
  readonly intercept: number;
}

/**
 * What the library promises to its callers, inside and outside of the product: the names and the arguments of every
 * function. They do not change; a later version may add to them.
 */
interface Face {
  standardPressure: (elevationM: number) => number;
  stationPressure: (report: { altimeterSettingKpa: number; elevationM: number }) => number;
  stationUncertainty: (source: StationPressureSource) => number;
  elevationOf: (pressureKpa: number) => number;
  convert: (value: number, from: UnitName, to: UnitName) => number;
  toAbsolute: (gaugeKpa: number, stationKpa: number) => number;
  toGauge: (absoluteKpa: number, stationKpa: number) => number;
  dryAirDensity: (air: { pressureKpa: number; temperatureC: number }) => number;
  moistAirDensity: (air: { pressureKpa: number; temperatureC: number; relativeHumidity: number }) => number;
  speedDensityAirflow: (engine: {
    displacementL: number;
    rpm: number;
    manifoldKpa: number;
    intakeC: number;
    volumetricEfficiency: number;
  }) => number;
  volumetricEfficiency: (engine: {
    displacementL: number;
    rpm: number;
    manifoldKpa: number;
    intakeC: number;
    airflowGps: number;
  }) => number;
  decayLeakRate: (test: {
    volumeL: number;
    startKpa: number;
    endKpa: number;
    startC: number;
    endC: number;
    seconds: number;
    referenceKpa?: number;
    referenceC?: number;
  }) => { paM3PerS: number; standardCm3PerMin: number };
  fitDecay: (
    samples: readonly { readonly timeS: number; readonly gaugeKpa: number }[],
    volume: { volumeL: number; volumeUncertaintyL?: number; stationKpa: number; temperatureC: number },
  ) => { orificeMm: number; uncertaintyMm: number; leakPaM3PerS: number; residualDeviation: number };
  orificeMassFlow: (orifice: {
    diameterMm: number;
    upstreamKpa: number;
    downstreamKpa: number;
    upstreamC: number;
    dischargeCoefficient?: number;
    gamma?: number;
  }) => { gps: number; choked: boolean };
  orificeDiameter: (orifice: {
    flowGps: number;
    upstreamKpa: number;
    downstreamKpa: number;
    upstreamC: number;
    dischargeCoefficient?: number;
    gamma?: number;
  }) => number;
  fitLine: (
    x: Series,
    y: Series,
  ) => Line & { slopeError: number; interceptError: number; residualDeviation: number; rSquared: number };
  fitRobustLine: (x: Series, y: Series) => Line;
  trackSensors: (series: {
    gaugeKpa: readonly number[];
    firstKpa: readonly number[];
    secondKpa: readonly number[];
    stationKpa: number;
  }) => { first: Tracking; second: Tracking; between: Tracking };
  findSealPoint: (
    samples: readonly RampSample[],
    options: { stationKpa: number; resolutionKpa?: number | undefined },
  ) => SealPoint;
  sealPointFromMarks: (
    samples: readonly RampSample[],
    marks: {
      noiseBeginsS: number;
      noiseStopsS: number;
      stationKpa: number;
      resolutionKpa?: number | undefined;
    },
  ) => SealPoint;
  expandedUncertainty: (sources: {
    accuracy?: number;
    resolution?: number;
    repeatDeviation?: number;
    repeats?: number;
    k?: number;
  }) => number;
  judge: (reading: { value: number; uncertainty: number; low?: number; high?: number }) => Verdict;
  vinCheckDigit: (vin: string) => string;
  checkVin: (vin: string) => VinCheck;
  modelYear: (vin: string, bound: { notAfter: number }) => number | undefined;
  decodePid: (pid: number, bytes: Uint8Array) => PidReading | Readiness;
  decodeTroubleCode: (high: number, low: number) => string | undefined;
  describeTroubleCode: (code: string) => string | undefined;
  parseScanLog: (bytes: Uint8Array | string, hints?: LogHints) => ScanLog;
}

/** The promised functions whose types are not what they are promised to be: none. */
type Broken = {
  [Name in keyof Face]: Same<Promised<(typeof calculations)[Name]>, Promised<Face[Name]>> extends true ? never : Name;
}[keyof Face];
type None<T extends never> = T;
/** Fails the type check, naming the function, when a signature changes. */
export type SignaturesHold = None<Broken>;

/** Every promised name and how many arguments it needs. */
const promised: Record<keyof Face, number> = {
  standardPressure: 1,
  stationPressure: 1,
  stationUncertainty: 1,
  elevationOf: 1,
  convert: 3,
  toAbsolute: 2,
  toGauge: 2,
  dryAirDensity: 1,
  moistAirDensity: 1,
  speedDensityAirflow: 1,
  volumetricEfficiency: 1,
  decayLeakRate: 1,
  fitDecay: 2,
  orificeMassFlow: 1,
  orificeDiameter: 1,
  fitLine: 2,
  fitRobustLine: 2,
  trackSensors: 1,
  findSealPoint: 2,
  sealPointFromMarks: 2,
  expandedUncertainty: 1,
  judge: 1,
  vinCheckDigit: 1,
  checkVin: 1,
  modelYear: 2,
  decodePid: 2,
  decodeTroubleCode: 2,
  describeTroubleCode: 1,
  parseScanLog: 1,
};

describe('the public face of the calculations', () => {
  it.each(Object.entries(promised))('exports %s, of %d needed arguments', (name, count) => {
    const exported: unknown = Reflect.get(calculations, name);
    if (typeof exported !== 'function') throw new Error(`${name} is no function`);
    expect(exported.name).toBe(name);
    expect(exported.length).toBe(count);
  });
});
