import * as fc from 'fast-check';
import { type RampSample } from './ramp-series';
import { sealPointFromMarks } from './seal-marks';
import { findSealPoint } from './seal-point';

const stationKpa = 93.9;
const sealS = 40;
const restS = 10;
/** The gauge at the moment of sealing: 0.1 kPa/s for 30 s. */
const sealKpa = 3;

interface RampMaking {
  readonly stepS?: number;
  readonly endS?: number;
  readonly sealsAtS?: number;
  readonly supplyOffS?: number;
  readonly mapOffsetKpa?: number;
  readonly quietForS?: number;
}

/** A plain ramp: rest, hiss, and where it seals a jump of the pressure and silence; with a scatter of its own. */
function ramp(making: RampMaking = {}): RampSample[] {
  const {
    stepS = 0.25,
    endS = 70,
    sealsAtS = sealS,
    supplyOffS = Infinity,
    mapOffsetKpa = 0.2,
    quietForS = Infinity,
  } = making;
  return Array.from({ length: Math.round(endS / stepS) + 1 }, (_, index) => {
    const timeS = index * stepS;
    const isSealed = timeS > sealsAtS;
    const isQuiet = isSealed && timeS <= sealsAtS + quietForS;
    const rising = Math.max(0, timeS - restS) * 0.1 + (isSealed ? Math.min(3, 6 * (timeS - sealsAtS)) : 0);
    const pressure = timeS > supplyOffS ? rising * Math.exp(supplyOffS - timeS) : rising;
    const hissDb = timeS <= restS || isQuiet || pressure < 0.2 ? 46 : 60 + 2 * pressure;
    const scatter = Math.sin(index * 12.9898) + Math.sin(index * 78.233);
    return {
      timeS,
      gaugeKpa: Math.round((pressure + 0.02 * scatter) * 100) / 100,
      mapKpa: Math.round((pressure + stationKpa + mapOffsetKpa + 0.03 * scatter) * 10) / 10,
      soundDb: hissDb + 0.5 * scatter,
    };
  });
}

const withoutGauge = (samples: RampSample[]) =>
  samples.map(({ timeS, mapKpa, soundDb }) => ({ timeS, mapKpa, soundDb }));

