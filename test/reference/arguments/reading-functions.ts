import * as fc from 'fast-check';
import { isUnit, unitKind, units } from '../../../procedures/calculations';
import { between, readings } from '../properties/runs';
import { asObject, inOrder, withRest, type ExportedFunction } from './exported-function';

const names = Object.keys(units).filter(isUnit);
const pair = fc.constantFrom(...names).chain((from) =>
  fc.record({
    from: fc.constant(from),
    to: fc.constantFrom(...names.filter((to) => unitKind(to) === unitKind(from))),
    value: readings(0, 1e6),
  }),
);
const byte = fc.integer({ min: 0, max: 255 });
const points = fc
  .array(fc.tuple(readings(-500, 500), readings(-1000, 1000)), { minLength: 3, maxLength: 20 })
  .map((drawn) => ({ x: drawn.map(([x], index) => x + index * 1001), y: drawn.map(([, y]) => y) }));
const ramp = fc.array(fc.tuple(readings(0, 0.2), readings(40, 90)), { minLength: 30, maxLength: 60 }).map((drawn) =>
  drawn.map(([stray, soundDb], index) => ({
    timeS: index / 2,
    gaugeKpa: index / 20 + stray,
    mapKpa: 93.9 + index / 20 + stray,
    soundDb,
  })),
);
const vins = fc.constantFrom('1ZZBT4CK4LR204817', '7ZZFD9HA0NP310446', '1ZZ9A34B23X615092', '11111111111111111');

