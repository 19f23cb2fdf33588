import type { Fact } from './decision-facts';
import { isPossible, type Wanted } from './find-case';
import { fails, holds, untold } from './possible-truths';

/** So many cases are drawn where they are too many to be gone through. */
export const casesDrawn = 2_000;

/** Whether a case that is drawn by lot is one that is wanted; the lot is the same each time. */
export function isFoundByLot({ not, holding }: Wanted, facts: ReadonlyMap<string, Fact>): boolean {
  const lot = new Lot(1);
  for (let drawn = 0; drawn < casesDrawn; drawn += 1) {
    const settled = new Map([...facts].map(([key, { size }]): [string, number] => [key, lot.below(size)]));
    const isReal = [...facts].every(([key, fact]) => isPossible(fact, settled.get(key) ?? 0));
    const isMissed = not.every(({ truths }) => {
      const may = truths(settled);
      return may !== 0 && !(may & holds);
    });
    const may = holding === undefined ? holds : holding.truths(settled);
    if (isReal && isMissed && may & holds && !(may & (fails | untold))) return true;
  }
  return false;
}

/** A linear congruential generator (Knuth, The Art of Computer Programming, vol. 2, 3.3.4): a document is always judged alike. */
class Lot {
  constructor(private state: number) {}

  below(size: number): number {
    this.state = (Math.imul(this.state, 1_664_525) + 1_013_904_223) >>> 0;
    return Math.floor((this.state / 4_294_967_296) * size);
  }
}
