/**
 * Starts and stops a PostgreSQL server of our own from Debian's binaries, on loopback only.
 *
 * Plain JavaScript without dependencies on purpose: `npm start` uses it before any package is installed, and the
 * test kit uses the same code for its throw-away servers. Types come from the comments and are checked.
 */
import { spawn, spawnSync } from 'node:child_process';
import {
  chmodSync,
  chownSync,
  existsSync,
  mkdirSync,
  readFileSync,
  readdirSync,
  renameSync,
  rmSync,
  writeFileSync,
} from 'node:fs';
import { createServer } from 'node:net';
import { delimiter, join } from 'node:path';
import process from 'node:process';

/**
 * @typedef {object} ClusterOptions
 * @property {string} dir data folder; created by {@link initCluster}, mode 0700, owned by the unprivileged user
 * @property {number} port TCP port on 127.0.0.1
 * @property {Record<string, string>} [settings] server settings beyond the defaults, e.g. `{ fsync: 'off' }`
 */

/** Name of the superuser that initdb creates. */
export const SUPERUSER = 'postgres';

/** Debian package that brings the server. */
export const DEBIAN_PACKAGE = 'postgresql';

/**
 * Folder with initdb, pg_ctl and postgres: from PATH, else the newest under /usr/lib/postgresql.
 * @returns {string | undefined} undefined when PostgreSQL is not installed
 */
export function findPostgresBin() {
  const onPath = (process.env['PATH'] ?? '').split(delimiter).filter((dir) => dir !== '');
  const debianRoot = '/usr/lib/postgresql';
  const debian = existsSync(debianRoot)
    ? readdirSync(debianRoot)
        .sort((a, b) => Number(b) - Number(a))
        .map((version) => join(debianRoot, version, 'bin'))
    : [];
  return [...onPath, ...debian].find((dir) =>
    ['initdb', 'pg_ctl', 'postgres'].every((name) => existsSync(join(dir, name))),
  );
}

/**
 * PostgreSQL refuses to run as root. For root this names the account Debian's package makes; anybody else runs it as
 * themselves.
 * @returns {{ uid: number, gid: number } | undefined} undefined when not root
 */
export function unprivilegedUser() {
  if (process.getuid?.() !== 0) return undefined;
  const line = readFileSync('/etc/passwd', 'utf8')
    .split('\n')
    .find((entry) => entry.startsWith(`${SUPERUSER}:`));
  if (line === undefined) {
    throw new Error(
      `This is root, and there is no account "${SUPERUSER}" to run PostgreSQL as. Install Debian's package ${DEBIAN_PACKAGE}.`,
    );
  }
  const [, , uid, gid] = line.split(':');
  return { uid: Number(uid), gid: Number(gid) };
}

/**
 * Whether the account PostgreSQL runs as can enter the folder (not so below /root, which is closed to others).
 * @param {string} dir an existing folder
 * @returns {boolean}
 */
export function reachable(dir) {
  const [command, args] = asUnprivileged('test', ['-x', dir]);
  return spawnSync(command, args, { cwd: '/' }).status === 0;
}

/**
 * A TCP port on loopback nobody listens on at this moment.
 * @returns {Promise<number>}
 */
export function freePort() {
  return new Promise((resolve, reject) => {
    const server = createServer();
    server.once('error', reject);
    server.listen(0, '127.0.0.1', () => {
      const address = server.address();
      server.close(() => {
        if (address === null || typeof address === 'string') reject(new Error('No TCP port was given out.'));
        else resolve(address.port);
      });
    });
  });
}

/**
 * Whether the folder already holds a cluster.
 * @param {string} dir
 * @returns {boolean}
 */
export function hasCluster(dir) {
  return existsSync(join(dir, 'PG_VERSION'));
}

/**
 * Creates an empty cluster: UTF-8, C collation (the same order on every machine), passwords with SCRAM only.
 * @param {string} dir data folder, must not hold a cluster yet
 * @param {string} superuserPassword password of {@link SUPERUSER}
 * @returns {Promise<void>}
 */
export async function initCluster(dir, superuserPassword) {
  const user = unprivilegedUser();
  // Made beside its place and moved there when whole: a start killed meanwhile leaves nothing that looks like a database.
  const making = `${dir}.new`;
  rmSync(making, { recursive: true, force: true });
  mkdirSync(making, { recursive: true, mode: 0o700 });
  chmodSync(making, 0o700);
  // initdb wants its folder empty, so the password file stands beside it.
  const passwordFile = `${dir}.pw`;
  writeFileSync(passwordFile, `${superuserPassword}\n`, { mode: 0o600 });
  if (user !== undefined) {
    chownSync(making, user.uid, user.gid);
    chownSync(passwordFile, user.uid, user.gid);
  }
  try {
    await run('initdb', [
      `--pgdata=${making}`,
      `--username=${SUPERUSER}`,
      `--pwfile=${passwordFile}`,
      '--auth=scram-sha-256',
      '--encoding=UTF8',
      '--locale=C.UTF-8',
      '--no-instructions',
    ]);
  } finally {
    rmSync(passwordFile, { force: true });
  }
  renameSync(making, dir);
}

