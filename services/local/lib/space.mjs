import { existsSync, statfsSync } from 'node:fs';
import { dirname } from 'node:path';
import { StartError } from './step.mjs';

const MIB = 1024 * 1024;

/** What an installation takes with its build, and what a first database with its logs takes; both with room to spare. */
export const INSTALL_MIB = 1500;
export const DATABASE_MIB = 300;

/**
 * Says that the disk is too full before it is found out half-way.
 * @param {string} path a file or folder, there or not yet
 * @param {number} neededMib
 * @param {string} purpose
 * @param {(folder: string) => { bavail: number, bsize: number }} [stat] asks the file system
 * @returns {void}
 */
export function requireSpace(path, neededMib, purpose, stat = statfsSync) {
  let folder = path;
  while (!existsSync(folder)) folder = dirname(folder);
  const { bavail, bsize } = stat(folder);
  const freeMib = Math.floor((bavail * bsize) / MIB);
  if (freeMib >= neededMib) return;
  throw new StartError(
    `${purpose} needs about ${String(neededMib)} MiB, and ${folder} has ${String(freeMib)} MiB left. Make room there, or choose another data folder: npm start -- --data DIR`,
  );
}