describe('findSealPoint', () => {
  it('finds the pressure at which the noise goes away, by the gauge and by the manifold sensor alone', () => {
    for (const samples of [ramp(), withoutGauge(ramp())]) {
      const found = findSealPoint(samples, { stationKpa });
      if (!found.sealed) throw new Error(found.reason);
      expect(Math.abs(found.timeS - sealS)).toBeLessThanOrEqual(0.25);
      expect(Math.abs(found.aboveStationKpa - sealKpa)).toBeLessThanOrEqual(found.uncertaintyKpa);
      expect(found.pressureKpa).toBe(stationKpa + found.aboveStationKpa);
      expect(found.uncertaintyKpa).toBeLessThan(0.3);
      expect(found.confidence).toBeGreaterThan(0.9);
    }
  });

  it('is not moved by an offset of the sensor, and only shifted by that of the clock', () => {
    const plain = findSealPoint(withoutGauge(ramp()), { stationKpa });
    fc.assert(
      fc.property(fc.integer({ min: -20, max: 20 }), fc.integer({ min: 0, max: 100_000 }), (tenths, shiftS) => {
        const shifted = withoutGauge(ramp({ mapOffsetKpa: 0.2 + tenths / 10 })).map((sample) => ({
          ...sample,
          timeS: sample.timeS + shiftS,
        }));
        const found = findSealPoint(shifted, { stationKpa });
        if (!found.sealed || !plain.sealed) throw new Error('not sealed');
        expect(found.aboveStationKpa).toBeCloseTo(plain.aboveStationKpa, 6);
        expect(found.timeS - shiftS).toBeCloseTo(plain.timeS, 6);
      }),
      { numRuns: 20 },
    );
  });

  it('never calls a ramp sealed that ends before the seal, wherever it is cut', () => {
    const samples = ramp();
    for (let count = 0; count < samples.length && samples[count]!.timeS <= sealS; count++) {
      expect(findSealPoint(samples.slice(0, count), { stationKpa }).sealed).toBe(false);
    }
  });

  it('waits until the quiet has lasted', () => {
    const cutAt = (endS: number) => findSealPoint(ramp({ endS }), { stationKpa }).sealed;
    expect([sealS + 1, sealS + 2, sealS + 5, sealS + 10].map(cutAt)).toEqual([false, false, true, true]);
  });

  it.each([
    ['the noise stays', { sealsAtS: Infinity }, 'never-quiet'],
    ['the supply is shut off', { sealsAtS: Infinity, supplyOffS: 50 }, 'pressure-fell'],
    ['the noise comes back after two seconds', { quietForS: 2 }, 'quiet-too-short'],
    ['nothing is ever heard', { endS: 9 }, 'no-noise'],
    ['there are a few samples only', { endS: 2 }, 'too-little-data'],
  ])('says why not when %s', (_what, making, reason) => {
    expect(findSealPoint(ramp(making), { stationKpa })).toEqual({ sealed: false, reason });
  });

  it('needs a rest when the sensor is all there is', () => {
    const late = withoutGauge(ramp()).filter(({ timeS }) => timeS > 20);
    expect(findSealPoint(late, { stationKpa })).toEqual({ sealed: false, reason: 'no-rest' });
  });

  it('does not take a clank for the seal, nor lose the seal to one', () => {
    fc.assert(
      fc.property(fc.double({ min: 0, max: 1, noNaN: true }), fc.constantFrom(0, Infinity), (where, never) => {
        const samples = ramp({ sealsAtS: sealS + never, stepS: 0.5 });
        const index = Math.floor(where * (samples.length - 2));
        fc.pre(Math.abs(samples[index]!.timeS - sealS) > 3);
        const clanked = samples.map((sample, at) =>
          at === index || at === index + 1 ? { ...sample, soundDb: sample.soundDb! + 22 } : sample,
        );
        const found = findSealPoint(clanked, { stationKpa });
        expect(found.sealed).toBe(never === 0);
        if (found.sealed) expect(Math.abs(found.timeS - sealS)).toBeLessThanOrEqual(0.5);
      }),
    );
  });

  it('widens its uncertainty over a gap, and by the resolution of what it reads', () => {
    const holey = ramp().filter(({ timeS }) => timeS <= sealS - 3 || timeS > sealS);
    const [plain, gappy, coarse] = [
      findSealPoint(ramp(), { stationKpa }),
      findSealPoint(holey, { stationKpa }),
      findSealPoint(ramp(), { stationKpa, resolutionKpa: 1 }),
    ];
    if (!plain.sealed || !gappy.sealed || !coarse.sealed) throw new Error('not sealed');
    expect(gappy.uncertaintyKpa).toBeGreaterThan(plain.uncertaintyKpa);
    expect(Math.abs(gappy.aboveStationKpa - sealKpa)).toBeLessThanOrEqual(gappy.uncertaintyKpa);
    expect(coarse.uncertaintyKpa).toBeGreaterThan(0.57);
  });

  it('takes very many samples in blocks and still places the seal among single ones', () => {
    const found = findSealPoint(ramp({ stepS: 0.001 }), { stationKpa });
    if (!found.sealed) throw new Error(found.reason);
    expect(Math.abs(found.timeS - sealS)).toBeLessThanOrEqual(0.05);
    expect(Math.abs(found.aboveStationKpa - sealKpa)).toBeLessThanOrEqual(found.uncertaintyKpa);
  });

  it('gives a finite result or a reason for any series, however its times are bunched', () => {
    const step = fc.constantFrom(0, 0, 0.02, 0.1, 0.25, 1, 4);
    const reading = fc.record({
      step,
      gaugeKpa: fc.option(fc.integer({ min: -10, max: 130 }), { nil: undefined }),
      soundDb: fc.option(fc.constantFrom(40, 45, 60, 61, 80), { nil: undefined }),
    });
    fc.assert(
      fc.property(fc.array(reading, { maxLength: 200 }), (readings) => {
        let timeS = 0;
        const samples = readings.map(({ step, gaugeKpa, soundDb }) => ({
          timeS: (timeS += step),
          mapKpa: stationKpa + (gaugeKpa ?? 0) / 10,
          gaugeKpa: gaugeKpa === undefined ? undefined : gaugeKpa / 10,
          soundDb,
        }));
        const found = findSealPoint(samples, { stationKpa });
        if (!found.sealed) return;
        expect(Number.isFinite(found.aboveStationKpa)).toBe(true);
        expect(found.uncertaintyKpa).toBeGreaterThan(0);
        expect(found.uncertaintyKpa).toBeLessThan(100);
      }),
      { numRuns: 300 },
    );
  });

  it('refuses what is no measurement', () => {
    const broken = (change: Partial<RampSample>) => [...ramp({ endS: 20 }), { timeS: 21, mapKpa: 94, ...change }];
    expect(() => findSealPoint(broken({ mapKpa: NaN }), { stationKpa })).toThrow('mapKpa of sample 81 is NaN');
    expect(() => findSealPoint(broken({ soundDb: Infinity }), { stationKpa })).toThrow('soundDb of sample 81');
    expect(() => findSealPoint(broken({ gaugeKpa: NaN }), { stationKpa })).toThrow('gaugeKpa of sample 81');
    expect(() => findSealPoint(broken({ timeS: 19 }), { stationKpa })).toThrow(
      'timeS of sample 81 is 19; allowed: 20 or more',
    );
    expect(() => findSealPoint(broken({ timeS: NaN }), { stationKpa })).toThrow('timeS of sample 81 is NaN');
    expect(() => findSealPoint(ramp(), { stationKpa: 0 })).toThrow('stationKpa is 0; allowed: above 0');
    expect(() => findSealPoint(ramp(), { stationKpa, resolutionKpa: -1 })).toThrow('resolutionKpa is -1');
  });
});

