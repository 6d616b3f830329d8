import { existsSync, readFileSync } from "node:fs";

/**
 * @typedef {{ passed: number, failed: number }} Tally
 */

/**
 * A runner counts as failed, once, when it ended badly and yet reports nothing failed, and when it ran no test at all.
 *
 * @param {Tally} tally
 * @param {number | null} exitCode
 * @returns {Tally}
 */
function withRunner({ passed, failed }, exitCode) {
  return failed === 0 && (exitCode !== 0 || passed === 0) ? { passed, failed: 1 } : { passed, failed };
}

/** @param {string} file */
function readReport(file) {
  return existsSync(file) ? JSON.parse(readFileSync(file, "utf8")) : undefined;
}

/**
 * Reads Vitest's JSON report. A test that was skipped or left to do counts as failed, and so does a file that could not
 * be run.
 *
 * @param {string} reportFile
 * @param {number | null} exitCode Vitest's
 * @returns {Tally}
 */
export function tallyVitest(reportFile, exitCode) {
  const report = readReport(reportFile);
  if (!report) return { passed: 0, failed: 1 };
  const brokenFiles = report.testResults.filter(
    (/** @type {{ status: string, assertionResults: unknown[] }} */ file) =>
      file.status === "failed" && file.assertionResults.length === 0,
  ).length;
  const failed = report.numFailedTests + report.numPendingTests + report.numTodoTests + brokenFiles;
  return withRunner({ passed: report.numPassedTests, failed }, exitCode);
}

/**
 * Reads Playwright's JSON report. A test that was skipped, or passed only when tried again, counts as failed.
 *
 * @param {string} reportFile
 * @param {number | null} exitCode Playwright's
 * @returns {Tally}
 */
export function tallyPlaywright(reportFile, exitCode) {
  const report = readReport(reportFile);
  if (!report) return { passed: 0, failed: 1 };
  const { expected, unexpected, flaky, skipped } = report.stats;
  return withRunner({ passed: expected, failed: unexpected + flaky + skipped + report.errors.length }, exitCode);
}
