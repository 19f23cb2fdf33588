import { unitKind, units, type UnitName } from '../../calculations/for-a-run';
import type { PressureSense } from '../procedure-document';
import { dimensionInWords, dimensionOf, isSameDimension, unitKindOf, type Dimension } from './dimension';
import type { ExpressionProblem, Span } from './expression';

/**
 * Of pressures and temperatures it matters where their zero is. `either` is a value as it is written (`2 kPa`, `5 K`):
 * it takes the sense of what it stands beside. `85 degC` has its own zero, so it is absolute.
 */
export type Sense = PressureSense | 'difference' | 'either';

/** What an expression gives: something that holds or does not, or a quantity. */
export type Kind = TruthKind | QuantityKind;

export interface TruthKind {
  readonly kind: 'truth';
}

export interface QuantityKind {
  readonly kind: 'quantity';
  readonly dimension: Dimension;
  /** For pressures and temperatures; `difference` for everything else. */
  readonly sense: Sense;
}

export const truth: TruthKind = { kind: 'truth' };
export const plainNumber: QuantityKind = quantityOf('ratio', 'difference');
export const pressure = (sense: Sense): QuantityKind => quantityOf('pressure', sense);

export function quantityOf(kind: Parameters<typeof dimensionOf>[0], sense: Sense): QuantityKind {
  return { kind: 'quantity', dimension: dimensionOf(kind), sense };
}

/** The kind of a declared quantity: a pressure without a sense is a difference, a temperature on a scale is absolute. */
export function declaredKind(unit: UnitName, sense?: PressureSense): QuantityKind {
  return quantityOf(
    unitKind(unit),
    sense ?? (unitKind(unit) === 'temperature' ? temperatureSense(unit) : 'difference'),
  );
}

/** The kind of a number as it is written. */
export function writtenKind(unit: UnitName): QuantityKind {
  const kind = unitKind(unit);
  if (kind === 'temperature') return quantityOf(kind, temperatureSense(unit));
  return quantityOf(kind, kind === 'pressure' ? 'either' : 'difference');
}

const temperatureSense = (unit: UnitName): Sense => (units[unit].offset === 0 ? 'either' : 'absolute');

export function isTemperature({ dimension }: QuantityKind): boolean {
  return unitKindOf(dimension) === 'temperature';
}

export function isPlainNumber({ dimension }: QuantityKind): boolean {
  return isSameDimension(dimension, plainNumber.dimension);
}

const senseWords: Readonly<Record<PressureSense | 'difference', string>> = {
  absolute: 'an absolute pressure',
  gauge: 'a gauge pressure',
  difference: 'a pressure difference',
};

/** `a gauge pressure`, `a difference of temperatures`, `a truth`. */
export function kindInWords(kind: Kind): string {
  if (kind.kind === 'truth') return 'something that holds or does not';
  if (unitKindOf(kind.dimension) === 'pressure' && kind.sense !== 'either') return senseWords[kind.sense];
  if (isTemperature(kind) && kind.sense === 'difference') return 'a difference of temperatures';
  return dimensionInWords(kind.dimension);
}

/**
 * The sense that two quantities of one dimension share where they stand beside each other: compared, in `min`, as a
 * value and the end of its band. Undefined when they have none: a gauge pressure and an absolute one, a difference
 * and an absolute one. A gauge pressure is the difference from the air of the place, so these two agree.
 */
export function commonSense(a: Sense, b: Sense): Sense | undefined {
  if (a === b || b === 'either') return a;
  if (a === 'either') return b;
  if (a === 'absolute' || b === 'absolute') return undefined;
  return 'gauge';
}

/** Says why two kinds cannot stand beside each other, and what to write. */
export function mismatch(span: Span, act: string, a: Kind, b: Kind): ExpressionProblem {
  const { start, end } = span;
  return { start, end, message: `${kindInWords(a)} and ${kindInWords(b)} cannot be ${act}${remedy(a, b)}` };
}

function remedy(a: Kind, b: Kind): string {
  if (a.kind === 'truth' || b.kind === 'truth') return ': use and, or, not for what holds or does not.';
  if (!isSameDimension(a.dimension, b.dimension)) {
    return isPlainNumber(a) || isPlainNumber(b)
      ? ': write the number with its unit.'
      : ': their units measure different things.';
  }
  if (isTemperature(a)) return ': write a difference in K, a temperature in degC.';
  const senses = [a.sense, b.sense];
  if (senses.includes('gauge')) return ': turn one into the other with absolute(...) or gauge(...).';
  return ': subtract two absolute pressures first, or use absolute(...) on a gauge pressure.';
}
