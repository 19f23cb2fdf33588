import * as fc from 'fast-check';
import { fitDecay, type DecaySample } from './fit-decay';
import { orificeMassFlow } from './orifice';

const stationKpa = 93.9;
const volume = { volumeL: 8, stationKpa, temperatureC: 20 };
const gasConstant = 287.05287;

/** The pressure of the volume by Runge and Kutta's fourth-order method on the mass flow: no closed form in it. */
function emptied(diameterMm: number, startKpa: number, seconds: number, everyS: number): DecaySample[] {
  const slope = (gaugeKpa: number): number => {
    if (gaugeKpa <= 0) return 0;
    const upstreamKpa = stationKpa + gaugeKpa;
    const { gps } = orificeMassFlow({ diameterMm, upstreamKpa, downstreamKpa: stationKpa, upstreamC: 20 });
    return ((-gps / 1000) * gasConstant * 293.15) / volume.volumeL;
  };
  const [step, stepsPerSample] = [everyS / 20, 20];
  const samples: DecaySample[] = [];
  let p = startKpa;
  for (let index = 0; index * step <= seconds; index++) {
    if (index % stepsPerSample === 0) samples.push({ timeS: index * step, gaugeKpa: p });
    const k1 = slope(p);
    const k2 = slope(p + (step / 2) * k1);
    const k3 = slope(p + (step / 2) * k2);
    const k4 = slope(p + step * k3);
    p = Math.max(0, p + (step / 6) * (k1 + 2 * k2 + 2 * k3 + k4));
  }
  return samples;
}

