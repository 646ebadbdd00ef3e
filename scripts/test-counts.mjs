import { readFileSync } from 'node:fs';

/** @typedef {{ passed: number, failed: number, skipped: number }} Counts */

/** @param {string} file */
function readReport(file) {
  try {
    return JSON.parse(readFileSync(file, 'utf8'));
  } catch {
    return undefined;
  }
}

/**
 * What vitest's JSON report counts. A file that could not be loaded has no tests and counts as one failure.
 * @param {string} file
 * @returns {Counts | undefined} undefined when there is no report
 */
export function countVitest(file) {
  const report = readReport(file);
  if (!report) return undefined;
  /** @type {{ status: string, assertionResults: unknown[] }[]} */
  const files = report.testResults;
  const unloaded = files.filter(
    ({ status, assertionResults }) => status === 'failed' && assertionResults.length === 0,
  ).length;
  return {
    passed: report.numPassedTests,
    failed: report.numFailedTests + unloaded,
    skipped: report.numPendingTests + report.numTodoTests,
  };
}

/**
 * What the JSON report of the end-to-end run counts. Errors outside tests count as failures.
 * @param {string} file
 * @returns {Counts | undefined} undefined when there is no report
 */
export function countEndToEnd(file) {
  const report = readReport(file);
  if (!report) return undefined;
  const { expected, unexpected, flaky, skipped } = report.stats;
  return { passed: expected, failed: unexpected + flaky + report.errors.length, skipped };
}

/**
 * Adds up what the runners did. A runner that failed without a failing test, or left no report, counts as one
 * failure, so that the sum never looks better than the run was.
 * @param {readonly { status: number, counts: Counts | undefined }[]} runs
 * @returns {{ line: string, status: number }} the closing line and the exit status
 */
export function addUp(runs) {
  const sum = { passed: 0, failed: 0, skipped: 0 };
  for (const { status, counts = { passed: 0, failed: 0, skipped: 0 } } of runs) {
    sum.passed += counts.passed;
    sum.skipped += counts.skipped;
    sum.failed += counts.failed === 0 && status !== 0 ? 1 : counts.failed;
  }
  const line = `${String(sum.passed)} passed, ${String(sum.failed)} failed, ${String(sum.skipped)} skipped`;
  return { line, status: sum.failed === 0 && sum.passed > 0 ? 0 : 1 };
}
