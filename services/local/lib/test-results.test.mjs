import { mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterEach, beforeEach, describe, expect, it } from 'vitest';
import { addReport, closingLines, emptyTally } from './test-results.mjs';

describe('counting what the test runners report', () => {
  let folder = '';

  beforeEach(() => {
    folder = mkdtempSync(join(tmpdir(), 'noonwell-results-'));
  });
  afterEach(() => {
    rmSync(folder, { recursive: true, force: true });
  });

  /**
   * @param {{ status: string, tests: [title: string, status: string][] }[]} files
   * @param {number} exitCode
   */
  function tallyOf(files, exitCode) {
    const report = join(folder, 'report.json');
    writeFileSync(
      report,
      JSON.stringify({
        testResults: files.map(({ status, tests }, index) => ({
          name: `file${String(index)}`,
          status,
          assertionResults: tests.map(([title, result]) => ({ title, fullName: title, status: result })),
        })),
      }),
    );
    const tally = emptyTally();
    addReport(tally, 'runner', report, exitCode);
    return tally;
  }

  it('counts passed and failed and names the skipped', () => {
    const tally = tallyOf(
      [
        {
          status: 'passed',
          tests: [
            ['a', 'passed'],
            ['b', 'pending'],
            ['c', 'todo'],
          ],
        },
        {
          status: 'failed',
          tests: [
            ['d', 'failed'],
            ['e', 'passed'],
          ],
        },
      ],
      1,
    );
    expect(tally).toEqual({
      passed: 2,
      failed: 1,
      skipped: ['runner: b', 'runner: c'],
      failures: ['runner: d'],
    });
    expect(closingLines(tally).split('\n').at(-1)).toBe('2 passed, 1 failed');
  });

  it('counts a file that could not be loaded as a failure', () => {
    const tally = tallyOf(
      [
        { status: 'passed', tests: [['a', 'passed']] },
        { status: 'failed', tests: [] },
      ],
      1,
    );
    expect(tally.failures).toEqual(['runner: file1 did not run']);
  });

  it('never takes silence for success', () => {
    const missing = emptyTally();
    addReport(missing, 'runner', join(folder, 'never-written.json'), 0);
    expect(missing.failed).toBe(1);
    expect(tallyOf([], 0).failures).toEqual(['runner ran no test']);
    expect(tallyOf([{ status: 'passed', tests: [['a', 'pending']] }], 0).failures).toEqual([
      'runner ran no test',
    ]);
  });

  it('fails when the runner fails although every test passed', () => {
    const tally = tallyOf([{ status: 'passed', tests: [['a', 'passed']] }], 1);
    expect(tally).toMatchObject({ passed: 1, failed: 1 });
  });
});
