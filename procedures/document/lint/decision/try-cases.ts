import { factsOf, type Beforehand, type Fact } from './decision-facts';
import type { Wanted } from './find-case';
import { fails, holds, PossibleTruths, untold } from './possible-truths';

/** So many cases are drawn where they are too many to be gone through. */
export const casesDrawn = 2_000;

/** Whether a case that is drawn by lot is one that is wanted; the lot is the same each time. */
export function isFoundByLot(wanted: Wanted, beforehand: Beforehand): boolean {
  const conditions = [...wanted.not, ...(wanted.holding === undefined ? [] : [wanted.holding])];
  const facts = factsOf(conditions, beforehand);
  const truths = new PossibleTruths(facts, beforehand);
  const lot = new Lot(1);
  for (let drawn = 0; drawn < casesDrawn; drawn += 1) {
    const settled = new Map([...facts].map(([key, fact]): [string, number] => [key, lot.below(sizeOf(fact))]));
    const isMissed = wanted.not.every((condition) => !(truths.of(condition, settled) & holds));
    const isTaken = wanted.holding === undefined || !(truths.of(wanted.holding, settled) & (fails | untold));
    const isReal = conditions.every((condition) => truths.of(condition, settled) !== 0);
    if (isMissed && isTaken && isReal) return true;
  }
  return false;
}

const sizeOf = ({ size }: Fact): number => size;

/** A linear congruential generator (Knuth, The Art of Computer Programming, vol. 2, 3.3.4, line 26): seeded, so that a document is always judged alike. */
class Lot {
  constructor(private state: number) {}

  below(size: number): number {
    this.state = (Math.imul(this.state, 1_664_525) + 1_013_904_223) >>> 0;
    return Math.floor((this.state / 4_294_967_296) * size);
  }
}
