import { type RampSample } from '../../../procedures/calculations';
import { recordOf, type Sampling, type Sensors, type SoundScene } from './recording';
import { seededRandom, type SeededRandom } from './seeded-random';
import { planSupply, type SupplyKind } from './supply-plan';
import { orificeGps, runTract, supplyToHoldKpa, type Tract, type TractHistory, type Valve } from './tract-model';

/** What kind of ramp to draw; everything else is drawn from the ranges below. */
export interface RampKind {
  readonly valve: 'seals' | 'chatters-then-seals' | 'stays-open' | 'chatters-stays-open' | 'sealed-from-the-start';
  readonly supply?: SupplyKind;
  readonly gear?: 'fine-gauge' | 'gauge' | 'bus' | 'coarse-bus';
  /** How far the sound level falls at the seal; 6 to 25 dB when it is left out. */
  readonly dropDb?: readonly [low: number, high: number];
  /** Whether the bay's own noise rises and falls. */
  readonly floorDrifts?: boolean;
  readonly coughs?: boolean;
  /** Largest share by which the intervals differ; a tenth when it is left out. */
  readonly jitterShare?: number;
  readonly gaps?: 'anywhere' | 'at-the-seal';
}

/** A ramp as the instruments recorded it, beside what was true. */
export interface SimulatedRamp {
  readonly samples: readonly RampSample[];
  readonly stationKpa: number;
  readonly restS: number;
  /** Undefined for a valve that never shuts while somebody listens. */
  readonly seal: { readonly timeS: number; readonly aboveStationKpa: number } | undefined;
}

const stationKpa = 93.9;

// The ranges are those of the recorded ramps beside this and of the trade (common practice, no source): a valve that
// seals at 1.5 to 6.5 kPa, raised within 20 to 60 s, in a tract of 5 to 10 L.
function drawTract(random: SeededRandom): Tract {
  return {
    volumeL: random.between(5, 10),
    hoseMm2: random.between(11, 20),
    valveMm2: random.between(5, 14),
    leakMm2: random.between(0.8, 1.8),
    temperatureK: random.between(283, 308),
  };
}

function drawValve({ valve }: RampKind, sealKpa: number, random: SeededRandom): Valve {
  switch (valve) {
    case 'seals':
      return {
        kind: 'seals',
        sealKpa,
        travelKpa: random.between(0.005, 0.2),
        reopensKpa: random.between(0.3, 1),
      };
    case 'stays-open':
      return { kind: 'open' };
    case 'sealed-from-the-start':
      return { kind: 'shut' };
    case 'chatters-then-seals':
    case 'chatters-stays-open': {
      const endsShut = valve === 'chatters-then-seals';
      const turns = Array.from({ length: random.whole(2, 6) }, () => [
        random.between(0.1, 0.6),
        endsShut || random.chance(0.7) ? random.between(0.15, 1) : random.between(2, 6),
      ]);
      return { kind: 'chatters', fromKpa: sealKpa, shutThenOpenS: turns.flat(), endsShut };
    }
  }
}

function drawSensors({ gear = 'gauge' }: RampKind, random: SeededRandom): Sensors {
  const isGauge = gear === 'gauge' || gear === 'fine-gauge';
  return {
    gauge: isGauge ? { scatterKpa: random.between(0.01, 0.05), stepKpa: gear === 'gauge' ? 0.1 : 0.01 } : undefined,
    map: {
      scatterKpa: random.between(0.03, 0.1),
      stepKpa: gear === 'coarse-bus' ? 1 : 0.1,
      offsetKpa: random.between(-0.6, 0.6),
    },
  };
}

const sumDb = (firstDb: number, secondDb: number): number =>
  10 * Math.log10(10 ** (firstDb / 10) + 10 ** (secondDb / 10));

