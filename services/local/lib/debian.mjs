import { existsSync, mkdirSync, rmSync, writeFileSync } from 'node:fs';
import process from 'node:process';
import { DEBIAN_PACKAGE, findPostgresBin } from '../../../packages/postgres-server/src/index.mjs';
import { capture } from './exec.mjs';
import { StartError, step } from './step.mjs';

const CHROMIUM = '/usr/bin/chromium';
const NO_CLUSTER = '/etc/postgresql-common/createcluster.d/noonwell.conf';

let listsRefreshed = false;

/**
 * Installs a Debian package when this is root, else says the exact command.
 * @param {string} name
 * @param {string} purpose completes "is needed for …"
 * @returns {Promise<void>}
 */
async function installDebianPackage(name, purpose) {
  const root = process.getuid?.() === 0;
  if (!root || !existsSync('/usr/bin/apt-get')) {
    throw new StartError(
      `${name} is needed for ${purpose} and is not installed. Install it with\n\n    sudo apt-get install --yes --no-install-recommends ${name}\n\nand run this command again.`,
    );
  }
  await step(`Installing Debian's ${name}`, async () => {
    const env = { ...process.env, DEBIAN_FRONTEND: 'noninteractive' };
    // Somebody else's apt may hold the lock for a moment.
    const wait = ['-o', 'DPkg::Lock::Timeout=120'];
    if (!listsRefreshed) await capture('apt-get', [...wait, 'update'], { env });
    listsRefreshed = true;
    await capture('apt-get', [...wait, 'install', '--yes', '--no-install-recommends', name], { env });
  });
}

/**
 * PostgreSQL's programs. Debian's package would start a server of its own at once; a line in its configuration, there
 * only while installing, keeps it from that.
 * @returns {Promise<void>}
 */
export async function ensurePostgresPrograms() {
  if (findPostgresBin() !== undefined) return;
  const mayWrite = process.getuid?.() === 0;
  if (mayWrite) {
    mkdirSync('/etc/postgresql-common/createcluster.d', { recursive: true });
    writeFileSync(NO_CLUSTER, 'create_main_cluster = false\n');
  }
  try {
    await installDebianPackage(DEBIAN_PACKAGE, 'the database (or set DATABASE_URL)');
  } finally {
    if (mayWrite) rmSync(NO_CLUSTER, { force: true });
  }
}

/**
 * The browser of the end-to-end tests and the screenshots.
 * @returns {Promise<string>} path of the program
 */
export async function ensureChromium() {
  const given = process.env['NOONWELL_CHROMIUM'];
  if (given !== undefined && given !== '') return given;
  if (!existsSync(CHROMIUM)) await installDebianPackage('chromium', 'the browser tests');
  return CHROMIUM;
}
