import { fromBase, differenceFromBase, type UnitName } from '../calculations/for-a-run';

const decimalText = /^-?\d{1,7}(\.\d{1,6})?$/;

/**
 * A base-unit value in `unit`. A kelvin is its own base and may stand for a difference, which may be negative; every
 * other unit of temperature stands on its scale.
 */
export function shownIn(value: number, unit: UnitName): number {
  return unit === 'K' ? value : fromBase(value, unit);
}

/** The number of a decimal text such as `12.60` or `-3`; undefined for anything else. */
export function parseDecimal(text: string): number | undefined {
  return decimalText.test(text) ? Number(text) : undefined;
}

/** What a person typed, as decimal text: blanks go, a decimal comma becomes a point, a true minus a hyphen. */
export function tidyDecimal(text: string): string {
  return text.trim().replace(',', '.').replace('\u2212', '-');
}

/** How many digits stand behind the point. */
export function decimalsOf(text: string): number {
  const point = text.indexOf('.');
  return point < 0 ? 0 : text.length - point - 1;
}

/**
 * How many decimals an expanded uncertainty carries: one significant digit, two when the first is 1
 * (JCGM 100:2008 7.2.6: one or two digits), never more than 6.
 */
export function decimalsOfUncertainty(uncertainty: number): number {
  if (!(uncertainty > 0)) return 6;
  const exponent = Math.floor(Math.log10(uncertainty));
  const leading = Number((uncertainty / 10 ** exponent).toPrecision(2));
  return Math.min(6, Math.max(0, -exponent + (leading < 2 ? 1 : 0)));
}

export interface FigureText {
  readonly text: string;
  readonly uncertaintyText: string;
}

/** Value and uncertainty (both in base units) as texts in `unit`, rounded to what the uncertainty carries. */
export function figureText(value: number, uncertainty: number, unit: UnitName): FigureText {
  const shown = shownIn(value, unit);
  const spread = differenceFromBase(uncertainty, unit);
  const decimals = spread > 0 ? decimalsOfUncertainty(spread) : 3;
  return {
    text: spread > 0 ? fixed(shown, decimals) : trimmed(shown, decimals),
    uncertaintyText: spread > 0 ? fixed(spread, decimals) : '0',
  };
}

/** The uncertainty alone, for a value that keeps the digits it was read with. */
export function uncertaintyText(uncertainty: number, unit: UnitName): string {
  const spread = differenceFromBase(uncertainty, unit);
  return spread > 0 ? fixed(spread, decimalsOfUncertainty(spread)) : '0';
}

/** Fixed decimals without a negative zero. */
export function fixed(value: number, decimals: number): string {
  const text = value.toFixed(decimals);
  return text.startsWith('-') && Number(text) === 0 ? text.slice(1) : text;
}

/** At most so many decimals, without trailing zeros. */
export function trimmed(value: number, decimals: number): string {
  return String(Number(fixed(value, decimals)));
}
