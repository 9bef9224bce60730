/**
 * `npm test`: brings what the tests need, runs all of them and ends with one line of counts. `--long` repeats property,
 * fuzz and soak tests more often; `--only types|vitest|jest|e2e` runs one part.
 */
import { existsSync, mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join, resolve } from 'node:path';
import process from 'node:process';
import { parseArgs } from 'node:util';
import { ensureChromium, ensurePostgresPrograms } from './lib/debian.mjs';
import { show } from './lib/exec.mjs';
import { requireNode } from './lib/options.mjs';
import { ensurePackages } from './lib/packages.mjs';
import { installed, root } from './lib/paths.mjs';
import { addFailure, addReport, closingLines, emptyTally } from './lib/test-results.mjs';
import { startThrowAwayApp } from './lib/throw-away-app.mjs';
import { typeCheck } from './lib/type-check.mjs';

/** Repeats of each property, fuzz and soak test in a long run; in a short one each test has its own default. */
const LONG_COUNT = '2000';

const PARTS = /** @type {const} */ (['types', 'vitest', 'jest', 'e2e']);

const { values } = parseArgs({ options: { long: { type: 'boolean' }, only: { type: 'string' } } });
const wanted = (/** @type {typeof PARTS[number]} */ part) =>
  values.only === undefined || values.only === part;

const reports = mkdtempSync(join(tmpdir(), 'noonwell-reports-'));
const tally = emptyTally();

/** @param {string} title */
function heading(title) {
  process.stdout.write(`\n── ${title}\n`);
}

/** Files from outside the repository are extra cases: used when they are there, named as skipped when not. */
function environment() {
  const beside = resolve(root, '../shared/weather');
  const weather = process.env['NOONWELL_WEATHER_DIR'] ?? (existsSync(beside) ? beside : undefined);
  return {
    ...process.env,
    ...(values.long === true
      ? { NOONWELL_TEST_COUNT: process.env['NOONWELL_TEST_COUNT'] ?? LONG_COUNT }
      : {}),
    ...(weather === undefined ? {} : { NOONWELL_WEATHER_DIR: weather }),
  };
}

/**
 * @param {string} config
 * @param {string} name
 * @param {NodeJS.ProcessEnv} env
 */
async function vitest(config, name, env) {
  const file = join(reports, `${name}.json`);
  const args = [
    'run',
    '--config',
    config,
    '--reporter=default',
    '--reporter=json',
    `--outputFile.json=${file}`,
  ];
  addReport(tally, name, file, await show(process.execPath, [installed('vitest/vitest.mjs'), ...args], env));
}

/** @param {NodeJS.ProcessEnv} env */
async function jest(env) {
  const file = join(reports, 'jest.json');
  const args = ['--json', `--outputFile=${file}`, '--silent'];
  const code = await show(process.execPath, [installed('jest/bin/jest.js'), ...args], env);
  addReport(tally, 'jest', file, code);
}

/** @param {NodeJS.ProcessEnv} env */
async function endToEnd(env) {
  const chromium = await ensureChromium();
  const app = await startThrowAwayApp();
  try {
    await vitest('services/web/vitest.e2e.config.js', 'e2e', {
      ...env,
      NOONWELL_E2E_URL: app.address,
      NOONWELL_CHROMIUM: chromium,
    });
  } finally {
    await app.stop();
  }
}

async function main() {
  requireNode();
  if (values.only !== undefined && !PARTS.some((part) => part === values.only)) {
    throw new Error(`--only ${values.only}: choose one of ${PARTS.join(', ')}.`);
  }
  await ensurePackages();
  const env = environment();
  if (wanted('types')) {
    heading('Types');
    if (!(await typeCheck())) addFailure(tally, 'type check');
  }
  if (wanted('vitest')) {
    heading('Packages and web');
    await ensurePostgresPrograms();
    await vitest('vitest.config.js', 'vitest', env);
  }
  if (wanted('jest')) {
    heading('Database, API and worker');
    await ensurePostgresPrograms();
    await jest(env);
  }
  if (wanted('e2e')) {
    heading('The built app in a browser');
    try {
      await endToEnd(env);
    } catch (error) {
      process.stderr.write(`${error instanceof Error ? error.message : String(error)}\n`);
      addFailure(tally, 'the built app starts, serves and stops');
    }
  }
  heading('Result');
  if (env.NOONWELL_WEATHER_DIR === undefined) {
    process.stdout.write('NOONWELL_WEATHER_DIR is not set: real weather files were not read.\n');
  }
}

try {
  await main();
} catch (error) {
  process.stderr.write(`${error instanceof Error ? error.message : String(error)}\n`);
  addFailure(tally, 'setting up the tests');
} finally {
  rmSync(reports, { recursive: true, force: true });
}
process.exitCode = tally.failed > 0 || tally.passed === 0 ? 1 : 0;
process.stdout.write(`${closingLines(tally)}\n`);
