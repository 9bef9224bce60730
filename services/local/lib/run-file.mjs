import { existsSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { isOurs } from './exec.mjs';

/**
 * @typedef {object} RunFile
 * @property {number} pid the starter
 * @property {string} address
 * @property {number[]} parts api and worker
 */

const fileOf = (/** @type {string} */ data) => join(data, 'running.json');

/**
 * @param {string} data
 * @param {RunFile} run
 */
export function writeRunFile(data, run) {
  writeFileSync(fileOf(data), `${JSON.stringify(run, null, 2)}\n`, { mode: 0o600 });
}

/** @param {string} data */
export function removeRunFile(data) {
  rmSync(fileOf(data), { force: true });
}

const commandLine = (/** @type {number} */ pid) => () => readFileSync(`/proc/${String(pid)}/cmdline`, 'utf8');

/**
 * What of an earlier start still runs. Process ids are checked against their command lines: they may have been given
 * to other programs since.
 * @param {string} data
 * @returns {{ starter: number | undefined, address: string, parts: number[] } | undefined}
 */
export function readRunning(data) {
  if (!existsSync(fileOf(data))) return undefined;
  const run = /** @type {RunFile} */ (JSON.parse(readFileSync(fileOf(data), 'utf8')));
  return {
    starter: isOurs(run.pid, commandLine(run.pid), 'start.mjs') ? run.pid : undefined,
    address: run.address,
    parts: run.parts.filter((pid) => isOurs(pid, commandLine(pid), 'dist/main.js')),
  };
}

/**
 * Asks the processes to end and waits until they have.
 * @param {number[]} pids
 * @returns {Promise<void>}
 */
export async function endAll(pids) {
  for (const pid of pids) process.kill(pid, 'SIGTERM');
  const alive = (/** @type {number} */ pid) => isOurs(pid, commandLine(pid), '');
  const until = Date.now() + 30_000;
  while (pids.some(alive) && Date.now() < until) await new Promise((resolve) => setTimeout(resolve, 100));
  for (const pid of pids.filter(alive)) process.kill(pid, 'SIGKILL');
}