describe('sealPointFromMarks', () => {
  it('covers the truth for every reaction between 0.2 and 1 s, with and without a gauge', () => {
    const reaction = fc.double({ min: 0.2, max: 1, noNaN: true });
    fc.assert(
      fc.property(reaction, reaction, (beginsS, stopsS) => {
        const marks = { noiseBeginsS: restS + 1 + beginsS, noiseStopsS: sealS + stopsS, stationKpa };
        for (const samples of [ramp(), withoutGauge(ramp())]) {
          const found = sealPointFromMarks(samples, marks);
          if (!found.sealed) throw new Error(found.reason);
          expect(Math.abs(found.aboveStationKpa - sealKpa)).toBeLessThanOrEqual(found.uncertaintyKpa);
          expect(Math.abs(found.timeS - sealS)).toBeLessThanOrEqual(0.4 + 1e-9);
          expect(found.confidence).toBeGreaterThan(0.9);
        }
      }),
    );
  });

  it('is less certain than the analysis, and bears no witness without a sound level', () => {
    const marks = { noiseBeginsS: restS + 1, noiseStopsS: sealS + 0.5, stationKpa };
    const [analysed, marked] = [findSealPoint(ramp(), { stationKpa }), sealPointFromMarks(ramp(), marks)];
    const unheard = sealPointFromMarks(
      ramp().map(({ timeS, mapKpa, gaugeKpa }) => ({ timeS, mapKpa, gaugeKpa })),
      marks,
    );
    if (!analysed.sealed || !marked.sealed || !unheard.sealed) throw new Error('not sealed');
    expect(marked.uncertaintyKpa).toBeGreaterThan(analysed.uncertaintyKpa);
    expect(unheard.confidence).toBe(0);
  });

  it('refuses marks that are not in the series or in the wrong order', () => {
    const mark = (noiseBeginsS: number, noiseStopsS: number) => () =>
      sealPointFromMarks(ramp(), { noiseBeginsS, noiseStopsS, stationKpa });
    expect(mark(12, 71)).toThrow('noiseStopsS is 71; allowed: above 12 to 70');
    expect(mark(-1, 40)).toThrow('noiseBeginsS is -1; allowed: 0 to 70');
    expect(mark(40, 40)).toThrow(RangeError);
    expect(mark(NaN, 40)).toThrow(RangeError);
  });

  it('says what is missing', () => {
    const marks = { noiseBeginsS: 1, noiseStopsS: 40, stationKpa };
    expect(sealPointFromMarks([], marks)).toEqual({ sealed: false, reason: 'too-little-data' });
    expect(sealPointFromMarks(withoutGauge(ramp()), marks)).toEqual({ sealed: false, reason: 'no-rest' });
  });
});
