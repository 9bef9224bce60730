import { existsSync, readdirSync } from 'node:fs';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';

/** Root folder of the repository. */
export const root = fileURLToPath(new URL('../../..', import.meta.url)).replace(/\/$/, '');

/** What the built parts are started from; the starter and the developer commands read the same list. */
export const entry = {
  migrate: join(root, 'packages/persistence/dist/cli/migrate.js'),
  seed: join(root, 'services/worker/dist/seed-demo.js'),
  api: join(root, 'services/api/dist/main.js'),
  worker: join(root, 'services/worker/dist/main.js'),
  web: join(root, 'services/web/dist'),
};

/**
 * Every workspace folder that holds a file of this name, so that a new package needs no line anywhere.
 * @param {string} file
 * @returns {string[]} paths of those files, relative to the root
 */
export function workspaceFiles(file) {
  return ['packages', 'services']
    .flatMap((group) => readdirSync(join(root, group)).map((name) => join(group, name, file)))
    .concat(join('bench', file))
    .filter((path) => existsSync(join(root, path)));
}

/**
 * The script a package installs as its command. Started with node itself: npx would leave the program running when it
 * is killed.
 * @param {string} path below node_modules, e.g. `typescript/bin/tsc`
 * @returns {string}
 */
export function installed(path) {
  return join(root, 'node_modules', path);
}