/**
 * Major version that made the cluster, as "15".
 * @param {string} dir data folder of a cluster
 * @returns {string}
 */
export function clusterMajor(dir) {
  return readFileSync(join(dir, 'PG_VERSION'), 'utf8').trim();
}

/**
 * Major version of the installed programs, as "15".
 * @returns {string}
 */
export function installedMajor() {
  const { stdout } = spawnSync(binary('postgres'), ['--version'], { cwd: '/', encoding: 'utf8' });
  return /(\d+)/.exec(stdout)?.[1] ?? '';
}

/**
 * Starts the cluster and returns when it answers.
 * @param {ClusterOptions} options
 * @returns {Promise<void>}
 * @throws {Error} with the end of the server's log when it does not come up
 */
export async function startCluster({ dir, port, settings = {} }) {
  const all = { listen_addresses: '127.0.0.1', unix_socket_directories: '', port: String(port), ...settings };
  const options = Object.entries(all)
    .map(([name, value]) => `-c ${name}='${value}'`)
    .join(' ');
  const log = join(dir, 'server.log');
  try {
    await run('pg_ctl', [
      `--pgdata=${dir}`,
      `--log=${log}`,
      `--options=${options}`,
      '--wait',
      '--timeout=60',
      'start',
    ]);
  } catch (cause) {
    const tail = existsSync(log)
      ? readFileSync(log, 'utf8').trimEnd().split('\n').slice(-8).join('\n')
      : '(no log)';
    throw new Error(
      `PostgreSQL in ${dir} did not start on port ${String(port)}. The end of its log:\n${tail}`,
      { cause },
    );
  }
}

/**
 * Port of the running cluster.
 * @param {string} dir data folder
 * @returns {number | undefined} undefined when it does not run
 */
export function runningPort(dir) {
  const pidFile = join(dir, 'postmaster.pid');
  if (!existsSync(pidFile)) return undefined;
  const [command, args] = asUnprivileged(binary('pg_ctl'), [`--pgdata=${dir}`, 'status']);
  if (spawnSync(command, args, { cwd: '/' }).status !== 0) return undefined;
  const port = Number(readFileSync(pidFile, 'utf8').split('\n')[3]);
  return Number.isInteger(port) ? port : undefined;
}

/**
 * Stops the cluster by the process id in its own data folder; open sessions are rolled back. Fine when it does not run.
 * @param {string} dir data folder
 * @returns {Promise<void>}
 */
export async function stopCluster(dir) {
  if (runningPort(dir) === undefined) return;
  await run('pg_ctl', [`--pgdata=${dir}`, '--mode=fast', '--wait', '--timeout=30', 'stop']);
}

/**
 * @param {string} name
 * @returns {string}
 */
function binary(name) {
  const bin = findPostgresBin();
  if (bin === undefined) {
    throw new Error(
      `PostgreSQL is not installed: initdb, pg_ctl and postgres are neither on PATH nor under /usr/lib/postgresql. Install Debian's package ${DEBIAN_PACKAGE}.`,
    );
  }
  return join(bin, name);
}

/**
 * @param {string} command
 * @param {string[]} args
 * @returns {[string, string[]]}
 */
function asUnprivileged(command, args) {
  const user = unprivilegedUser();
  if (user === undefined) return [command, args];
  return [
    'setpriv',
    [`--reuid=${String(user.uid)}`, `--regid=${String(user.gid)}`, '--clear-groups', command, ...args],
  ];
}

/**
 * The streams are dropped when the command itself ends: the server that pg_ctl leaves running would hold them open.
 * @param {string} name
 * @param {string[]} args
 * @returns {Promise<void>}
 */
function run(name, args) {
  const [command, commandArgs] = asUnprivileged(binary(name), args);
  return new Promise((resolve, reject) => {
    const child = spawn(command, commandArgs, { cwd: '/', stdio: ['ignore', 'pipe', 'pipe'] });
    let output = '';
    const collect = (/** @type {Buffer} */ chunk) => (output += chunk.toString());
    child.stdout.on('data', collect);
    child.stderr.on('data', collect);
    child.once('error', reject);
    child.once('exit', (code) => {
      child.stdout.destroy();
      child.stderr.destroy();
      if (code === 0) resolve();
      else reject(new Error(`${name} ended with code ${String(code)}:\n${output.trim()}`));
    });
  });
}
