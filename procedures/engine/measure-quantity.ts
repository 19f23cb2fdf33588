import { differenceToBase, fromBase, toBase, type UnitName } from '../calculations/for-a-run';
import type { CompiledProcedure, EntryWay, Quantity, ReadQuantity } from '../document';
import { environmentOf } from './environment';
import { decimalsOf, figureText, fixed, uncertaintyText } from './figures';
import { rangeFor, readDecimals, readingUncertainty, resolutionOf } from './instrument-uncertainty';
import { judgeQuantity } from './judge-quantity';
import type { NamedValue, RunState, Take } from './run-state';

/** Where a value came from in the run. */
export interface Provenance {
  readonly step: string;
  readonly seq: number;
  readonly at: number;
}

/** A value before it is judged: base units. */
interface Measured {
  readonly value: number;
  readonly uncertainty: number;
  readonly spread: number;
  readonly text: string;
  readonly uncertaintyText: string;
}

/** A named value that is still being put together. */
type ValueDraft = { -readonly [Field in keyof NamedValue]: NamedValue[Field] };

/**
 * The named values that the takes of one quantity give: the quantity itself and, where it was known by a way with an
 * entry, the entry. Empty when the way's expression cannot be evaluated.
 */
export function measureQuantity(
  procedure: CompiledProcedure,
  state: RunState,
  quantity: ReadQuantity,
  takes: readonly Take[],
  provenance: Provenance,
): readonly NamedValue[] {
  const last = takes.at(-1);
  if (last === undefined) return [];
  const way = quantity.ways?.find((candidate) => candidate.id === last.way);
  if (way === undefined) {
    const measured = meanOfTakes(state, quantity, takes);
    return [judged(procedure, state, quantity, measured, last, takes.length, provenance)];
  }
  return measureByWay(procedure, state, quantity, way, last, provenance);
}

function measureByWay(
  procedure: CompiledProcedure,
  state: RunState,
  quantity: ReadQuantity,
  way: EntryWay,
  take: Take,
  provenance: Provenance,
): readonly NamedValue[] {
  const entry = way.entry;
  const entered =
    entry === undefined ? undefined : named({ ...entry }, meanOfTakes(state, entry, [take]), take, 1, provenance);
  const environment = environmentOf(state, entered);
  const is = procedure.expression(way.is);
  const value = is.evaluate(environment);
  if (!value.ok || typeof value.value !== 'number') return [];
  const stated =
    way.uncertainty === undefined ? undefined : procedure.expression(way.uncertainty).evaluate(environment);
  const uncertainty =
    stated?.ok === true && typeof stated.value === 'number' ? stated.value : is.expandedUncertainty(environment);
  const measured = {
    value: value.value,
    uncertainty,
    spread: 0,
    ...figureText(value.value, uncertainty, quantity.unit),
  };
  const result = judged(procedure, state, quantity, measured, { ...take, way: way.id }, 1, provenance);
  return entered === undefined ? [result] : [entered, result];
}

function meanOfTakes(
  state: RunState,
  quantity: Quantity & { readonly gear?: string },
  takes: readonly Take[],
): Measured {
  const values = takes.map((take) => toBase(Number(take.text), take.unit));
  const mean = values.reduce((sum, value) => sum + value, 0) / values.length;
  const spread =
    values.length < 2
      ? 0
      : Math.sqrt(values.reduce((sum, value) => sum + (value - mean) ** 2, 0) / (values.length - 1));
  const instrument = quantity.gear === undefined ? undefined : state.gear[quantity.gear];
  const range = rangeFor(instrument, quantity.unit, quantity.sense);
  const resolution = Math.max(...takes.map((take) => resolutionOf(take.text, take.unit, range)));
  const uncertainty = readingUncertainty(range, resolution, spread, values.length);
  return {
    value: mean,
    uncertainty,
    spread,
    text: meanText(mean, takes, quantity.unit),
    uncertaintyText: uncertaintyText(uncertainty, quantity.unit),
  };
}

/** One take keeps the digits it was read with; a mean carries one more. */
function meanText(mean: number, takes: readonly Take[], unit: UnitName): string {
  const first = takes[0];
  if (takes.length === 1 && first !== undefined && first.unit === unit) return first.text;
  const decimals = Math.max(...takes.map((take) => decimalsOf(take.text)));
  return fixed(fromBase(mean, unit), takes.length === 1 ? Math.max(decimals, 1) : decimals + 1);
}

function judged(
  procedure: CompiledProcedure,
  state: RunState,
  quantity: Quantity & { readonly gear?: string },
  measured: Measured,
  take: Take,
  takes: number,
  provenance: Provenance,
): NamedValue {
  const value = named(quantity, measured, take, takes, provenance);
  const environment = environmentOf(state, value);
  const decimals = readDecimals(state, quantity) ?? decimalsOf(measured.text);
  const judgement = judgeQuantity(procedure, quantity, { ...measured, decimals }, environment);
  if (judgement !== undefined) value.judgement = judgement;
  return value;
}

function named(
  quantity: Quantity,
  measured: Measured,
  take: Pick<Take, 'source' | 'way'>,
  takes: number,
  { step, seq, at }: Provenance,
): ValueDraft {
  const value: ValueDraft = {
    name: quantity.name,
    label: quantity.label,
    value: measured.value,
    uncertainty: measured.uncertainty,
    text: measured.text,
    uncertaintyText: measured.uncertaintyText,
    unit: quantity.unit,
    step,
    seq,
    at,
    source: take.source,
    takes,
    spread: measured.spread,
  };
  if (quantity.sense !== undefined) value.sense = quantity.sense;
  if (take.way !== undefined) value.way = take.way;
  return value;
}

/** A value that came computed, with its uncertainty, both as texts in the quantity's unit. */
export function computedValue(
  procedure: CompiledProcedure,
  state: RunState,
  quantity: Quantity,
  figure: { readonly text: string; readonly uncertainty: string },
  provenance: Provenance,
): NamedValue {
  const value = toBase(Number(figure.text), quantity.unit);
  const uncertainty = differenceToBase(Number(figure.uncertainty), quantity.unit);
  const measured = { value, uncertainty, spread: 0, text: figure.text, uncertaintyText: figure.uncertainty };
  const take = { seq: provenance.seq, text: figure.text, unit: quantity.unit, source: 'computed' } as const;
  return judged(procedure, state, quantity, measured, take, 1, provenance);
}

/** A result of an expression over the run's values; undefined where one of them was never measured. */
export function evaluateResult(
  procedure: CompiledProcedure,
  state: RunState,
  result: Quantity & { readonly is: string },
  provenance: Provenance,
): NamedValue | undefined {
  const environment = environmentOf(state);
  const expression = procedure.expression(result.is);
  const outcome = expression.evaluate(environment);
  if (!outcome.ok || typeof outcome.value !== 'number') return undefined;
  const uncertainty = expression.expandedUncertainty(environment);
  const text = figureText(outcome.value, uncertainty, result.unit);
  const measured = { value: outcome.value, uncertainty, spread: 0, ...text };
  const take = { seq: provenance.seq, text: text.text, unit: result.unit, source: 'computed' } as const;
  return judged(procedure, state, result, measured, take, 1, provenance);
}
