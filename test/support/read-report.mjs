// @ts-check

/** @typedef {import('./ledger.mjs').Counts} Counts */

/**
 * Counts a Jest report (`--json`): a file that could not be run at all is one failure.
 * @param {Record<string, unknown>} report
 * @returns {Counts}
 */
export function countJest(report) {
  return {
    passed: numberAt(report, 'numPassedTests'),
    failed: numberAt(report, 'numFailedTests') + numberAt(report, 'numRuntimeErrorTestSuites'),
    skipped: numberAt(report, 'numPendingTests') + numberAt(report, 'numTodoTests'),
  };
}

/**
 * Counts a Playwright report (json reporter): an error outside of any test is one failure, and so is a test that only
 * passed when it was tried again.
 * @param {Record<string, unknown>} report
 * @returns {Counts}
 */
export function countBrowser(report) {
  const { stats, errors } = report;
  if (typeof stats !== 'object' || stats === null || !Array.isArray(errors))
    throw new Error('The report has no stats.');
  const all = /** @type {Record<string, unknown>} */ (stats);
  return {
    passed: numberAt(all, 'expected'),
    failed: numberAt(all, 'unexpected') + numberAt(all, 'flaky') + errors.length,
    skipped: numberAt(all, 'skipped'),
  };
}

/**
 * @param {Record<string, unknown>} record
 * @param {string} name
 */
function numberAt(record, name) {
  const value = record[name];
  if (typeof value === 'number') return value;
  throw new Error(`The report has no ${name}.`);
}
