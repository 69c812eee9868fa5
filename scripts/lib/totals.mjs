/** @typedef {{ passed: number, failed: number, skipped: number }} Totals */

/** @typedef {{ numPassedTests: number, numFailedTests: number, numPendingTests: number, numTodoTests: number, testResults: { status: string, name: string, assertionResults: { status: string, title: string, meta?: { rules?: { standard: string, name: string, count: number } } }[] }[] }} Report What vitest's JSON reporter writes, as far as it is read here. */

/**
 * Counts one run of tests. Whatever went wrong is in the count, also what no single test can report: a file that
 * does not load, an error outside any test, a run without a test, a report that was never written.
 * @param {Report | null} report
 * @param {number} exitCode of the run
 * @param {{ mayBeEmpty?: boolean }} [options] mayBeEmpty: a filter chose the files, so none may be right
 * @returns {Totals}
 */
export function countReport(report, exitCode, { mayBeEmpty = false } = {}) {
  if (!report) return { passed: 0, failed: 1, skipped: 0 }
  const brokenFiles = report.testResults.filter((file) => file.status === 'failed' && !file.assertionResults.some((test) => test.status === 'failed')).length
  const totals = { passed: report.numPassedTests, failed: report.numFailedTests + brokenFiles, skipped: report.numPendingTests + report.numTodoTests }
  const empty = totals.passed + totals.failed === 0
  if (totals.failed === 0 && (exitCode !== 0 || (empty && !mayBeEmpty))) totals.failed = 1
  return totals
}

/**
 * @param {readonly Totals[]} parts
 * @returns {Totals}
 */
export const addTotals = (parts) => parts.reduce((sum, part) => ({ passed: sum.passed + part.passed, failed: sum.failed + part.failed, skipped: sum.skipped + part.skipped }), { passed: 0, failed: 0, skipped: 0 })

/**
 * The line that closes a run.
 * @param {Totals} totals
 * @returns {string} `N passed, N failed`, and `, N skipped` if any
 */
export const totalsLine = ({ passed, failed, skipped }) => `${passed} passed, ${failed} failed${skipped > 0 ? `, ${skipped} skipped` : ''}`
