import type { Fact } from './decision-facts';
import { fails, holds, untold, type PossibleTruths } from './possible-truths';

/** A condition, and the keys of the facts that it turns on. */
export interface PreparedCondition {
  readonly truths: PossibleTruths;
  readonly keys: readonly string[];
}

/** What is asked for: a case in which the first conditions do not hold and, where there is one, the last does. */
export interface Wanted {
  readonly not: readonly PreparedCondition[];
  readonly holding?: PreparedCondition;
  /** Which values of a fact are looked at; all, if it is not given. */
  readonly allows?: (fact: Fact, value: number) => boolean;
}

/** A case was found, there is none, or too much would have to be tried. */
export type Search = 'case' | 'none' | 'open';

/** So many cases are looked at for one question at most: a condition of twelve free truths has 4,096. */
const mostTried = 5_000;

/**
 * Looks for a case by settling one fact after the other and leaving what cannot lead to one (branch and prune). Where
 * it finds none there is none: a figure that is cut at what it is compared with has no other cases.
 */
export function findCase({ not, holding, allows }: Wanted, facts: ReadonlyMap<string, Fact>): Search {
  const settled = new Map<string, number>();
  let tried = 0;

  /** Facts settled since a condition was done with may show that it cannot be so: p above q, p on 1, q above 1. */
  const isConsistent = (): boolean => not.every(({ truths }) => truths(settled) !== 0);

  /** `open` are the conditions that may hold yet; one that can no longer hold is done with. */
  const look = (open: readonly PreparedCondition[]): Search => {
    tried += 1;
    if (tried > mostTried) return 'open';
    const last = holding === undefined ? holds : holding.truths(settled);
    if (!(last & holds)) return 'none';
    const left: PreparedCondition[] = [];
    for (const condition of open) {
      const may = condition.truths(settled);
      if (!(may & (fails | untold))) return 'none';
      if (may & holds) left.push(condition);
    }
    const asked = holding === undefined || last === holds ? left : [holding, ...left];
    const key = asked.flatMap(({ keys }) => keys).find((candidate) => !settled.has(candidate));
    const fact = key === undefined ? undefined : facts.get(key);
    if (asked.length === 0) return isConsistent() ? 'case' : 'none';
    if (key === undefined || fact === undefined) return 'open';
    let isOpen = false;
    for (let value = 0; value < fact.size; value += 1) {
      if (!isPossible(fact, value) || allows?.(fact, value) === false) continue;
      settled.set(key, value);
      const below = look(left);
      settled.delete(key);
      if (below === 'case') return 'case';
      if (below === 'open') isOpen = true;
      if (tried > mostTried) return 'open';
    }
    return isOpen ? 'open' : 'none';
  };
  return look(not);
}

/** A cell between two figures that meet is empty, and so is one beyond what can be believed. */
export function isPossible(fact: Fact, value: number): boolean {
  if (fact.fact !== 'cell') return true;
  const cell = fact.cells[value];
  return cell !== undefined && cell.low <= cell.high;
}
