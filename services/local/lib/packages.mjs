import { existsSync, readFileSync } from 'node:fs';
import { join } from 'node:path';
import process from 'node:process';
import { capture } from './exec.mjs';
import { root } from './paths.mjs';
import { alone } from './hold.mjs';
import { INSTALL_MIB, requireSpace } from './space.mjs';
import { step } from './step.mjs';

/** @typedef {Record<string, { version?: string, link?: boolean, optional?: boolean, devOptional?: boolean }>} LockedPackages */

/**
 * @param {string} path
 * @returns {LockedPackages}
 */
function readLock(path) {
  return /** @type {{ packages: LockedPackages }} */ (JSON.parse(readFileSync(path, 'utf8'))).packages;
}

/**
 * First package that is locked but not installed in that version. npm writes what it installed into a hidden lock, so
 * this needs neither the network nor time stamps.
 * @returns {string | undefined}
 */
function firstMissing() {
  const hidden = join(root, 'node_modules/.package-lock.json');
  if (!existsSync(hidden)) return 'node_modules';
  const present = readLock(hidden);
  return Object.entries(readLock(join(root, 'package-lock.json'))).find(
    ([path, wanted]) =>
      path.includes('node_modules/') &&
      wanted.link !== true &&
      // Binaries for other systems are locked too.
      wanted.optional !== true &&
      wanted.devOptional !== true &&
      present[path]?.version !== wanted.version,
  )?.[0];
}

/**
 * Installs the npm packages when any is missing.
 * @returns {Promise<void>}
 */
export async function ensurePackages() {
  if (firstMissing() === undefined) return;
  await alone(install);
}

async function install() {
  // Whoever was waited for may have done it.
  if (firstMissing() === undefined) return;
  requireSpace(root, INSTALL_MIB, 'Installing the npm packages');
  await step('Installing npm packages (about a minute and a half the first time)', async () => {
    const npm = process.env['npm_execpath'];
    const [command, args] = npm === undefined ? ['npm', []] : [process.execPath, [npm]];
    await capture(command, [...args, 'ci', '--no-audit', '--no-fund'], { what: 'npm ci' });
  });
}
