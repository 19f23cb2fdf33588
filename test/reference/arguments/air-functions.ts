import * as fc from 'fast-check';
import { between, readings } from '../properties/runs';
import { asObject, inOrder, withRest, type ExportedFunction } from './exported-function';

const gas = { pressureKpa: between(0.001, 10_000), temperatureC: between(-100, 1000) };
const engine = {
  displacementL: between(0.01, 100),
  rpm: between(1, 30_000),
  manifoldKpa: between(0.1, 1000),
  intakeC: between(-100, 1000),
};
const impossibleEngine = {
  displacementL: [-1, 0, 1600],
  rpm: [-1, 0, 1e6],
  manifoldKpa: [-1, 0, 101_325],
  intakeC: [-273.16, 5000],
};
const hole = {
  upstreamKpa: between(1, 10_000),
  share: between(0, 0.999),
  upstreamC: between(-100, 1000),
  dischargeCoefficient: fc.option(between(0.001, 1), { nil: undefined }),
  gamma: fc.option(between(1.01, 1.7), { nil: undefined }),
};
const impossibleHole = {
  upstreamKpa: [-1, 0, 1e6],
  downstreamKpa: [-1, 1e6],
  upstreamC: [-273.16, 5000],
  dischargeCoefficient: [-1, 0, 1.1],
  gamma: [0, 1, 2],
};
const withDownstream = ({ share, ...rest }: { share: number; upstreamKpa: number }) => ({
  ...rest,
  downstreamKpa: share * rest.upstreamKpa,
});
/** The exported functions about air: its pressure, density and flow. */
export const airFunctions: Readonly<Record<string, ExportedFunction>> = {
  standardPressure: {
    valid: fc.record({ elevationM: between(-1000, 11_000) }),
    call: inOrder('standardPressure', 'elevationM'),
    numbers: { elevationM: [-1001, 11_001] },
  },
  elevationOf: {
    valid: fc.record({ pressureKpa: between(22.7, 113.9) }),
    call: inOrder('elevationOf', 'pressureKpa'),
    numbers: { pressureKpa: [-1, 0, 22, 115] },
  },
  stationPressure: {
    valid: fc.record({ altimeterSettingKpa: between(85, 110), elevationM: between(-1000, 11_000) }),
    call: asObject('stationPressure'),
    numbers: { altimeterSettingKpa: [0, 29.92, 1013.25], elevationM: [-1001, 11_001] },
  },
  stationUncertainty: {
    valid: fc.record({ source: fc.constantFrom('elevation', 'altimeter-setting') }),
    call: inOrder('stationUncertainty', 'source'),
    numbers: {},
    words: ['source'],
  },
  toAbsolute: {
    valid: fc.record({ gaugeKpa: between(-20, 10_000), stationKpa: between(20, 115) }),
    call: inOrder('toAbsolute', 'gaugeKpa', 'stationKpa'),
    numbers: { gaugeKpa: [-200, 1e5], stationKpa: [-1, 0, 101_325] },
  },
  toGauge: {
    valid: fc.record({ absoluteKpa: between(0, 10_000), stationKpa: between(20, 115) }),
    call: inOrder('toGauge', 'absoluteKpa', 'stationKpa'),
    numbers: { absoluteKpa: [-1, 1e5], stationKpa: [-1, 0, 101_325] },
  },
  dryAirDensity: {
    valid: fc.record(gas),
    call: asObject('dryAirDensity'),
    numbers: { pressureKpa: [-1, 0, 101_325], temperatureC: [-273.16, 5000] },
  },
  moistAirDensity: {
    valid: fc.record({
      pressureKpa: between(30, 1000),
      temperatureC: between(-40, 60),
      relativeHumidity: between(0, 1),
    }),
    call: asObject('moistAirDensity'),
    numbers: { pressureKpa: [-1, 0, 101_325], temperatureC: [-273.16, 500], relativeHumidity: [-0.1, 1.1, 50] },
  },
  speedDensityAirflow: {
    valid: fc.record({ ...engine, volumetricEfficiency: between(0, 3) }),
    call: asObject('speedDensityAirflow'),
    numbers: { ...impossibleEngine, volumetricEfficiency: [-1, 85] },
  },
  volumetricEfficiency: {
    valid: fc.record({ ...engine, airflowGps: between(0, 10_000) }),
    call: asObject('volumetricEfficiency'),
    numbers: { ...impossibleEngine, airflowGps: [-1] },
  },
  decayLeakRate: {
    valid: fc.record({
      volumeL: between(0.001, 1e6),
      startKpa: between(0, 10_000),
      endKpa: between(0, 10_000),
      startC: between(-100, 1000),
      endC: between(-100, 1000),
      seconds: between(0.001, 1e7),
      referenceKpa: fc.option(between(0.001, 10_000), { nil: undefined }),
      referenceC: fc.option(between(-100, 1000), { nil: undefined }),
    }),
    call: asObject('decayLeakRate'),
    numbers: {
      volumeL: [-1, 0],
      startKpa: [-1, 101_325],
      endKpa: [-1, 101_325],
      startC: [-273.16],
      endC: [-273.16],
      seconds: [-1, 0],
      referenceKpa: [-1, 0],
      referenceC: [-273.16],
    },
    optional: ['referenceKpa', 'referenceC'],
  },
  fitDecay: {
    valid: fc.record({
      volumeL: between(0.001, 1e6),
      volumeUncertaintyL: fc.option(between(0, 0.001), { nil: undefined }),
      stationKpa: between(10, 200),
      temperatureC: between(-100, 1000),
      samples: fc
        .record({ startKpa: readings(1, 300), perS: readings(0, 0.2), stray: readings(0, 0.5) })
        .map(({ startKpa, perS, stray }) =>
          Array.from({ length: 20 }, (_, index) => ({
            timeS: index,
            gaugeKpa: startKpa * Math.exp(-perS * index) + (index % 3) * stray,
          })),
        ),
    }),
    call: withRest('fitDecay', 'samples'),
    numbers: {
      volumeL: [-1, 0],
      volumeUncertaintyL: [-1, 1e7],
      stationKpa: [-1, 0, 101_325],
      temperatureC: [-273.16],
    },
    optional: ['volumeUncertaintyL'],
    samples: { samples: ['timeS', 'gaugeKpa'] },
  },
  orificeMassFlow: {
    valid: fc.record({ ...hole, diameterMm: between(0, 1000) }).map(withDownstream),
    call: asObject('orificeMassFlow'),
    numbers: { ...impossibleHole, diameterMm: [-1, 1e6] },
    optional: ['dischargeCoefficient', 'gamma'],
  },
  orificeDiameter: {
    valid: fc.record({ ...hole, flowGps: between(0, 1000) }).map(withDownstream),
    call: asObject('orificeDiameter'),
    numbers: { ...impossibleHole, flowGps: [-1] },
    optional: ['dischargeCoefficient', 'gamma'],
  },
};
