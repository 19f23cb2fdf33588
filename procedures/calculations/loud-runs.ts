/** The two levels that a sound is told apart by, dB. */
export interface TwoLevels {
  readonly loudDb: number;
  readonly quietDb: number;
  /** Standard deviation of a sample about either. */
  readonly scatterDb: number;
}

/** A stretch of the series in which it is loud: value[from..to). */
export interface LoudRun {
  readonly from: number;
  readonly to: number;
}

/** What one change of level costs, as the negative logarithm of its likelihood: once in fifty samples. */
const changeCost = 4;
/** Beyond so many standard deviations a sample hardly speaks any louder, only enough to tell which level is nearer. */
const loudestDeviations = 5;
const beyondCost = 0.1;

/**
 * Gives the loud stretches of value[from..to): the most likely sequence of loud and quiet where both levels and the
 * scatter are known and every change has a price. Louder than loud is as good as loud, and quieter than quiet as good
 * as quiet; a sample for which `isLeftOut` holds tells nothing.
 *
 * Linear time. Source: the Viterbi algorithm (Viterbi, 1967; Forney, 1973) for a chain of two states.
 */
export function loudRuns(
  value: Float64Array,
  from: number,
  to: number,
  { loudDb, quietDb, scatterDb }: TwoLevels,
  isLeftOut: (index: number) => boolean,
): LoudRun[] {
  // cameFromLoud[state][k]: whether the best way to be in that state at from + k was loud before.
  const loudCameFromLoud = new Uint8Array(to - from);
  const quietCameFromLoud = new Uint8Array(to - from);
  const costOf = (offDb: number): number => {
    const deviations = Math.max(0, offDb / scatterDb);
    return Math.min(deviations, loudestDeviations) ** 2 / 2 + beyondCost * Math.max(0, deviations - loudestDeviations);
  };
  let [loud, quiet] = [0, 0];
  for (let index = from; index < to; index++) {
    const level = value[index] ?? NaN;
    const told = isLeftOut(index) ? 0 : 1;
    loudCameFromLoud[index - from] = loud <= quiet + changeCost ? 1 : 0;
    quietCameFromLoud[index - from] = loud + changeCost < quiet ? 1 : 0;
    [loud, quiet] = [
      Math.min(loud, quiet + changeCost) + told * costOf(loudDb - level),
      Math.min(quiet, loud + changeCost) + told * costOf(level - quietDb),
    ];
  }
  const runs: LoudRun[] = [];
  let isLoud = loud < quiet;
  let end = to;
  for (let index = to - 1; index >= from; index--) {
    const wasLoud = (isLoud ? loudCameFromLoud : quietCameFromLoud)[index - from] === 1;
    if (wasLoud === isLoud && index > from) continue;
    if (isLoud) runs.push({ from: index, to: end });
    end = index;
    isLoud = wasLoud;
  }
  return runs.reverse();
}
