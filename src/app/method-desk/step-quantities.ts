import type { Band, Quantity, Step } from '../../../procedures/document';
import { lowerFirst, shownUnit } from '../../../procedures/engine/showing';
import { foundLabel } from './found-label';

/** What a step gives a name to, for reading. */
export interface QuantityReading {
  readonly name: string;
  readonly label: string;
  /** `kPa absolute`; empty where it holds or does not. */
  readonly unit: string;
  /** How it comes to be known: taken, found, or the expression. */
  readonly how: string;
  readonly band: string | undefined;
  readonly bandSource: string | undefined;
}

/** Quantities that a step takes, looks for or computes, in this order. */
export function quantitiesOf(step: Step, words: (expression: string) => string): readonly QuantityReading[] {
  const reading = (quantity: Quantity, how: string): QuantityReading => ({
    name: quantity.name,
    label: quantity.label,
    unit: `${shownUnit(quantity.unit)}${quantity.sense === undefined ? '' : ` ${quantity.sense}`}`.trim(),
    how,
    band: quantity.band === undefined ? undefined : bandText(quantity.band, words),
    bandSource: quantity.band?.source,
  });
  const results =
    'results' in step ? (step.results ?? []).map((result) => reading(result, `= ${words(result.is)}`)) : [];
  switch (step.kind) {
    case 'reading':
    case 'wait':
      return [
        ...step.reads.map((quantity) =>
          reading(
            quantity,
            takenText(
              quantity.takes ?? 1,
              quantity.ways?.map(({ label }) => label),
            ),
          ),
        ),
        ...results,
      ];
    case 'hold':
      return [
        ...(step.begins ?? []).map((quantity) =>
          reading(quantity, `${takenText(quantity.takes ?? 1, [])}, as it begins`),
        ),
        ...(step.ends ?? []).map((quantity) => reading(quantity, `${takenText(quantity.takes ?? 1, [])}, as it ends`)),
        ...results,
      ];
    case 'call':
      return [...step.takes.map((taken) => reading(taken, `taken over: ${taken.from} there`)), ...results];
    case 'ramp':
    case 'listen':
      return [
        ...step.finds.map((found) =>
          'unit' in found
            ? reading(found, 'found in the series')
            : {
                name: found.name,
                label: foundLabel(found),
                unit: '',
                how: 'from the marks',
                band: undefined,
                bandSource: undefined,
              },
        ),
        ...results,
      ];
    default:
      return results;
  }
}

function takenText(takes: number, ways: readonly string[] | undefined): string {
  if (ways !== undefined && ways.length > 0) return `one way of: ${ways.map(lowerFirst).join(', ')}`;
  return takes === 1 ? 'read once' : `mean of ${takes} takes`;
}

function bandText(band: Band, words: (expression: string) => string): string {
  const from = band.low === undefined ? '' : `from ${words(band.low)}`;
  const to = band.high === undefined ? '' : `to ${words(band.high)}`;
  const only = band.when === undefined ? '' : `, judged only if ${words(band.when)}`;
  return `${`${from} ${to}`.trim()}${only}`;
}
