import { splitTwoLines, splitTwoMeans } from '../../procedures/calculations/change-point';
import { findSealPoint, sealPointFromMarks, type RampSample } from '../../procedures/calculations';
import { checkValues, expectWithin, numberOf } from './check-values';
import { rampSamples, rampTruths } from './ramp-files';

const withoutGauge = (samples: RampSample[]): RampSample[] =>
  samples.map(({ timeS, mapKpa, soundDb }) => ({ timeS, mapKpa, soundDb }));

describe('change points', () => {
  it.each(checkValues('h', 'y', 'method').filter(([, { expected }]) => 'mean_before' in expected))(
    '%s',
    (_title, value) => {
      const { count, squaredError } = splitTwoMeans(value.inputs['y'] as number[]);
      expect(count).toBe(value.expected['split_after_index_1based']);
      expectWithin(value, 'sse', squaredError);
    },
  );

  it.each(checkValues('h', 'x', 'y', 'min_segment'))('%s', (_title, value) => {
    const [x, y] = [value.inputs['x'] as number[], value.inputs['y'] as number[]];
    const minSegment = numberOf(value.inputs, 'min_segment');
    const lines = splitTwoLines(x, y, minSegment);
    expect(lines.count).toBe(
      value.expected['split_after_index_1based_lines'] ?? value.expected['split_after_index_1based'],
    );
    expectWithin(value, 'sse_two_lines', lines.squaredError);
    if (!('sse_two_means' in value.expected)) return;
    const means = splitTwoMeans(y, minSegment);
    expect(means.count).toBe(value.expected['split_after_index_1based_means']);
    expectWithin(value, 'sse_two_means', means.squaredError);
  });
});

const sealing = rampTruths.filter(({ sealTimeS }) => sealTimeS !== undefined);
const neverSealing = rampTruths.filter(({ sealTimeS }) => sealTimeS === undefined);

describe('seal point of recorded ramps (synthetic, seal time confirmed by a second integrator to 0.005 s)', () => {
  it('has ramps of both kinds to look at', () => {
    expect([sealing.length, neverSealing.length]).toEqual([6, 1]);
  });

  it.each(sealing)('$name: by the gauge', ({ name, stationKpa, sealTimeS = NaN, sealGaugeKpa, tolerance }) => {
    const found = findSealPoint(rampSamples(name), { stationKpa });
    if (!found.sealed) throw new Error(found.reason);
    expect(Math.abs(found.timeS - sealTimeS)).toBeLessThanOrEqual(tolerance.timeS);
    const error = Math.abs(found.aboveStationKpa - sealGaugeKpa);
    expect(error).toBeLessThanOrEqual(tolerance.gaugeKpa);
    expect(error).toBeLessThanOrEqual(found.uncertaintyKpa);
    expect(found.uncertaintyKpa).toBeLessThan(0.3);
    expect(Math.abs(found.pressureKpa - stationKpa - sealGaugeKpa)).toBeLessThanOrEqual(tolerance.mapKpa);
  });

  it.each(sealing)(
    '$name: by the manifold pressure and its own rest',
    ({ name, stationKpa, sealTimeS = NaN, sealGaugeKpa, tolerance }) => {
      const found = findSealPoint(withoutGauge(rampSamples(name)), { stationKpa });
      if (!found.sealed) throw new Error(found.reason);
      expect(Math.abs(found.timeS - sealTimeS)).toBeLessThanOrEqual(tolerance.timeS);
      const error = Math.abs(found.aboveStationKpa - sealGaugeKpa);
      expect(error).toBeLessThanOrEqual(tolerance.mapKpa);
      expect(error).toBeLessThanOrEqual(found.uncertaintyKpa);
    },
  );

  it.each(sealing)('$name: by the marks of a person', ({ name, stationKpa, sealTimeS = NaN, sealGaugeKpa }) => {
    for (const reactionS of [0.2, 0.4, 0.7, 1]) {
      const marks = { noiseBeginsS: 14, noiseStopsS: sealTimeS + reactionS, stationKpa };
      const found = sealPointFromMarks(rampSamples(name), marks);
      if (!found.sealed) throw new Error(found.reason);
      expect(Math.abs(found.aboveStationKpa - sealGaugeKpa)).toBeLessThanOrEqual(found.uncertaintyKpa);
    }
  });

  it.each(sealing)(
    '$name: never sealed when it is cut off before the seal',
    ({ name, stationKpa, sealTimeS = NaN }) => {
      const samples = rampSamples(name);
      const sealed = samples.flatMap(({ timeS }, count) =>
        timeS < sealTimeS &&
        [samples, withoutGauge(samples)].some((series) => findSealPoint(series.slice(0, count), { stationKpa }).sealed)
          ? [timeS]
          : [],
      );
      expect(sealed).toEqual([]);
    },
  );

  it.each(neverSealing)('$name: never sealed', ({ name, stationKpa }) => {
    for (const samples of [rampSamples(name), withoutGauge(rampSamples(name))]) {
      expect(findSealPoint(samples, { stationKpa })).toEqual({ sealed: false, reason: 'never-quiet' });
    }
  });
});
