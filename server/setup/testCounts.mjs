/**
 * @typedef {{ passed: number, failed: number, skipped: number, broken: string[] }} TestCounts
 *   broken names test files that could not even be loaded; each counts as one failure
 *
 * @typedef {object} VitestReport the parts we read of vitest's JSON report
 * @property {number} numPassedTests
 * @property {number} numFailedTests
 * @property {number} [numPendingTests]
 * @property {number} [numTodoTests]
 * @property {{ name: string, status: string, assertionResults: unknown[] }[]} testResults
 */

/**
 * Counts one vitest run. A run that failed without any failed test (an error outside of tests, a
 * crash, no report at all) still counts as one failure: nothing red may add up to green.
 * @param {VitestReport | undefined} report
 * @param {number} exitCode vitest's own
 * @returns {TestCounts}
 */
export function testCounts(report, exitCode) {
  const broken = (report?.testResults ?? [])
    .filter(({ status, assertionResults }) => status === 'failed' && assertionResults.length === 0)
    .map(({ name }) => name);
  const failed = (report?.numFailedTests ?? 0) + broken.length;
  return {
    passed: report?.numPassedTests ?? 0,
    failed: failed === 0 && exitCode !== 0 ? 1 : failed,
    skipped: (report?.numPendingTests ?? 0) + (report?.numTodoTests ?? 0),
    broken,
  };
}

/**
 * The one line a test run ends with.
 * @param {{ passed: number, failed: number }[]} parts
 * @returns {string}
 */
export function summaryLine(parts) {
  const sum = (/** @type {'passed' | 'failed'} */ key) =>
    parts.reduce((total, part) => total + part[key], 0);
  return `${sum('passed')} passed, ${sum('failed')} failed`;
}
