import { isUnit, toBase, unitKind, units, type UnitName } from '../../calculations/for-a-run';

/** A figure with its unit, as a text says it. */
export interface WrittenFigure {
  readonly text: string;
  readonly unit: UnitName;
  /** In base units. */
  readonly value: number;
  /** Half of its last digit, in base units: what rounding may have left. */
  readonly slack: number;
  /** What stands before it in its clause: `The limit is`. */
  readonly before: string;
  /** What follows, up to the next stop: `gauge`, `absolute`. */
  readonly next: string;
}

const names = Object.keys(units)
  .filter((name) => unitKind(name as UnitName) === 'pressure')
  .sort((a, b) => b.length - a.length)
  .map((name) => name.replace(/[.*+?^${}()|[\]\\/]/g, '\\$&'));
const pattern = new RegExp(`(?<![\\w.])(\\d+(?:\\.\\d+)?)\\s?(${names.join('|')})(?![\\w/])`, 'g');

/** The pressures that stand in a text: `34.5 kPa`. What a template will fill in is not known here. */
export function pressuresIn(text: string): readonly WrittenFigure[] {
  return [...text.matchAll(pattern)].flatMap((match): WrittenFigure[] => {
    const [whole, digits = '', unit = ''] = match;
    if (!isUnit(unit)) return [];
    const before =
      text
        .slice(0, match.index)
        .split(/[.,;:!?]\s/)
        .at(-1)
        ?.trim() ?? '';
    const next = /^[^.,;:!?]*/.exec(text.slice(match.index + whole.length))?.[0].trim() ?? '';
    const value = toBase(Number(digits), unit);
    const lastDigit = 10 ** -decimalsIn(digits);
    return [{ text: whole, unit, value, slack: toBase(lastDigit / 2, unit) - toBase(0, unit), before, next }];
  });
}

/** How many digits a figure has behind its point: two in `1.50`. */
export function decimalsIn(text: string): number {
  return /\.(\d+)/.exec(text)?.[1]?.length ?? 0;
}

/** How many decimals an instrument shows whose steps are so large: one for 0.2, none for 5. */
export function decimalsOfStep(resolution: number): number {
  for (let decimals = 0; decimals < 9; decimals += 1) {
    const scaled = resolution * 10 ** decimals;
    if (Math.abs(scaled - Math.round(scaled)) < 1e-6) return decimals;
  }
  return 9;
}
