import { createHash } from 'node:crypto';
import { existsSync, mkdirSync, readFileSync, readdirSync } from 'node:fs';
import { connect } from 'node:net';
import { join } from 'node:path';
import {
  clusterMajor,
  freePort,
  hasCluster,
  initCluster,
  installedMajor,
  reachable,
  runningPort,
  startCluster,
  stopCluster,
} from '../../../packages/postgres-server/src/index.mjs';
import { StartError, step } from './step.mjs';

/**
 * Folder of our own PostgreSQL. Below the data folder, except when the account PostgreSQL has to run as cannot enter
 * it (root working in /root): then beside the system's other state, in a folder named after this data folder.
 * @param {string} data
 * @returns {string}
 */
export function clusterFolder(data) {
  mkdirSync(data, { recursive: true, mode: 0o711 });
  if (reachable(data)) return join(data, 'postgres');
  const outside = '/var/lib/noonwell';
  mkdirSync(outside, { recursive: true, mode: 0o711 });
  return join(outside, createHash('sha256').update(data).digest('hex').slice(0, 12));
}

/**
 * Starts our own PostgreSQL on loopback, creating it the first time; one left running is used as it is.
 * @param {string} data
 * @param {import('./secrets.mjs').Secrets} secrets
 * @param {boolean} secretsFresh whether the secrets were made just now
 * @returns {Promise<{ port: number, stop: () => Promise<void> }>}
 */
export async function startOwnPostgres(data, secrets, secretsFresh) {
  const dir = clusterFolder(data);
  return step('Starting PostgreSQL', async (note) => {
    const stop = () => stopCluster(dir);
    if (!hasCluster(dir)) {
      requireNothingThere(dir);
      await initCluster(dir, secrets.superuserPassword);
    } else if (secretsFresh) {
      throw new StartError(
        `There is a database in ${dir}, but its passwords in ${join(data, 'secrets.json')} are gone. Put that file back, or move the database folder away to start empty.`,
      );
    }
    requireSameMajor(dir);
    const where = (/** @type {number} */ port) => `127.0.0.1:${String(port)}, data in ${dir}`;
    const running = await answeringPort(dir);
    if (running !== undefined) {
      note(`already running, ${where(running)}`);
      return { port: running, stop };
    }
    const port = await freePort();
    try {
      await startCluster({ dir, port });
    } catch (error) {
      // Ctrl-C ends the program that starts the server, and perhaps not the server.
      await stopCluster(dir);
      throw error;
    }
    note(where(port));
    return { port, stop };
  });
}

/**
 * @param {string} data
 * @returns {Promise<boolean>} whether a server of ours was running
 */
export async function stopOwnPostgres(data) {
  if (!existsSync(data)) return false;
  const dir = clusterFolder(data);
  if (runningPort(dir) === undefined) return false;
  await stopCluster(dir);
  return true;
}

/**
 * @param {string} dir
 * @throws {StartError} when the database's folder holds something that is no database
 */
export function requireNothingThere(dir) {
  if (!existsSync(dir) || readdirSync(dir).length === 0) return;
  throw new StartError(
    `${dir} holds files, but no PostgreSQL database (PG_VERSION is missing). Move it away, put a backup back, or start empty: npm run reset`,
  );
}

/**
 * @param {string} dir
 * @throws {StartError} when another major version of PostgreSQL made the database
 */
export function requireSameMajor(dir) {
  const made = clusterMajor(dir);
  const installed = installedMajor();
  if (made === installed) return;
  throw new StartError(
    `The database in ${dir} was made by PostgreSQL ${made}, and version ${installed} is installed. Install postgresql-${made} again, or take the data over with pg_dumpall (see "Backups" in the README).`,
  );
}

const ANSWERS_WITHIN_MS = 15_000;

/**
 * Port of our PostgreSQL if it runs and answers. One that is just going down, or was killed and not yet buried, is
 * waited for.
 * @param {string} dir
 * @param {number} [withinMs]
 * @returns {Promise<number | undefined>} undefined when it does not run
 */
export async function answeringPort(dir, withinMs = ANSWERS_WITHIN_MS) {
  const until = Date.now() + withinMs;
  for (;;) {
    const port = runningPort(dir);
    if (port === undefined || (await answers(port))) return port;
    if (Date.now() > until) {
      const pid = readFileSync(join(dir, 'postmaster.pid'), 'utf8').split('\n')[0] ?? '';
      throw new StartError(
        `A PostgreSQL server (process ${pid}) holds ${dir}, but does not answer on port ${String(port)}. End it with: kill ${pid} — then start again.`,
      );
    }
    await new Promise((resolve) => setTimeout(resolve, 200));
  }
}

/**
 * @param {number} port
 * @returns {Promise<boolean>} whether anybody takes connections there
 */
function answers(port) {
  return new Promise((resolve) => {
    const socket = connect({ host: '127.0.0.1', port });
    const end = (/** @type {boolean} */ yes) => () => {
      socket.destroy();
      resolve(yes);
    };
    socket.once('connect', end(true));
    socket.once('error', end(false));
  });
}
