/**
 * Tests counted from vitest's JSON report.
 *
 * @param {{ numPassedTests: number, numFailedTests: number, numPendingTests?: number, numTodoTests?: number,
 *   testResults?: readonly { status: string, assertionResults: readonly { status: string }[] }[] }} report
 * @returns {{ passed: number, failed: number, skipped: number }} A file that broke before its tests ran counts as one failed.
 */
export function tallyOf({ numPassedTests, numFailedTests, numPendingTests = 0, numTodoTests = 0, testResults = [] }) {
  const broken = testResults.filter(
    ({ status, assertionResults }) => status === "failed" && !assertionResults.some((test) => test.status === "failed"),
  ).length;
  return { passed: numPassedTests, failed: numFailedTests + broken, skipped: numPendingTests + numTodoTests };
}
