/**
 * `npm run dev`: the database of ./data, the compiler watching, api and worker starting anew when their output
 * changes, and the web app's own server, which reads our packages' sources directly.
 */
import { spawn } from 'node:child_process';
import process from 'node:process';
import { compile } from './lib/build.mjs';
import { migrateAndSeed, openDatabase } from './lib/database.mjs';
import { appEnvironment } from './lib/environment.mjs';
import { readStartOptions, requireNode } from './lib/options.mjs';
import { ensurePackages } from './lib/packages.mjs';
import { entry, installed, root, workspaceFiles } from './lib/paths.mjs';
import { requireFreePort } from './lib/serve.mjs';
import { fail, step } from './lib/step.mjs';

/** @type {import('node:child_process').ChildProcess[]} */
const children = [];

/**
 * @param {string[]} args of node
 * @param {NodeJS.ProcessEnv} env
 * @param {string} [cwd]
 */
function run(args, env, cwd = root) {
  children.push(
    spawn(process.execPath, args, { cwd, env, stdio: ['ignore', 'inherit', 'inherit'], detached: true }),
  );
}

try {
  requireNode();
  const { port, data } = readStartOptions(process.argv.slice(2));
  await requireFreePort(port);
  await ensurePackages();
  const { database, secrets, stop } = await openDatabase(data);
  const end = async () => {
    for (const child of children) child.kill('SIGTERM');
    await stop();
    process.exit(0);
  };
  for (const signal of /** @type {const} */ (['SIGINT', 'SIGTERM', 'SIGHUP']))
    process.once(signal, () => void end());

  await step('Compiling packages and services', compile);
  await migrateAndSeed(database, secrets, port);

  const env = { ...appEnvironment(database, secrets, port), NODE_ENV: 'development' };
  run(
    [
      installed('typescript/bin/tsc'),
      '-b',
      '--watch',
      '--preserveWatchOutput',
      ...workspaceFiles('tsconfig.build.json'),
    ],
    env,
  );
  run(['--watch', '--watch-preserve-output', entry.api], env);
  run(['--watch', '--watch-preserve-output', entry.worker], env);
  run(
    [installed('vite/bin/vite.js'), '--host', '127.0.0.1'],
    { ...env, NOONWELL_API_URL: `http://127.0.0.1:${String(port)}` },
    `${root}/services/web`,
  );
  process.stdout.write(
    `\nAPI at http://127.0.0.1:${String(port)}/api; the web app's address follows. Stop with Ctrl-C.\n`,
  );
} catch (error) {
  for (const child of children) child.kill('SIGTERM');
  fail(error);
}
