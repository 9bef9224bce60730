import { mkdirSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { dirname, join } from 'node:path';
import process from 'node:process';
import { isOurs } from './exec.mjs';
import { root } from './paths.mjs';
import { step } from './step.mjs';

const POLL_MS = 250;

/** Commands of ours that take holds: a process id found in a hold counts only while it runs one of them. */
const HOLDERS = join('services', 'local');

/**
 * Takes a hold: a file with the process id of whoever works on what it stands for. One whose holder is gone is taken
 * over, so that a killed command leaves nothing to clean up.
 * @param {string} file
 * @returns {number | undefined} undefined when it is ours now, else the process that has it
 */
export function takeHold(file) {
  mkdirSync(dirname(file), { recursive: true, mode: 0o711 });
  for (;;) {
    try {
      writeFileSync(file, String(process.pid), { flag: 'wx', mode: 0o600 });
      return undefined;
    } catch (error) {
      if (/** @type {NodeJS.ErrnoException} */ (error).code !== 'EEXIST') throw error;
    }
    const holder = holderOf(file);
    if (holder === process.pid) return undefined;
    if (holder !== undefined) return holder;
    rmSync(file, { force: true });
  }
}

/**
 * @param {string} file
 * @returns {number | undefined} the living process that has the hold
 */
export function holderOf(file) {
  let text;
  try {
    text = readFileSync(file, 'utf8');
  } catch {
    return undefined;
  }
  const pid = Number(text);
  if (!Number.isInteger(pid) || pid < 1) return undefined;
  const commandLine = () => readFileSync(`/proc/${String(pid)}/cmdline`, 'utf8');
  return isOurs(pid, commandLine, HOLDERS) ? pid : undefined;
}

/**
 * Gives the hold back, if it is ours.
 * @param {string} file
 */
export function giveHold(file) {
  if (holderOf(file) === process.pid) rmSync(file, { force: true });
}

/**
 * Who runs on a data folder, from the first moment of a start to its end.
 * @param {string} data
 * @returns {string}
 */
export const dataHold = (data) => join(data, 'start.hold');

/** Who installs packages or builds in this repository: two at once would tread on each other's files. */
const REPOSITORY_HOLD = join(root, '.noonwell-working');

let depth = 0;

/**
 * Does work on the repository's own files when nobody else does; waits for them and says so.
 * @template T
 * @param {() => Promise<T>} work
 * @returns {Promise<T>}
 */
export async function alone(work) {
  const holder = takeHold(REPOSITORY_HOLD);
  if (holder !== undefined) {
    await step(`Waiting until process ${String(holder)} has installed and built here`, async () => {
      while (takeHold(REPOSITORY_HOLD) !== undefined)
        await new Promise((resolve) => setTimeout(resolve, POLL_MS));
    });
  }
  depth++;
  try {
    return await work();
  } finally {
    depth--;
    if (depth === 0) giveHold(REPOSITORY_HOLD);
  }
}
