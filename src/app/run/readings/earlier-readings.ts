import type { EventOf, Take } from '../../../../procedures/engine/showing';
import type { RunView } from '../run-view';
import { fromBase } from '../../../../procedures/calculations/for-a-run';
import type { ReadQuantity } from '../../../../procedures/document';

/** What was recorded last for a quantity before the step was claimed this time: its figure as it was typed. */
export function readingBefore({ events, state }: RunView, name: string): string | undefined {
  const claimedSeq = state.current?.claimedSeq ?? Number.POSITIVE_INFINITY;
  const earlier = events.filter(
    (event): event is EventOf<'reading-recorded'> =>
      event.type === 'reading-recorded' && event.seq < claimedSeq && event.data.name === name,
  );
  return earlier.at(-1)?.data.figure.text;
}

/** The takes of this claim. */
export function takesOf({ state }: Pick<RunView, 'state'>, name: string): readonly Take[] {
  return state.current?.takes[name] ?? [];
}

/** Mean and spread of several takes in the quantity's unit, `94.1, spread 0.2`; undefined for fewer than two. */
export function meanAndSpread({ state }: Pick<RunView, 'state'>, quantity: ReadQuantity): string | undefined {
  const value = state.values[quantity.name];
  if (value === undefined || value.takes < 2) return undefined;
  const spread = fromBase(value.spread, value.unit) - fromBase(0, value.unit);
  return `mean ${value.text}, spread ${spread.toPrecision(1)}`;
}
