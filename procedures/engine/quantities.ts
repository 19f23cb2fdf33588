import type { EntryWay, FoundQuantity, FoundTruth, ReadQuantity, Step } from '../document';
import { findsOf, isFoundQuantity, isFoundTruth, readsOf } from '../document/step-parts';

export { channelsOf, readsOf, resultsOf } from '../document/step-parts';

/** What a step looks for in its series as quantities. */
export function foundQuantitiesOf(step: Step): readonly FoundQuantity[] {
  return findsOf(step).filter(isFoundQuantity);
}

/** The listen step's names for `noise heard` and `noise stopped`. */
export function noiseTruthsOf(step: Step): readonly FoundTruth[] {
  return findsOf(step).filter(isFoundTruth);
}

export function readQuantity(step: Step, name: string): ReadQuantity | undefined {
  return readsOf(step).find((quantity) => quantity.name === name);
}

export function wayOf(quantity: ReadQuantity, id: string | undefined): EntryWay | undefined {
  return id === undefined ? undefined : quantity.ways?.find((way) => way.id === id);
}

/** How many takes a quantity needs in one claim: a way that is computed or entered needs one. */
export function takesNeeded(quantity: ReadQuantity): number {
  return quantity.ways === undefined ? Math.max(1, quantity.takes ?? 1) : 1;
}