describe('fitDecay', () => {
  it.each([
    ['14 kPa through 1.0 mm', 1, 14, 15],
    ['14 kPa through 0.5 mm', 0.5, 14, 60],
    ['34.5 kPa through 0.2 mm', 0.2, 34.5, 120],
    ['choked, then not: 250 kPa through 2.0 mm', 2, 250, 15],
  ])('finds the hole in a numeric integration: %s', (_title, diameterMm, startKpa, seconds) => {
    const fit = fitDecay(emptied(diameterMm, startKpa, seconds, 0.2), volume);
    expect(Math.abs(fit.orificeMm / diameterMm - 1)).toBeLessThan(1e-7);
    expect(fit.residualDeviation).toBeLessThan(1e-5);
  });

  it('finds the hole in the exponential of choked flow', () => {
    // p = p0 exp(-k t), k = A sqrt(R T) / V 0.6847315 (the flow function of choked air, NACA Report 1135).
    const perS = ((Math.PI / 4) * 1e-6 * Math.sqrt(gasConstant * 293.15) * 0.68473146) / 8e-3;
    const samples = Array.from({ length: 50 }, (_, index) => ({
      timeS: index * 0.2,
      gaugeKpa: 400 * Math.exp(-perS * index * 0.2) - stationKpa,
    }));
    const fit = fitDecay(samples, volume);
    expect(Math.abs(fit.orificeMm - 1)).toBeLessThan(1e-8);
    // V dp/dt at the first sample, 400 kPa absolute: 1 kPa L is 1 Pa m3.
    expect(Math.abs(fit.leakPaM3PerS / (perS * 400 * volume.volumeL) - 1)).toBeLessThan(1e-7);
  });

  it('covers the true hole with its uncertainty in 95 of 100 noisy decays', () => {
    const clean = emptied(0.8, 14, 20, 0.2);
    let covered = 0;
    const draws = 400;
    for (let seed = 1; seed <= draws; seed++) {
      const noise = normalNoise(seed);
      const fit = fitDecay(
        clean.map(({ timeS, gaugeKpa }) => ({ timeS, gaugeKpa: gaugeKpa + 0.05 * noise() })),
        volume,
      );
      expect(Math.abs(fit.residualDeviation - 0.05)).toBeLessThan(0.02);
      if (Math.abs(fit.orificeMm - 0.8) <= fit.uncertaintyMm) covered++;
    }
    // Two standard deviations of a binomial count with p = 0.954 are 8 of 400.
    expect(covered).toBeGreaterThan(draws * 0.954 - 10);
    expect(covered).toBeLessThan(draws * 0.954 + 10);
  });

  it('puts half of the relative uncertainty of the volume into the diameter', () => {
    const samples = emptied(1, 14, 15, 0.2);
    const { uncertaintyMm } = fitDecay(samples, { ...volume, volumeUncertaintyL: 0.08 });
    expect(Math.abs(uncertaintyMm - 0.005)).toBeLessThan(5e-5);
    expect(fitDecay(samples, volume).uncertaintyMm).toBeLessThan(1e-6);
  });

  it('gives no hole for a pressure that does not fall, and says what the scatter could hide', () => {
    const steady = Array.from({ length: 30 }, (_, index) => ({ timeS: index, gaugeKpa: 14 + (index % 2) * 0.01 }));
    const fit = fitDecay(
      steady.map((sample, index) => ({ ...sample, gaugeKpa: sample.gaugeKpa + index * 1e-4 })),
      volume,
    );
    expect(fit.orificeMm).toBe(0);
    expect(fit.leakPaM3PerS).toBe(0);
    expect(fit.uncertaintyMm).toBeGreaterThan(0.005);
    expect(fit.uncertaintyMm).toBeLessThan(0.1);
  });

  it('takes uneven times, a clock that starts anywhere and samples after the end', () => {
    const samples = emptied(1, 14, 40, 0.1).filter((_, index) => index % 7 !== 3 && index % 5 !== 0);
    const fit = fitDecay(
      samples.map(({ timeS, gaugeKpa }) => ({ timeS: timeS + 86_400, gaugeKpa })),
      volume,
    );
    expect(samples.at(-1)?.gaugeKpa).toBeLessThan(1e-5);
    expect(Math.abs(fit.orificeMm - 1)).toBeLessThan(1e-6);
  });

  it('gives finite numbers for whatever falls, and says so when nothing does', () => {
    const thousandths = (min: number, max: number) => fc.integer({ min, max }).map((drawn) => drawn / 1000);
    const rows = fc.array(fc.tuple(thousandths(10, 100_000), thousandths(-1000, 100_000)), {
      minLength: 5,
      maxLength: 30,
    });
    let told = 0;
    fc.assert(
      fc.property(rows, (drawn) => {
        let timeS = 0;
        const samples = drawn.map(([stepS, gaugeKpa]) => ({ timeS: (timeS += stepS), gaugeKpa }));
        fc.pre(samples.filter(({ gaugeKpa }) => gaugeKpa > 2e-6).length >= 3);
        try {
          const fit = fitDecay(samples, volume);
          expect(Object.values(fit).filter((value) => !Number.isFinite(value) || value < 0)).toEqual([]);
          told++;
        } catch (error) {
          expect(error).toBeInstanceOf(RangeError);
          expect(String(error)).toMatch('samples have no gaugeKpa along an emptying curve');
        }
      }),
      { numRuns: 3000 },
    );
    expect(told).toBeGreaterThan(2000);
  });

  it('refuses samples that make no curve', () => {
    const [first, second, third] = [0, 1, 2].map((timeS) => ({ timeS, gaugeKpa: 14 - timeS }));
    expect(() => fitDecay([first!, second!], volume)).toThrow('length of samples is 2; allowed: 3 or more');
    expect(() => fitDecay([first!, second!, second!], volume)).toThrow('timeS of sample 2 is 1; allowed: above 1');
    expect(() => fitDecay([first!, second!, { timeS: 2, gaugeKpa: NaN }], volume)).toThrow('gaugeKpa of sample 2');
    expect(() => fitDecay([first!, second!, { timeS: 2, gaugeKpa: 0 }], volume)).toThrow(
      'count of samples with gaugeKpa above 0.000001 is 2; allowed: 3 or more',
    );
    const spike = [2, 1, 1000].map((gaugeKpa, timeS) => ({ timeS, gaugeKpa: gaugeKpa / 1000 }));
    expect(() => fitDecay(spike, volume)).not.toThrow();
    const good = [first!, second!, third!];
    expect(() => fitDecay(good, { ...volume, volumeUncertaintyL: 9 })).toThrow('volumeUncertaintyL is 9');
    expect(() => fitDecay(good, { ...volume, stationKpa: 0 })).toThrow('stationKpa is 0; allowed: 10 to 200');
    expect(() => fitDecay(good, { ...volume, temperatureC: -274 })).toThrow('temperatureC is -274');
  });
});

/** Normal numbers of mean 0 and deviation 1 by Box and Muller from a minimal standard generator with this seed. */
function normalNoise(seed: number): () => number {
  let state = seed * 7919;
  const uniform = (): number => (state = (state * 16_807) % 2_147_483_647) / 2_147_483_647;
  return () => Math.sqrt(-2 * Math.log(uniform())) * Math.cos(2 * Math.PI * uniform());
}
