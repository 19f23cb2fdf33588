import type { Expression } from '../../expression/expression';
import { factsOf, type Beforehand, type Fact } from './decision-facts';
import { findCase, type PreparedCondition } from './find-case';
import { possibleTruths } from './possible-truths';
import { isFoundByLot } from './try-cases';

/** Whether a branch can be the first that holds; `unlikely` where neither a case nor a proof was found. */
export type Taken = 'can-be' | 'never' | 'unlikely';

/** An ordered list of conditions, asked about all cases that there can be. */
export class DecisionCases {
  private readonly facts: ReadonlyMap<string, Fact>;
  private readonly conditions: readonly PreparedCondition[];

  constructor(conditions: readonly Expression[], beforehand: Beforehand) {
    const facts = factsOf(conditions, beforehand);
    this.facts = facts;
    this.conditions = conditions.map((condition) => ({
      truths: possibleTruths(condition, facts, beforehand),
      keys: [...factsOf([condition], beforehand).keys()],
    }));
  }

  /** Whether a run can take the branch, as far as its own condition and those before it tell. */
  taken(index: number): Taken {
    return this.takenAfter(index, this.conditions.slice(0, index));
  }

  /** Why a branch is never taken: nothing makes it hold, one earlier branch takes all that it would, or several do. */
  whyNever(index: number): 'never-holds' | { readonly behind: number } | 'behind-several' {
    if (this.takenAfter(index, []) === 'never') return 'never-holds';
    const behind = this.conditions
      .slice(0, index)
      .findIndex((condition) => this.takenAfter(index, [condition]) === 'never');
    return behind < 0 ? 'behind-several' : { behind };
  }

  /**
   * Whether, of all measured values, only those exactly on a figure hold none of the conditions: an end that was left
   * out of both sides.
   */
  missesOnlyPoints(): boolean {
    if (![...this.facts.values()].some(({ fact }) => fact === 'cell' || fact === 'order')) return false;
    const besidePoints = findCase({ not: this.conditions, allows: isBesidePoint }, this.facts);
    return besidePoints === 'none' && findCase({ not: this.conditions, allows: isMeasured }, this.facts) === 'case';
  }

  private takenAfter(index: number, not: readonly PreparedCondition[]): Taken {
    const holding = this.conditions[index];
    if (holding === undefined) return 'can-be';
    const found = findCase({ not, holding }, this.facts);
    if (found !== 'open') return found === 'none' ? 'never' : 'can-be';
    return isFoundByLot({ not, holding }, this.facts) ? 'can-be' : 'unlikely';
  }
}

function isMeasured(fact: Fact, value: number): boolean {
  if (fact.fact === 'measured') return value === 1;
  return fact.fact !== 'order' || value !== 3;
}

function isBesidePoint(fact: Fact, value: number): boolean {
  if (fact.fact === 'cell') return value % 2 === 0;
  return isMeasured(fact, value) && (fact.fact !== 'order' || value !== 1);
}
