import * as fc from 'fast-check';
import { decayLeakRate, fitDecay, orificeDiameter, orificeMassFlow } from '../../../procedures/calculations';
import { between, expectClose, thousands } from './runs';

const gasConstant = 287.05287;
const setup = fc.record({
  diameterMm: between(0.2, 3),
  volumeL: between(1, 50),
  stationKpa: between(70, 105),
  temperatureC: between(-10, 50),
  startKpa: between(2, 300),
});
type Setup = typeof setup extends fc.Arbitrary<infer S> ? S : never;

/** Litres times kilopascals a second that the hole takes at this gauge pressure. */
function throughput({ diameterMm, stationKpa, temperatureC }: Setup, gaugeKpa: number): number {
  if (gaugeKpa <= 0) return 0;
  const upstreamKpa = stationKpa + gaugeKpa;
  const { gps } = orificeMassFlow({ diameterMm, upstreamKpa, downstreamKpa: stationKpa, upstreamC: temperatureC });
  return (gps / 1000) * gasConstant * (temperatureC + 273.15);
}

/** The first of `count` gauge pressures at equal times until about half is gone, by Runge and Kutta's fourth order. */
function integrated(vessel: Setup, count: number, kept = count): { timeS: number; gaugeKpa: number }[] {
  const slope = (gaugeKpa: number) => -throughput(vessel, gaugeKpa) / vessel.volumeL;
  const stepS = (0.7 * vessel.startKpa) / -slope(vessel.startKpa) / count;
  let gaugeKpa = vessel.startKpa;
  return Array.from({ length: kept }, (_, index) => {
    const sample = { timeS: index * stepS, gaugeKpa };
    const k1 = slope(gaugeKpa);
    const k2 = slope(gaugeKpa + (stepS / 2) * k1);
    const k3 = slope(gaugeKpa + (stepS / 2) * k2);
    const k4 = slope(gaugeKpa + stepS * k3);
    gaugeKpa += (stepS / 6) * (k1 + 2 * k2 + 2 * k3 + k4);
    return sample;
  });
}

describe('fitDecay against numeric integration', () => {
  it('finds the hole of any vessel, choked or not', () => {
    fc.assert(
      fc.property(setup, (vessel) => {
        const fit = fitDecay(integrated(vessel, 60), vessel);
        expectClose(fit.orificeMm / vessel.diameterMm, 1, 1e-6);
        expectClose(fit.leakPaM3PerS / throughput(vessel, vessel.startKpa), 1, 1e-6);
      }),
      { numRuns: 2000 },
    );
  });

  it('agrees with the closed form where the flow stays choked: p = p0 exp(-k t)', () => {
    fc.assert(
      fc.property(setup, (vessel) => {
        const { diameterMm, volumeL, stationKpa, temperatureC } = vessel;
        const area = (Math.PI / 4) * (diameterMm / 1000) ** 2;
        // 0.68473146 is the choked flow function of gamma 1.4 (NACA Report 1135).
        const k = (area * Math.sqrt(gasConstant * (temperatureC + 273.15)) * 0.68473146) / (volumeL / 1000);
        const startKpa = 6 * stationKpa;
        // From six to two station pressures: the critical ratio is 1.893.
        const samples = Array.from({ length: 40 }, (_, index) => {
          const timeS = (index * Math.log(3)) / k / 39;
          return { timeS, gaugeKpa: startKpa * Math.exp(-k * timeS) - stationKpa };
        });
        expectClose(fitDecay(samples, vessel).orificeMm / diameterMm, 1, 1e-7);
      }),
      { numRuns: 2000 },
    );
  });
});

describe('decayLeakRate against the flow through a hole', () => {
  it('is the throughput of the hole over a short time, and gives its diameter back', () => {
    fc.assert(
      fc.property(setup, (vessel) => {
        const { stationKpa, temperatureC, volumeL, startKpa, diameterMm } = vessel;
        const [first, , third] = integrated(vessel, 2001, 3);
        const rate = decayLeakRate({
          volumeL,
          startKpa: stationKpa + startKpa,
          endKpa: stationKpa + third!.gaugeKpa,
          startC: temperatureC,
          endC: temperatureC,
          seconds: Math.max(0.001, third!.timeS - first!.timeS),
          referenceC: temperatureC,
        });
        fc.pre(third!.timeS > 0.001);
        // The pressure falls by 0.07 % meanwhile, and the flow with it.
        expectClose(rate.paM3PerS / throughput(vessel, startKpa), 1, 1e-3);
        const flowGps = (rate.paM3PerS / (gasConstant * (temperatureC + 273.15))) * 1000;
        const upstreamKpa = stationKpa + startKpa;
        const back = orificeDiameter({ flowGps, upstreamKpa, downstreamKpa: stationKpa, upstreamC: temperatureC });
        expectClose(back / diameterMm, 1, 1e-3);
      }),
      { numRuns: 500 },
    );
  });

  it('says the same in its two units: 592.154 standard cm3/min to the Pa m3/s at 0 degC', () => {
    const kpa = between(0, 500);
    fc.assert(
      fc.property(kpa, kpa, between(-40, 120), between(-40, 120), (startKpa, endKpa, startC, endC) => {
        const rate = decayLeakRate({ volumeL: 8, startKpa, endKpa, startC, endC, seconds: 60 });
        expectClose(rate.standardCm3PerMin, rate.paM3PerS * 592.15396, 1e-8);
      }),
      thousands,
    );
  });
});
