import { differenceToBase, expandedUncertainty, unitKind, type UnitName } from '../calculations';
import type { PressureSense } from '../document';
import { decimalsOf } from './figures';
import type { InstrumentRange, InstrumentSnapshot } from './run-event';

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
 * Expanded uncertainty (k = 2) in base units of the mean of takes read with an instrument: its accuracy and its step
 * as rectangular parts, the spread of the takes as the repeated part (JCGM 100:2008 4.3, 5.1.2, 6.2).
 */
export function readingUncertainty(
  range: InstrumentRange | undefined,
  resolution: number,
  spread: number,
  takes: number,
): number {
  return expandedUncertainty({
    ...(range === undefined ? {} : { accuracy: differenceToBase(range.accuracy, range.unit) }),
    resolution,
    ...(takes > 1 ? { repeatDeviation: spread, repeats: takes } : {}),
  });
}
