/** Reads how many tests passed and failed from what the test runners write down. */
import { existsSync, readFileSync } from 'node:fs';

/**
 * @param {string} file the unit runner's JSON report
 * @returns counts in all and for each folder below `tests/`; a file that could not be loaded is one failure, and
 *   so is a skipped test, since a test that does not run proves nothing
 */
export function countUnit(file) {
  const report = read(file);
  const folders = new Map();
  for (const { name, status, assertionResults } of report?.testResults ?? []) {
    const passed = assertionResults.filter((test) => test.status === 'passed').length;
    const notPassed = assertionResults.length - passed;
    const failed = notPassed === 0 && status === 'failed' ? 1 : notPassed;
    const folder = /[\\/]tests[\\/]([^\\/]+)[\\/]/.exec(name)?.[1] ?? 'tests';
    const before = folders.get(folder) ?? { passed: 0, failed: 0 };
    folders.set(folder, { passed: before.passed + passed, failed: before.failed + failed });
  }
  return { ...sum([...folders.values()]), folders };
}

/**
 * @param {string} file the browser runner's JSON report
 * @returns counts in all; a flaky or skipped test and an error outside any test are failures
 */
export function countBrowser(file) {
  const report = read(file);
  if (!report) return { passed: 0, failed: 0 };
  const { expected, unexpected, flaky, skipped } = report.stats;
  return { passed: expected, failed: unexpected + flaky + skipped + report.errors.length };
}

/** A runner that ran nothing, or that failed without saying which test, counts as one failure. */
export function atLeastOneVerdict({ passed, failed }, exitCode) {
  const silent = failed === 0 && (exitCode !== 0 || passed === 0);
  return { passed, failed: silent ? 1 : failed };
}

/** @param {{ passed: number, failed: number }[]} counts */
export function sum(counts) {
  return counts.reduce(
    (total, { passed, failed }) => ({ passed: total.passed + passed, failed: total.failed + failed }),
    { passed: 0, failed: 0 },
  );
}

function read(file) {
  return existsSync(file) ? JSON.parse(readFileSync(file, 'utf8')) : undefined;
}
