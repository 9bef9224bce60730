import { spawn } from 'node:child_process';
import process from 'node:process';
import { root } from './paths.mjs';
import { StartError } from './step.mjs';

/**
 * Runs a program to its end; its output is kept and shown only when it fails.
 * @param {string} command
 * @param {string[]} args
 * @param {{ env?: NodeJS.ProcessEnv, what?: string }} [options] `what` names the action in the error
 * @returns {Promise<string>} standard output
 */
export function capture(command, args, { env = process.env, what = [command, ...args].join(' ') } = {}) {
  return new Promise((resolve, reject) => {
    const child = spawn(command, args, { cwd: root, env, stdio: ['ignore', 'pipe', 'pipe'] });
    let out = '';
    let all = '';
    child.stdout.on('data', (/** @type {Buffer} */ chunk) => {
      out += chunk.toString();
      all += chunk.toString();
    });
    child.stderr.on('data', (/** @type {Buffer} */ chunk) => (all += chunk.toString()));
    child.once('error', reject);
    child.once('close', (code) => {
      if (code === 0) resolve(out);
      else reject(new StartError(`${what} failed (code ${String(code)}):\n${all.trim()}`));
    });
  });
}

/**
 * Runs a program that writes to our own terminal.
 * @param {string} command
 * @param {string[]} args
 * @param {NodeJS.ProcessEnv} [env]
 * @returns {Promise<number>} its exit code; 1 when a signal ended it
 */
export function show(command, args, env = process.env) {
  return new Promise((resolve, reject) => {
    const child = spawn(command, args, { cwd: root, env, stdio: 'inherit' });
    child.once('error', reject);
    child.once('close', (code) => {
      resolve(code ?? 1);
    });
  });
}

/**
 * Whether the process still runs and its command line holds the given words: a process id alone may have been given
 * to somebody else since.
 * @param {number} pid
 * @param {() => string} commandLine reads the command line of that process
 * @param {string} words
 * @returns {boolean}
 */
export function isOurs(pid, commandLine, words) {
  try {
    process.kill(pid, 0);
    return commandLine().includes(words);
  } catch {
    return false;
  }
}
