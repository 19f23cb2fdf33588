// @ts-check

/** @typedef {{ passed: number, failed: number, skipped: number }} Counts */

/**
 * One row of the ledger; a step of the set-up counts no tests.
 * @typedef {{ name: string, seconds: number, note?: string } & Partial<Counts>} LedgerRow
 */

/**
 * @param {Counts[]} counts
 * @returns {Counts}
 */
export function sum(counts) {
  const total = { passed: 0, failed: 0, skipped: 0 };
  for (const { passed, failed, skipped } of counts) {
    total.passed += passed;
    total.failed += failed;
    total.skipped += skipped;
  }
  return total;
}

/**
 * The last line of every test run.
 * @param {Counts} counts
 */
export const closingLine = ({ passed, failed, skipped }) => `${passed} passed, ${failed} failed, ${skipped} skipped`;

/**
 * What each part took and gave, and the whole on the clock (parts run side by side).
 * @param {LedgerRow[]} rows
 * @param {number} totalSeconds
 */
export function ledgerOf(rows, totalSeconds) {
  const width = Math.max(...rows.map(({ name }) => name.length), 5);
  const line = (/** @type {LedgerRow} */ { name, seconds, note, passed, failed = 0, skipped = 0 }) =>
    [
      name.padEnd(width),
      `${seconds.toFixed(1).padStart(8)} s`,
      passed === undefined ? '' : `  ${closingLine({ passed, failed, skipped })}`,
      note === undefined ? '' : `  (${note})`,
    ].join('');
  return ['', 'What each part took:', ...rows.map(line), line({ name: 'whole', seconds: totalSeconds }), ''].join('\n');
}
