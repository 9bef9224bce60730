import { createHash } from 'node:crypto';
import { existsSync, mkdirSync, readdirSync } from 'node:fs';
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
    const running = runningPort(dir);
    if (running !== undefined) {
      note(`already running, ${where(running)}`);
      return { port: running, stop };
    }
    const port = await freePort();
    await startCluster({ dir, port });
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
