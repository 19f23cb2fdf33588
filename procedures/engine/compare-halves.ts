import { differenceFromBase } from '../calculations/for-a-run';
import type { UnitName } from '../calculations/for-a-run';
import { own } from './environment';
import { figureText } from './figures';
import type { NamedValue, RunState } from './run-state';

/** One quantity that both halves of a pair measured. */
export interface HalvesCompared {
  readonly name: string;
  readonly label: string;
  readonly unit: UnitName;
  /** Warm less cold, and its expanded uncertainty (k = 2), in base units. */
  readonly difference: number;
  readonly uncertainty: number;
  /** The same as texts in `unit`. */
  readonly text: string;
  readonly uncertaintyText: string;
  /** Whether the two differ by more than their uncertainty. */
  readonly differs: boolean;
}

export type PairComparison =
  | { readonly ok: true; readonly compared: readonly HalvesCompared[]; readonly laterHalf: 'cold' | 'warm' }
  | { readonly ok: false; readonly what: string };

/**
 * Compares the two halves of a pair: what both measured, in the order in which the cold one did. A projection: nothing
 * of it is recorded. Two runs are a pair when they share pair, procedure, version, visit and kind, and differ in half.
 * The readings are independent, so that their uncertainties add as squares (JCGM 100:2008, 5.1.2).
 */
export function compareHalves(one: RunState, other: RunState): PairComparison {
  const cold = one.header.half === 'cold' ? one : other;
  const warm = cold === one ? other : one;
  const problem = whyNoPair(cold, warm);
  if (problem !== undefined) return { ok: false, what: problem };
  const compared = Object.values(cold.values)
    .toSorted((a, b) => a.seq - b.seq || (a.name < b.name ? -1 : 1))
    .flatMap((value) => {
      const warmer = own(warm.values, value.name);
      return warmer === undefined ? [] : [difference(value, warmer)];
    });
  return { ok: true, compared, laterHalf: warm.openedAt >= cold.openedAt ? 'warm' : 'cold' };
}

function whyNoPair({ header: cold }: RunState, { header: warm }: RunState): string | undefined {
  if (cold.half !== 'cold' || warm.half !== 'warm') return 'one run has to be the cold half and the other the warm one';
  if (cold.pairId === undefined || cold.pairId !== warm.pairId) return 'the runs are not of one pair';
  if (cold.kind !== warm.kind) return 'practice is not compared with a real run';
  if (cold.contentHash !== warm.contentHash) return 'the runs are not of one version of a procedure';
  return cold.visitId === warm.visitId ? undefined : 'the runs are not of one visit';
}

function difference(cold: NamedValue, warm: NamedValue): HalvesCompared {
  const { name, label, unit } = cold;
  const by = warm.value - cold.value;
  const uncertainty = Math.hypot(cold.uncertainty, warm.uncertainty);
  // A difference of two temperatures is no temperature: it is shown as what it is in the unit's degrees.
  const shown = figureText(differenceFromBase(by, unit), differenceFromBase(uncertainty, unit), '1');
  return { name, label, unit, difference: by, uncertainty, ...shown, differs: Math.abs(by) > uncertainty };
}
