// Counts what the parts of a test run found, and puts it into the one line the run ends with.
import fs from "node:fs";

/** @typedef {{ passed: number, failed: number, skipped: number }} Count */

/** @type {Count} */
const nothing = { passed: 0, failed: 0, skipped: 0 };

/** @param {boolean} passed */
export function countOfCheck(passed) {
  return { ...nothing, [passed ? "passed" : "failed"]: 1 };
}

/**
 * A file of tests that could not be loaded holds no test results; it counts as one failure, and so does a run that failed for no test.
 * @param {{ numPassedTests: number, numFailedTests: number, numPendingTests: number, numTodoTests: number,
 *   testResults: { status: string, assertionResults: unknown[] }[] }} report vitest's JSON report
 * @param {number} code vitest's exit code
 * @returns {Count}
 */
export function countOfVitest(report, code) {
  const unloaded = report.testResults.filter((file) => file.status === "failed" && file.assertionResults.length === 0).length;
  return withCode(
    {
      passed: report.numPassedTests,
      failed: report.numFailedTests + unloaded,
      skipped: report.numPendingTests + report.numTodoTests,
    },
    code,
  );
}

/**
 * @param {{ stats: { expected: number, unexpected: number, flaky: number, skipped: number }, errors: unknown[] }} report Playwright's JSON report
 * @param {number} code Playwright's exit code
 * @returns {Count}
 */
export function countOfPlaywright({ stats, errors }, code) {
  const count = { passed: stats.expected, failed: stats.unexpected + stats.flaky + errors.length, skipped: stats.skipped };
  return withCode(count, code);
}

/**
 * @param {Count} count
 * @param {number} code
 */
function withCode(count, code) {
  return code !== 0 && count.failed === 0 ? { ...count, failed: 1 } : count;
}

/**
 * Reads a report and counts it; a missing report is one failure.
 * @template T
 * @param {string} file
 * @param {number} code
 * @param {(report: T, code: number) => Count} count
 */
export function countReport(file, code, count) {
  return fs.existsSync(file) ? count(JSON.parse(fs.readFileSync(file, "utf8")), code) : countOfCheck(false);
}

/**
 * @param {Count[]} counts
 * @returns {Count}
 */
export function sum(counts) {
  return counts.reduce(
    (total, count) => ({
      passed: total.passed + count.passed,
      failed: total.failed + count.failed,
      skipped: total.skipped + count.skipped,
    }),
    nothing,
  );
}

/** @param {Count} count */
export function summaryLine({ passed, failed, skipped }) {
  return `${passed} passed, ${failed} failed${skipped > 0 ? `, ${skipped} skipped` : ""}`;
}
