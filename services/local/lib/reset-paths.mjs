import { existsSync } from 'node:fs';
import { join } from 'node:path';
import { StartError } from './step.mjs';

/**
 * What a start makes: nothing else in the folder is ever deleted.
 * @param {string} data
 * @param {string} cluster the database's folder
 * @returns {string[]}
 */
export function ownedPaths(data, cluster) {
  const files = ['secrets.json', 'running.json', 'start.hold', 'log'].map((name) => join(data, name));
  return [cluster, `${cluster}.new`, `${cluster}.pw`, ...files];
}

/**
 * @param {string} data
 * @throws {StartError} when the folder was not made by a start
 */
export function requireOurData(data) {
  if (existsSync(join(data, 'secrets.json')) || existsSync(join(data, 'postgres'))) return;
  throw new StartError(
    `${data} holds no data of Noonwell: nothing was deleted. Name its folder: npm run reset -- --data DIR`,
  );
}