/** The exported functions about readings: units, fits, seal points, decisions, codes. */
export const readingFunctions: Readonly<Record<string, ExportedFunction>> = {
  convert: {
    valid: pair,
    call: inOrder('convert', 'value', 'from', 'to'),
    numbers: { value: [] },
    words: ['from', 'to'],
  },
  convertDifference: {
    valid: pair.map(({ value, ...rest }) => ({ difference: value, ...rest })),
    call: inOrder('convertDifference', 'difference', 'from', 'to'),
    numbers: { difference: [] },
    words: ['from', 'to'],
  },
  toBase: { valid: pair, call: inOrder('toBase', 'value', 'from'), numbers: { value: [] }, words: ['from'] },
  fromBase: {
    valid: pair.map(({ value, to }) => ({ baseValue: value, to })),
    call: inOrder('fromBase', 'baseValue', 'to'),
    numbers: { baseValue: [] },
    words: ['to'],
  },
  differenceToBase: {
    valid: pair.map(({ value, from }) => ({ difference: value, from })),
    call: inOrder('differenceToBase', 'difference', 'from'),
    numbers: { difference: [] },
    words: ['from'],
  },
  differenceFromBase: {
    valid: pair.map(({ value, to }) => ({ baseDifference: value, to })),
    call: inOrder('differenceFromBase', 'baseDifference', 'to'),
    numbers: { baseDifference: [] },
    words: ['to'],
  },
  unitKind: {
    valid: pair.map(({ from }) => ({ name: from })),
    call: inOrder('unitKind', 'name'),
    numbers: {},
    words: ['name'],
  },
  fitLine: { valid: points, call: inOrder('fitLine', 'x', 'y'), numbers: {}, lists: ['x', 'y'] },
  fitRobustLine: { valid: points, call: inOrder('fitRobustLine', 'x', 'y'), numbers: {}, lists: ['x', 'y'] },
  trackSensors: {
    valid: fc.record({ points, stationKpa: between(20, 115) }).map(({ points: { x, y }, stationKpa }) => ({
      gaugeKpa: x,
      firstKpa: y,
      secondKpa: [...y].reverse(),
      stationKpa,
    })),
    call: asObject('trackSensors'),
    numbers: { stationKpa: [-1, 0] },
    lists: ['gaugeKpa', 'firstKpa', 'secondKpa'],
  },
  findNoiseBegin: {
    valid: fc.record({ samples: ramp }),
    call: inOrder('findNoiseBegin', 'samples'),
    numbers: {},
    samples: { samples: ['timeS', 'gaugeKpa', 'mapKpa', 'soundDb'] },
  },
  findSealPoint: {
    valid: fc.record({
      samples: ramp,
      stationKpa: between(20, 115),
      resolutionKpa: fc.option(between(0, 1), { nil: undefined }),
    }),
    call: withRest('findSealPoint', 'samples'),
    numbers: { stationKpa: [-1, 0], resolutionKpa: [-1] },
    optional: ['resolutionKpa'],
    samples: { samples: ['timeS', 'gaugeKpa', 'mapKpa', 'soundDb'] },
  },
  sealPointFromMarks: {
    valid: fc.record({
      samples: ramp,
      noiseBeginsS: between(2, 5),
      noiseStopsS: between(6, 14),
      stationKpa: between(20, 115),
      resolutionKpa: fc.option(between(0, 1), { nil: undefined }),
    }),
    call: withRest('sealPointFromMarks', 'samples'),
    numbers: { noiseBeginsS: [-1, 1e6], noiseStopsS: [-1, 0, 1e6], stationKpa: [-1, 0], resolutionKpa: [-1] },
    optional: ['resolutionKpa'],
    samples: { samples: ['timeS', 'gaugeKpa', 'mapKpa', 'soundDb'] },
  },
  steepestRise: {
    valid: fc.record({ samples: ramp }),
    call: inOrder('steepestRise', 'samples'),
    numbers: {},
    samples: { samples: ['timeS', 'gaugeKpa'] },
  },
  expandedUncertainty: {
    valid: fc.record({
      accuracy: fc.option(between(0, 1e6), { nil: undefined }),
      resolution: fc.option(between(0, 1e6), { nil: undefined }),
      repeatDeviation: fc.option(between(0, 1e6), { nil: undefined }),
      repeats: fc.option(fc.integer({ min: 1, max: 1e6 }), { nil: undefined }),
      k: fc.option(between(0.1, 10), { nil: undefined }),
    }),
    call: asObject('expandedUncertainty'),
    numbers: { accuracy: [-1], resolution: [-1], repeatDeviation: [-1], repeats: [-1, 0, 1.5], k: [-1, 0] },
    optional: ['accuracy', 'resolution', 'repeatDeviation', 'repeats', 'k'],
  },
  judge: {
    valid: fc.record({
      value: readings(-1e5, 1e5),
      uncertainty: readings(0, 1e5),
      low: fc.option(readings(-1e5, 0), { nil: undefined }),
      high: readings(0, 1e5),
    }),
    call: asObject('judge'),
    numbers: { value: [], uncertainty: [-1], low: [], high: [] },
    optional: ['low', 'high'],
  },
  vinCheckDigit: {
    valid: fc.record({ vin: vins }),
    call: inOrder('vinCheckDigit', 'vin'),
    numbers: {},
    words: ['vin'],
  },
  modelYear: {
    valid: fc.record({ vin: vins, notAfter: fc.integer({ min: 1980, max: 2039 }) }),
    call: withRest('modelYear', 'vin'),
    numbers: { notAfter: [-1, 1979, 2020.5] },
    words: ['vin'],
  },
  decodePid: {
    valid: fc.oneof(
      fc.record({ pid: fc.constantFrom(0x04, 0x05, 0x06, 0x0b, 0x0d, 0x0f, 0x11, 0x33), bytes: fc.tuple(byte) }),
      fc.record({ pid: fc.constantFrom(0x0c, 0x10, 0x42), bytes: fc.tuple(byte, byte) }),
      fc.record({ pid: fc.constant(0x01), bytes: fc.tuple(byte, byte, byte, byte) }),
    ),
    call: inOrder('decodePid', 'pid', 'bytes'),
    numbers: { pid: [-1, 0x02, 4.5, 256] },
    lists: ['bytes'],
  },
  decodeTroubleCode: {
    valid: fc.record({ high: byte, low: byte }),
    call: inOrder('decodeTroubleCode', 'high', 'low'),
    numbers: { high: [-1, 256, 0.5], low: [-1, 256, 0.5] },
  },
};
