import type { Channel, EntryWay, Found, Quantity, ReadQuantity, Result, Step } from '../document';

/** What a step takes as readings. */
export function readsOf(step: Step): readonly ReadQuantity[] {
  return step.kind === 'reading' || step.kind === 'wait' ? step.reads : [];
}

/** What a step computes when it is done. */
export function resultsOf(step: Step): readonly Result[] {
  return step.kind === 'finding' ? [] : (step.results ?? []);
}

/** What a listen step looks for as quantities. */
export function foundQuantitiesOf(step: Step): readonly Extract<Found, Quantity>[] {
  return step.kind === 'listen' ? step.finds.filter((found): found is Extract<Found, Quantity> => 'unit' in found) : [];
}

/** The listen step's names for `noise heard` and `noise stopped`. */
export function noiseTruthsOf(step: Step): readonly Extract<Found, { what: 'noise-heard' | 'noise-stopped' }>[] {
  return step.kind === 'listen'
    ? step.finds.filter(
        (found): found is Extract<Found, { what: 'noise-heard' | 'noise-stopped' }> => !('unit' in found),
      )
    : [];
}

export function channelsOf(step: Step): readonly Channel[] {
  return step.kind === 'listen' ? step.channels : [];
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
