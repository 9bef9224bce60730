import { spawn } from 'node:child_process';
import { closeSync, mkdirSync, openSync, readFileSync } from 'node:fs';
import { createServer } from 'node:net';
import { join } from 'node:path';
import process from 'node:process';
import { entry, root } from './paths.mjs';
import { StartError, step } from './step.mjs';

const READY_WITHIN_MS = 60_000;
const STOP_WITHIN_MS = 15_000;

/**
 * @typedef {object} Part
 * @property {string} name
 * @property {string} log path of its log file
 * @property {import('node:child_process').ChildProcess} child
 * @property {Promise<number | NodeJS.Signals | null>} ended exit code, or the signal that ended it
 */

/**
 * Fails with a sentence when the port is taken, before any other work is done.
 * @param {number} port
 * @returns {Promise<void>}
 */
export function requireFreePort(port) {
  return new Promise((resolve, reject) => {
    const probe = createServer();
    probe.once('error', (/** @type {NodeJS.ErrnoException} */ error) => {
      const reason = error.code === 'EADDRINUSE' ? 'another program listens there' : error.message;
      reject(
        new StartError(
          `Port ${String(port)} cannot be used: ${reason}. Choose another: npm start -- --port ${String(port + 1)}`,
        ),
      );
    });
    probe.listen(port, '127.0.0.1', () => {
      probe.close(() => {
        resolve();
      });
    });
  });
}

/**
 * Starts one of the app's processes. It gets a process group of its own: Ctrl-C must reach only the starter, which then
 * stops the parts in order.
 * @param {string} name
 * @param {string} script
 * @param {NodeJS.ProcessEnv} env
 * @param {string} data
 * @returns {Part}
 */
export function startPart(name, script, env, data) {
  const logs = join(data, 'log');
  mkdirSync(logs, { recursive: true });
  const log = join(logs, `${name}.log`);
  const output = openSync(log, 'a', 0o600);
  const child = spawn(process.execPath, [script], {
    cwd: root,
    env,
    detached: true,
    stdio: ['ignore', output, output],
  });
  closeSync(output);
  const ended = new Promise((resolve) => {
    child.once('exit', (code, signal) => {
      resolve(code ?? signal);
    });
    child.once('error', () => {
      resolve(null);
    });
  });
  return { name, log, child, ended };
}

/**
 * The error for a part that ended by itself, with the end of its log.
 * @param {Part} part
 * @param {number | NodeJS.Signals | null} how
 * @returns {StartError}
 */
export function endedError(part, how) {
  const tail = readFileSync(part.log, 'utf8').trimEnd().split('\n').slice(-15).join('\n');
  return new StartError(
    `The ${part.name} ended by itself (${String(how)}). The end of ${part.log}:\n${tail}`,
  );
}

/**
 * Starts api and worker and waits until the api answers.
 * @param {NodeJS.ProcessEnv} env
 * @param {string} address
 * @param {string} data
 * @param {(part: Part) => void} started called for each part at once, so that it can be stopped whatever happens next
 * @returns {Promise<void>}
 */
export async function serve(env, address, data, started) {
  await step('Starting api and worker', async () => {
    const api = startPart('api', entry.api, env, data);
    started(api);
    const worker = startPart('worker', entry.worker, env, data);
    started(worker);
    const fallen = Promise.race(
      [api, worker].map(async (part) => Promise.reject(endedError(part, await part.ended))),
    );
    // Looked at below as long as it matters; afterwards the starter watches the parts itself.
    fallen.catch(() => undefined);
    await Promise.race([ready(`${address}/api/health`), fallen]);
  });
}

/**
 * @param {string} url
 * @returns {Promise<void>}
 */
async function ready(url) {
  const until = Date.now() + READY_WITHIN_MS;
  while (Date.now() < until) {
    try {
      if ((await fetch(url)).ok) return;
    } catch {
      // Not listening yet.
    }
    await new Promise((resolve) => setTimeout(resolve, 100));
  }
  throw new StartError(`${url} did not answer within ${String(READY_WITHIN_MS / 1000)} s.`);
}

/**
 * Asks a part to end and insists after a while. 143 after SIGTERM is a clean end.
 * @param {Part} part
 * @returns {Promise<void>}
 */
export async function stopPart(part) {
  if (part.child.exitCode !== null || part.child.signalCode !== null) return;
  part.child.kill('SIGTERM');
  const insist = setTimeout(() => part.child.kill('SIGKILL'), STOP_WITHIN_MS);
  await part.ended;
  clearTimeout(insist);
}
