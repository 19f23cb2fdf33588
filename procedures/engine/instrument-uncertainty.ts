import {
  differenceFromBase,
  differenceToBase,
  expandedUncertainty,
  unitKind,
  type UnitName,
} from '../calculations/for-a-run';
import type { PressureSense, Quantity } from '../document';
import { decimalsOf } from './figures';
import type { InstrumentRange, InstrumentSnapshot } from './run-event';
import type { RunState } from './run-state';

/** The range of an instrument with which a quantity of this unit and sense is read; undefined if it has none. */
export function rangeFor(
  instrument: InstrumentSnapshot | undefined,
  unit: UnitName,
  sense: PressureSense | undefined,
): InstrumentRange | undefined {
  return instrument?.shows.find(
    (range) =>
      unitKind(range.unit) === unitKind(unit) &&
      (range.sense === undefined || sense === undefined || range.sense === sense),
  );
}

/** The step of what was entered, in base units: the display's, or that of the digits typed where they are fewer. */
export function resolutionOf(text: string, unit: UnitName, range: InstrumentRange | undefined): number {
  const typed = differenceToBase(10 ** -decimalsOf(text), unit);
  return range === undefined ? typed : Math.max(typed, differenceToBase(range.resolution, range.unit));
}

/**
 * How many decimals the steps of the chosen instrument's display have in the quantity's unit, at most 6; undefined
 * where no instrument reads it.
 */
export function readDecimals(
  state: Pick<RunState, 'gear'>,
  { gear, unit, sense }: Quantity & { readonly gear?: string },
): number | undefined {
  const range = rangeFor(gear === undefined ? undefined : state.gear[gear], unit, sense);
  if (range === undefined || !(range.resolution > 0)) return undefined;
  const step = differenceFromBase(differenceToBase(range.resolution, range.unit), unit);
  // A step such as 0.5 kPa is shown with one decimal; the small allowance is for steps that came through a conversion.
  return Math.min(6, Math.max(0, Math.ceil(-Math.log10(step) - 1e-9)));
}

/**
 * Expanded uncertainty (k = 2) in base units of the mean of takes read with an instrument: its accuracy and its step
 * as rectangular parts, the spread of the takes as the repeated part (JCGM 100:2008 4.3, 5.1.2, 6.2).
 */
export function readingUncertainty(
  range: InstrumentRange | undefined,
  resolution: number,
  spread: number,
  takes: number,
): number {
  const accuracy = range === undefined ? 0 : differenceToBase(range.accuracy, range.unit);
  return expandedUncertainty(
    takes > 1 ? { accuracy, resolution, repeatDeviation: spread, repeats: takes } : { accuracy, resolution },
  );
}
