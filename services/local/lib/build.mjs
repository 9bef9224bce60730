import { existsSync, mkdirSync, readdirSync, statSync, utimesSync, writeFileSync } from 'node:fs';
import { dirname, join } from 'node:path';
import process from 'node:process';
import { capture } from './exec.mjs';
import { alone } from './hold.mjs';
import { entry, installed, root, workspaceFiles } from './paths.mjs';
import { step } from './step.mjs';

const STAMP = join(root, '.tsbuild/built');
const SKIPPED = new Set(['node_modules', 'dist', '.tsbuild', 'e2e', 'test', 'validation', 'docs']);

/**
 * Newest change below a folder, in ms since 1970; tests do not count, they are not built.
 * @param {string} folder
 * @returns {number}
 */
function newest(folder) {
  let time = 0;
  for (const item of readdirSync(folder, { withFileTypes: true })) {
    if (SKIPPED.has(item.name) || /\.(test|spec)\.tsx?$/.test(item.name)) continue;
    const path = join(folder, item.name);
    time = Math.max(time, item.isDirectory() ? newest(path) : statSync(path).mtimeMs);
  }
  return time;
}

/**
 * Whether any source is newer than the last complete build.
 * @returns {boolean}
 */
function outdated() {
  const results = [entry.migrate, entry.api, entry.worker, join(entry.web, 'index.html')];
  if (!existsSync(STAMP) || !results.every((path) => existsSync(path))) return true;
  const sources = Math.max(
    newest(join(root, 'packages')),
    newest(join(root, 'services')),
    ...['package-lock.json', 'tsconfig.base.json'].map((name) => statSync(join(root, name)).mtimeMs),
  );
  return sources > statSync(STAMP).mtimeMs;
}

/**
 * Compiles packages and services, and bundles the web app, when a source is newer than the last build.
 * @param {{ force?: boolean }} [options]
 * @returns {Promise<void>}
 */
export async function ensureBuilt({ force = false } = {}) {
  if (!force && !outdated()) return;
  await alone(() => build(force));
}

/** @param {boolean} force */
async function build(force) {
  // Whoever was waited for may have done it.
  if (!force && !outdated()) return;
  // Taken before building: a source saved meanwhile must count as newer.
  const started = new Date();
  await step('Compiling packages and services', () => compile());
  await step('Bundling the web app', async () => {
    await capture(
      process.execPath,
      [installed('vite/bin/vite.js'), 'build', 'services/web', '--logLevel', 'warn'],
      {
        env: { ...process.env, NODE_ENV: 'production' },
        what: 'vite build',
      },
    );
  });
  mkdirSync(dirname(STAMP), { recursive: true });
  writeFileSync(STAMP, '');
  utimesSync(STAMP, started, started);
}

/**
 * @returns {Promise<void>}
 */
export async function compile() {
  const projects = workspaceFiles('tsconfig.build.json');
  // tsc trusts its notes and would not make a dist folder again that somebody deleted.
  const forced = projects.every((project) => existsSync(join(root, dirname(project), 'dist')))
    ? []
    : ['--force'];
  await capture(process.execPath, [installed('typescript/bin/tsc'), '-b', ...forced, ...projects], {
    what: 'tsc -b',
  });
}
