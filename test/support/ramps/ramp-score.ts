import { findSealPoint, sealPointFromMarks, type SealPoint } from '../../../procedures/calculations';
import { seededRandom } from './seeded-random';
import { simulateRamp, type RampKind, type SimulatedRamp } from './simulated-ramp';

/** How the analysis did on many ramps of one condition. */
export interface RampScore {
  readonly condition: string;
  readonly ramps: number;
  /** Of all ramps, those that were called sealed. */
  readonly sealed: number;
  /** Of these, with the truth inside the stated uncertainty. */
  readonly covered: number;
  /** Error of the pressure: its mean, and the mean of its size; kPa. NaN where nothing sealed. */
  readonly meanErrorKpa: number;
  readonly meanSizeKpa: number;
  readonly worstKpa: number;
  readonly meanUncertaintyKpa: number;
  /** Why the others were not, and how often. */
  readonly refusals: Readonly<Record<string, number>>;
}

type Analysis = (ramp: SimulatedRamp, seed: number) => SealPoint;

/** The analysis of the sound. */
export const bySound: Analysis = ({ samples, stationKpa }) => findSealPoint(samples, { stationKpa });

/**
 * A person who listens. Reacting to a sound takes 0.19 s, choosing what it was 0.28 s (mean values, "A study on
 * measurement of auditory reaction time", Nihon Jibiinkoka Gakkai Kaiho 93(5), 746-755); to be sure of a hiss that went
 * away and tap a glass takes more: here 0.45 s in the middle and 0.2 to 1 s for 95 of 100, evenly in the logarithm
 * about that as reaction times are (our choice, no source).
 */
export const byMarks: Analysis = ({ samples, stationKpa, restS, seal }, seed) => {
  const random = seededRandom(seed + 0x5eed);
  const reactionS = (): number => 0.45 * Math.exp(random.normal(0.41));
  const endS = samples.at(-1)?.timeS ?? 0;
  return sealPointFromMarks(samples, {
    noiseBeginsS: restS + 1 + reactionS(),
    noiseStopsS: Math.min(endS, (seal?.timeS ?? endS) + reactionS()),
    stationKpa,
  });
};

/** Runs each of the analyses on the ramps number `firstSeed` and following; gives their scores in that order. */
export function scoreRamps(
  [condition, kind]: readonly [string, RampKind],
  ramps: number,
  firstSeed: number,
  analyses: readonly Analysis[] = [bySound],
): RampScore[] {
  const tallies = analyses.map(() => new Tally());
  for (let seed = firstSeed; seed < firstSeed + ramps; seed++) {
    const ramp = simulateRamp(kind, seed);
    for (const [index, analysis] of analyses.entries()) tallies[index]?.count(analysis(ramp, seed), ramp);
  }
  return tallies.map((tally) => tally.score(condition, ramps));
}

class Tally {
  private readonly errors: number[] = [];
  private readonly refusals: Record<string, number> = {};
  private sealed = 0;
  private covered = 0;
  private uncertainties = 0;

  count(found: SealPoint, { seal }: SimulatedRamp): void {
    if (!found.sealed) {
      this.refusals[found.reason] = (this.refusals[found.reason] ?? 0) + 1;
      return;
    }
    this.sealed++;
    this.uncertainties += found.uncertaintyKpa;
    if (seal === undefined) return;
    const errorKpa = found.aboveStationKpa - seal.aboveStationKpa;
    this.errors.push(errorKpa);
    if (Math.abs(errorKpa) <= found.uncertaintyKpa) this.covered++;
  }

  score(condition: string, ramps: number): RampScore {
    const { errors, refusals, sealed, covered } = this;
    const mean = (values: readonly number[]): number => values.reduce((sum, value) => sum + value, 0) / values.length;
    return {
      condition,
      ramps,
      sealed,
      covered,
      meanErrorKpa: mean(errors),
      meanSizeKpa: mean(errors.map(Math.abs)),
      worstKpa: Math.max(...errors.map(Math.abs)),
      meanUncertaintyKpa: this.uncertainties / sealed,
      refusals,
    };
  }
}
