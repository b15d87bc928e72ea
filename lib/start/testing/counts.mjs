// @ts-check
import fs from 'node:fs'

/** @typedef {import('./stages.mjs').Counts} Counts */

/** @param {string} file @returns {any} null when there is no readable report */
function readReport(file) {
  try {
    return JSON.parse(fs.readFileSync(file, 'utf8'))
  } catch {
    return null
  }
}

/**
 * A tool that failed without naming a failed test (a file that does not load, an error outside every test) still failed.
 * @param {Counts} counts
 * @param {number} status exit status of the tool
 * @returns {Counts}
 */
const withStatus = (counts, status) =>
  status !== 0 && counts.failed === 0
    ? { ...counts, failed: 1, note: 'It failed outside every test: see above.' }
    : counts

/**
 * @param {string} file report of vitest
 * @param {number} status
 * @returns {Counts}
 */
export function countVitest(file, status) {
  const report = readReport(file)
  if (!report) return { passed: 0, failed: 1, note: 'The unit tests left no report: see above.' }
  const { numPassedTests, numFailedTests, numPendingTests = 0 } = report
  const note = numPendingTests > 0 ? { note: `${numPendingTests} tests were skipped` } : {}
  return withStatus({ passed: numPassedTests, failed: numFailedTests, ...note }, status)
}

/**
 * @param {string} file report of Playwright
 * @param {number} status
 * @returns {Counts}
 */
export function countPlaywright(file, status) {
  const report = readReport(file)
  if (!report) return { passed: 0, failed: 1, note: 'The browser tests left no report: see above.' }
  const { expected, flaky, unexpected, skipped } = report.stats
  const note = skipped > 0 ? { note: `${skipped} browser tests were skipped` } : {}
  return withStatus({ passed: expected + flaky, failed: unexpected, ...note }, status)
}

/**
 * @param {string} file report of Playwright that only listed the tests
 * @returns {number} how many there are, at least 1: without a browser each counts as failed
 */
export const countListed = (file) => Math.max(1, readReport(file)?.stats.skipped ?? 0)
