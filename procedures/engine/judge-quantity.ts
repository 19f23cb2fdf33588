import { judge, type UnitName } from '../calculations/for-a-run';
import type { CompiledProcedure, Environment, Quantity } from '../document';
import { decimalsOf, fixed, shownIn, trimmed } from './figures';
import type { Judgement } from './run-state';

/** What is held against a band: base units, expanded uncertainty (k = 2). */
export interface HeldFigure {
  readonly value: number;
  readonly uncertainty: number;
  /** How many decimals the value is read with in its quantity's unit; absent where that is not known. */
  readonly decimals: number | undefined;
}

/**
 * Judges a value against its quantity's band: in, out or too close to call,
 * guarded on both sides by the uncertainty of the value and of the band's ends together. Undefined where the quantity has no band. A band whose condition does not hold, or whose
 * ends need a value that was never measured, is not judged, and says so.
 */
export function judgeQuantity(
  procedure: CompiledProcedure,
  quantity: Quantity,
  { value, uncertainty, decimals }: HeldFigure,
  environment: Environment,
): Judgement | undefined {
  const band = quantity.band;
  if (band === undefined) return undefined;
  const low = endOf(procedure, band.low, environment);
  const high = endOf(procedure, band.high, environment);
  // The ends may rest on readings of their own: the verdict is about the difference from them (JCGM 100:2008, 5.1.2).
  const guard = Math.hypot(uncertainty, Math.max(low?.uncertainty ?? 0, high?.uncertainty ?? 0));
  const judgement: { -readonly [Field in keyof Judgement]: Judgement[Field] } = { guard, source: band.source };
  if (low !== undefined) {
    judgement.low = low.value;
    judgement.lowText = endText(low, quantity.unit, decimals);
  }
  if (high !== undefined) {
    judgement.high = high.value;
    judgement.highText = endText(high, quantity.unit, decimals);
  }
  const isMissing = (band.low !== undefined && low === undefined) || (band.high !== undefined && high === undefined);
  const isJudged = band.when === undefined || truthOf(procedure, band.when, environment) === true;
  if (isMissing || !isJudged) judgement.unjudged = band.unjudged ?? 'Not judged: what its band needs was not measured.';
  else judgement.result = judge({ value, uncertainty: guard, low: judgement.low, high: judgement.high });
  return judgement;
}

/** A band's end with its own expanded uncertainty, base units. */
type BandEnd = Pick<HeldFigure, 'value' | 'uncertainty'>;

/** The band's end; undefined where it needs what was never measured. */
function endOf(
  procedure: CompiledProcedure,
  source: string | undefined,
  environment: Environment,
): BandEnd | undefined {
  if (source === undefined) return undefined;
  const expression = procedure.expression(source);
  const outcome = expression.evaluate(environment);
  if (!outcome.ok || typeof outcome.value !== 'number') return undefined;
  return { value: outcome.value, uncertainty: expression.expandedUncertainty(environment) };
}

/** Whether the condition holds; undefined where it needs something that was never measured. */
export function truthOf(procedure: CompiledProcedure, source: string, environment: Environment): boolean | undefined {
  const outcome = procedure.expression(source).evaluate(environment);
  return outcome.ok && typeof outcome.value === 'boolean' ? outcome.value : undefined;
}

/**
 * A band's end as people read it; what is judged is never rounded. An end that rests on readings has the decimals of
 * the reading that is held against it. One that the author gave outright keeps its own: as many as needed, at most
 * two, at least one where it is not whole.
 */
function endText(end: BandEnd, unit: UnitName, decimals: number | undefined): string {
  const shown = shownIn(end.value, unit);
  if (end.uncertainty > 0 && decimals !== undefined) return fixed(shown, decimals);
  const text = trimmed(shown, 2);
  return decimalsOf(text) === 0 && !Number.isInteger(shown) ? fixed(shown, 1) : text;
}
