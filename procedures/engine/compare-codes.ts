import type { TroubleCodeEntry } from './run-event';

/** The codes that stand now and did not stand before, whatever their status. */
export function newCodesAgainst(
  before: readonly TroubleCodeEntry[],
  after: readonly TroubleCodeEntry[],
): readonly TroubleCodeEntry[] {
  const known = new Set(before.map(({ code }) => code));
  return after.filter(({ code }) => !known.has(code));
}
