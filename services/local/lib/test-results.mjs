import { existsSync, readFileSync } from 'node:fs';

/**
 * @typedef {object} Tally
 * @property {number} passed
 * @property {number} failed
 * @property {string[]} skipped names of tests that did not run
 * @property {string[]} failures names of tests that failed
 */

/** @typedef {{ title: string, fullName?: string, status: string }} Assertion */
/** @typedef {{ name: string, status: string, assertionResults: Assertion[] }} FileResult */
/** @typedef {{ testResults: FileResult[] }} Report jest's JSON, which vitest writes too */

/** @returns {Tally} */
export function emptyTally() {
  return { passed: 0, failed: 0, skipped: [], failures: [] };
}

/**
 * @param {Tally} tally
 * @param {string} failure
 */
export function addFailure(tally, failure) {
  tally.failed += 1;
  tally.failures.push(failure);
}

/**
 * Adds what a runner reported. A runner that died, wrote nothing, or failed although no test did counts as one failure:
 * silence must never look like success.
 * @param {Tally} tally
 * @param {string} runner
 * @param {string} file JSON report
 * @param {number} exitCode of the runner
 */
export function addReport(tally, runner, file, exitCode) {
  if (!existsSync(file)) {
    addFailure(tally, `${runner} ended with code ${String(exitCode)} and wrote no report`);
    return;
  }
  const { testResults } = /** @type {Report} */ (JSON.parse(readFileSync(file, 'utf8')));
  const before = tally.failed;
  let ran = 0;
  for (const { name, status, assertionResults } of testResults) {
    let fileFailures = 0;
    for (const test of assertionResults) {
      const title = test.fullName ?? test.title;
      if (test.status === 'passed') {
        tally.passed += 1;
        ran += 1;
      } else if (test.status === 'failed') {
        addFailure(tally, `${runner}: ${title}`);
        fileFailures += 1;
        ran += 1;
      } else tally.skipped.push(`${runner}: ${title}`);
    }
    // A file that cannot be loaded reports no test of its own.
    if (status === 'failed' && fileFailures === 0) addFailure(tally, `${runner}: ${name} did not run`);
  }
  if (tally.failed > before) return;
  if (ran === 0) addFailure(tally, `${runner} ran no test`);
  else if (exitCode !== 0)
    addFailure(tally, `${runner} ended with code ${String(exitCode)} although every test passed`);
}

/**
 * The closing lines; the last one is what a build server reads.
 * @param {Tally} tally
 * @returns {string}
 */
export function closingLines({ passed, failed, skipped, failures }) {
  const list = (/** @type {string} */ title, /** @type {string[]} */ names) =>
    names.length === 0 ? [] : [`${title}:`, ...names.map((name) => `  ${name}`)];
  return [
    ...list(`${String(skipped.length)} skipped`, skipped),
    ...list('Failed', failures),
    `${String(passed)} passed, ${String(failed)} failed`,
  ].join('\n');
}
