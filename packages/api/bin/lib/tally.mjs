/** @typedef {{ passed: number, failed: number }} Tally */

/**
 * Counts a run of Vitest from its JSON report. A file that could not be loaded holds no tests, and an
 * error outside every test belongs to none: each counts as one failure, so nothing broken stays uncounted.
 * @param {{ numPassedTests: number, numFailedTests: number, testResults: { status: string, assertionResults: { status: string }[] }[] } | undefined} report
 *   undefined when none was written
 * @param {number} exitCode Vitest's
 * @returns {Tally}
 */
export function tallyOf(report, exitCode) {
  if (!report) return { passed: 0, failed: 1 };
  const broken = report.testResults.filter(
    ({ status, assertionResults }) => status === 'failed' && !assertionResults.some((test) => test.status === 'failed'),
  );
  const failed = report.numFailedTests + broken.length;
  return { passed: report.numPassedTests, failed: failed === 0 && exitCode !== 0 ? 1 : failed };
}

/**
 * @param {Tally[]} tallies
 * @returns {Tally}
 */
export function sum(tallies) {
  return {
    passed: tallies.reduce((total, { passed }) => total + passed, 0),
    failed: tallies.reduce((total, { failed }) => total + failed, 0),
  };
}
