import { existsSync, readFileSync } from 'node:fs'

/** @typedef {{ passed: number, failed: number, notes: string[] }} Count */

function readReport(file) {
  return existsSync(file) ? JSON.parse(readFileSync(file, 'utf8')) : null
}

/** A runner that says no but blames no test still counts as one failure, and so does one that wrote no report. */
function settle({ passed, failed, notes }, runnerOk) {
  return failed === 0 && !runnerOk ? { passed, failed: 1, notes: [...notes, 'the runner itself failed'] } : { passed, failed, notes }
}

/**
 * Counts a Vitest JSON report. A skipped test counts as failed: it proves nothing.
 * @returns {Count}
 */
export function countVitest(file, runnerOk) {
  const report = readReport(file)
  if (report === null) return { passed: 0, failed: 1, notes: ['no report was written'] }
  const unloaded = report.testResults.filter(({ status, assertionResults }) => status === 'failed' && assertionResults.length === 0)
  const skipped = report.numPendingTests + report.numTodoTests
  const notes = [
    ...unloaded.map(({ name }) => `${name} could not be loaded`),
    ...(skipped > 0 ? [`${skipped} tests are skipped, which counts as failed`] : []),
  ]
  return settle({ passed: report.numPassedTests, failed: report.numFailedTests + unloaded.length + skipped, notes }, runnerOk)
}

/**
 * Counts a Playwright JSON report. A test that passed only when repeated, or was skipped, counts as failed.
 * @returns {Count}
 */
export function countPlaywright(file, runnerOk) {
  const report = readReport(file)
  if (report === null) return { passed: 0, failed: 1, notes: ['no report was written'] }
  const { expected, unexpected, flaky, skipped } = report.stats
  const notes = [
    ...report.errors.map(({ message }) => message ?? 'an error outside any test'),
    ...(flaky > 0 ? [`${flaky} tests passed only when repeated, which counts as failed`] : []),
    ...(skipped > 0 ? [`${skipped} tests are skipped, which counts as failed`] : []),
  ]
  return settle({ passed: expected, failed: unexpected + flaky + skipped + report.errors.length, notes }, runnerOk)
}
