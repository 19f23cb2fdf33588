import type { Expression } from '../../expression/expression';
import type { Beforehand, Fact } from './decision-facts';
import { fails, holds, PossibleTruths, untold } from './possible-truths';

/** A case that was found, by its facts; that there is none; or that too much would have to be tried. */
export type Search =
  { readonly found: 'case'; readonly settled: ReadonlyMap<string, number> } | { readonly found: 'none' | 'open' };

/** What is asked for: a case in which the first conditions do not hold and, where there is one, the last does. */
export interface Wanted {
  readonly not: readonly Expression[];
  readonly holding?: Expression;
  /** Which values of a fact are looked at; all, if it is not given. */
  readonly allows?: (fact: Fact, value: number) => boolean;
}

/** So many cases are looked at for one question at most: a condition of twelve free truths has 4,096. */
const mostTried = 5_000;

/**
 * Looks for a case by settling one fact after the other and leaving what cannot lead to one (branch and prune). Where
 * it finds none there is none: a figure that is cut at what it is compared with has no other cases.
 */
export function findCase(wanted: Wanted, facts: ReadonlyMap<string, Fact>, beforehand: Beforehand): Search {
  const truths = new PossibleTruths(facts, beforehand);
  const order = [...facts.entries()];
  const settled = new Map<string, number>();
  let tried = 0;

  const look = (depth: number): Search => {
    tried += 1;
    if (tried > mostTried) return { found: 'open' };
    const last = wanted.holding === undefined ? holds : truths.of(wanted.holding, settled);
    if (!(last & holds)) return { found: 'none' };
    let isSettled = last === holds;
    for (const condition of wanted.not) {
      const may = truths.of(condition, settled);
      if (!(may & (fails | untold))) return { found: 'none' };
      if (may & holds) isSettled = false;
    }
    const next = order[depth];
    if (next === undefined) return isSettled ? { found: 'case', settled: new Map(settled) } : { found: 'open' };
    const [key, fact] = next;
    let isOpen = false;
    for (let value = 0; value < fact.size; value += 1) {
      if (!isPossible(fact, value) || wanted.allows?.(fact, value) === false) continue;
      settled.set(key, value);
      const below = look(depth + 1);
      settled.delete(key);
      if (below.found === 'case') return below;
      if (below.found === 'open') isOpen = true;
      if (tried > mostTried) return { found: 'open' };
    }
    return { found: isOpen ? 'open' : 'none' };
  };
  return look(0);
}

/** A cell between two figures that meet is empty, and so is one beyond what can be believed. */
function isPossible(fact: Fact, value: number): boolean {
  if (fact.fact !== 'cell') return true;
  const cell = fact.cells[value];
  return cell !== undefined && (value % 2 === 0 ? cell.low < cell.high : cell.low <= cell.high);
}
