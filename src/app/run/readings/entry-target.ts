import { unitKind, type UnitName } from '../../../../procedures/calculations/for-a-run';
import type { EntryWay, PressureSense, ReadQuantity } from '../../../../procedures/document';
import type { InstrumentSnapshot, RunState } from '../../../../procedures/engine/showing';

/** What is typed for a quantity: itself, or what one of its ways asks for. */
export interface EntryTarget {
  readonly label: string;
  /** As the instrument shows it, so that nobody converts at the car. */
  readonly unit: UnitName;
  readonly sense: PressureSense | undefined;
  /** The instrument's marking and the step of its display. */
  readonly instrument: { readonly label: string; readonly resolution: number } | undefined;
  readonly hint: string | undefined;
}

/** What is to be typed, by the chosen way; undefined while a way has to be chosen, or where it needs no entry. */
export function entryTarget(
  state: Pick<RunState, 'gear'>,
  quantity: ReadQuantity,
  way: EntryWay | undefined,
): EntryTarget | undefined {
  if (quantity.ways === undefined) return target(state, { ...quantity, hint: undefined });
  return way?.entry === undefined ? undefined : target(state, { ...way.entry, hint: way.hint });
}

interface Asked {
  readonly label: string;
  readonly unit: UnitName;
  readonly sense?: PressureSense;
  readonly gear?: string;
  readonly hint: string | undefined;
}

function target(state: Pick<RunState, 'gear'>, { label, unit, sense, gear, hint }: Asked): EntryTarget {
  const instrument = gear === undefined ? undefined : state.gear[gear];
  const range = instrument === undefined ? undefined : rangeIn(instrument, unit, sense);
  return {
    label: withSense(label, sense),
    unit: range?.unit ?? unit,
    sense,
    instrument:
      instrument === undefined || range === undefined
        ? undefined
        : { label: instrument.label, resolution: range.resolution },
    hint,
  };
}

/** `Manifold pressure, absolute`: the sense is said wherever the label does not say it itself. */
function withSense(label: string, sense: PressureSense | undefined): string {
  return sense === undefined || label.toLowerCase().includes(sense) ? label : `${label}, ${sense}`;
}

function rangeIn({ shows }: InstrumentSnapshot, unit: UnitName, sense: PressureSense | undefined) {
  const fits = shows.filter(
    (range) =>
      unitKind(range.unit) === unitKind(unit) &&
      (sense === undefined || range.sense === undefined || range.sense === sense),
  );
  return fits.find((range) => range.unit === unit) ?? fits[0];
}