function drawFloor(kind: RampKind, baseDb: number, endS: number, random: SeededRandom): (timeS: number) => number {
  if (kind.floorDrifts !== true) return () => baseDb;
  const [trendDb, swingDb] = [random.between(-4, 4), random.between(1, 3)];
  const [periodS, phase] = [random.between(15, 60), random.between(0, 2 * Math.PI)];
  return (timeS) => baseDb + trendDb * (timeS / endS) + swingDb * Math.sin((2 * Math.PI * timeS) / periodS + phase);
}

/** Short and loud; never nearer to the seal than half a second, for then nobody could tell what was heard. */
function drawCoughs(eventS: number, restS: number, endS: number, loudestDb: number, random: SeededRandom) {
  const cough = (fromS: number) => ({
    fromS,
    toS: fromS + random.between(0.2, 0.8),
    levelDb: loudestDb + random.between(5, 20),
  });
  const before = Array.from({ length: random.whole(1, 2) }, () => cough(random.between(restS + 1, eventS - 1.3)));
  const after = Array.from({ length: random.whole(1, 2) }, () => cough(random.between(eventS + 0.5, endS - 1)));
  return [...before, ...after];
}

/** Silences of the recorder, of half a second to three seconds. */
function drawGaps({ gaps }: RampKind, eventS: number, endS: number, random: SeededRandom): Sampling['gaps'] {
  if (gaps === undefined) return [];
  const gap = (aroundS: number) => {
    const lengthS = random.between(0.5, 3);
    const fromS = aroundS - lengthS * random.between(0, 1);
    return { fromS, toS: fromS + lengthS };
  };
  if (gaps === 'at-the-seal') return [gap(eventS)];
  return Array.from({ length: random.whole(2, 5) }, () => gap(random.between(0, endS)));
}

function drawScene(
  kind: RampKind,
  {
    tract,
    sealKpa,
    eventS,
    restS,
    endS,
  }: { tract: Tract; sealKpa: number; eventS: number; restS: number; endS: number },
  random: SeededRandom,
): SoundScene {
  const floorDb = random.between(40, 55);
  const leakDb = floorDb + random.between(-10, 6);
  const [low, high] = kind.dropDb ?? [6, 25];
  const valveDb = sumDb(floorDb, leakDb) + random.between(low, high);
  return {
    floorDb: drawFloor(kind, floorDb, endS, random),
    valveDb,
    valveGps: orificeGps(tract, tract.valveMm2, sealKpa),
    leakDb,
    leakGps: orificeGps(tract, tract.leakMm2, sealKpa),
    scatterDb: random.between(0.3, 1.5),
    bursts: kind.coughs === true ? drawCoughs(eventS, restS, endS, valveDb, random) : [],
  };
}

/** Draws a ramp: the same one for the same kind and seed. */
export function simulateRamp(kind: RampKind, seed: number): SimulatedRamp {
  const random = seededRandom(seed);
  const tract = drawTract(random);
  const sealKpa = random.between(1.5, 6.5);
  const [restS, rampS] = [random.between(6, 12), random.between(20, 60)];
  const passesTarget = kind.valve === 'seals' || kind.valve === 'chatters-then-seals';
  const targetKpa = supplyToHoldKpa(tract, sealKpa);
  const frame = { restS, targetKpa, rampS, afterS: random.between(10, 25), passesTarget };
  const { supplyKpa, endS } = planSupply(kind.supply ?? 'steady', frame, random);
  const history: TractHistory = runTract(tract, drawValve(kind, sealKpa, random), supplyKpa, endS);
  if (passesTarget !== (history.seal !== undefined)) throw new Error(`Seed ${seed} did not do what it was made for.`);
  const eventS = history.seal?.timeS ?? restS + rampS;
  const scene = drawScene(kind, { tract, sealKpa, eventS, restS, endS }, random);
  const sampling: Sampling = {
    rateHz: random.decade(5, 50),
    jitterShare: kind.jitterShare ?? 0.1,
    gaps: drawGaps(kind, eventS, endS, random),
  };
  return {
    samples: recordOf(history, scene, drawSensors(kind, random), sampling, random),
    stationKpa,
    restS,
    seal: history.seal && { timeS: history.seal.timeS, aboveStationKpa: history.seal.gaugeKpa },
  };
}
