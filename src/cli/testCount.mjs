/**
 * How many tests passed and failed, from Vitest's JSON report. A file that could not even be loaded,
 * or a run that ended without a report, counts as one failure.
 *
 * @param report the parsed report, or null when there is none
 * @param code exit code of the run
 */
export function countTests(report, code) {
  if (!report) return { passed: 0, failed: 1 };
  const unloaded = report.testResults.filter(
    ({ status, assertionResults }) =>
      status === 'failed' && !assertionResults.some((one) => one.status === 'failed'),
  ).length;
  const failed = report.numFailedTests + unloaded;
  return { passed: report.numPassedTests, failed: failed === 0 && code !== 0 ? 1 : failed };
}
