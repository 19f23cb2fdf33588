import { type RampSample } from '../../../procedures/calculations';
import { type SeededRandom } from './seeded-random';
import { type TractHistory } from './tract-model';

/** How the bay and the hiss sound. */
export interface SoundScene {
  /** The bay without any hiss, dB, by the second. */
  readonly floorDb: (timeS: number) => number;
  /** Levels of the two hisses at the flows that they have at the seal point, dB. */
  readonly valveDb: number;
  readonly valveGps: number;
  readonly leakDb: number;
  readonly leakGps: number;
  /** Scatter of the meter, dB. */
  readonly scatterDb: number;
  readonly bursts: readonly { readonly fromS: number; readonly toS: number; readonly levelDb: number }[];
}

/** How the sensors read; a step of 0 leaves the value as it is. */
export interface Sensors {
  readonly gauge: { readonly scatterKpa: number; readonly stepKpa: number } | undefined;
  readonly map: { readonly scatterKpa: number; readonly stepKpa: number; readonly offsetKpa: number };
}

/** When samples are taken. */
export interface Sampling {
  readonly rateHz: number;
  /** Each interval is longer or shorter by up to this share. */
  readonly jitterShare: number;
  readonly gaps: readonly { readonly fromS: number; readonly toS: number }[];
}

const stationKpa = 93.9;

/** The loudness of a jet of air grows by so many dB for ten times the flow, as in the recorded ramps beside this. */
const hissDbPerDecade = 24;
const power = (levelDb: number): number => 10 ** (levelDb / 10);

function hissPower(gps: number, atGps: number, levelDb: number): number {
  return gps > 1e-4 && atGps > 0 ? power(levelDb + hissDbPerDecade * Math.log10(gps / atGps)) : 0;
}

const toStep = (value: number, step: number): number => (step > 0 ? Math.round(value / step) * step : value);

/** Draws what the instruments would have recorded of a history. */
export function recordOf(
  { gaugeKpa, valveGps, leakGps, stepS }: TractHistory,
  scene: SoundScene,
  sensors: Sensors,
  { rateHz, jitterShare, gaps }: Sampling,
  random: SeededRandom,
): RampSample[] {
  const samples: RampSample[] = [];
  const endS = (gaugeKpa.length - 1) * stepS;
  for (let timeS = 0; timeS < endS; timeS += (1 + random.between(-jitterShare, jitterShare)) / rateHz) {
    if (gaps.some(({ fromS, toS }) => timeS > fromS && timeS < toS)) continue;
    const index = Math.round(timeS / stepS);
    const truthKpa = gaugeKpa[index] ?? NaN;
    let soundPower =
      power(scene.floorDb(timeS)) +
      hissPower(valveGps[index] ?? NaN, scene.valveGps, scene.valveDb) +
      hissPower(leakGps[index] ?? NaN, scene.leakGps, scene.leakDb);
    for (const { fromS, toS, levelDb } of scene.bursts) {
      if (timeS >= fromS && timeS < toS) soundPower += power(levelDb);
    }
    const { gauge, map } = sensors;
    samples.push({
      timeS,
      ...(gauge && { gaugeKpa: toStep(truthKpa + random.normal(gauge.scatterKpa), gauge.stepKpa) }),
      mapKpa: toStep(stationKpa + truthKpa + map.offsetKpa + random.normal(map.scatterKpa), map.stepKpa),
      soundDb: toStep(10 * Math.log10(soundPower) + random.normal(scene.scatterDb), 0.1),
    });
  }
  return samples;
}
