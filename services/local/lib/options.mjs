import { isAbsolute, join } from 'node:path';
import process from 'node:process';
import { parseArgs } from 'node:util';
import { root } from './paths.mjs';
import { StartError } from './step.mjs';

const DEFAULT_PORT = 8080;

const USAGE = `npm start -- [--port N] [--data DIR]
  --port N    port of the app on this machine (default ${String(DEFAULT_PORT)})
  --data DIR  folder for the database, secrets and logs (default ./data)
Environment:
  DATABASE_URL         use this PostgreSQL instead of starting one; the role must own the database and may create roles
  DATABASE_OWNER_URL   when set too: this role migrates, and DATABASE_URL is the role the app connects as
  REDIS_URL            use Redis for the queue instead of PostgreSQL
  NOONWELL_DEMO=off    leave the demo studies and demo sign-ins out`;

/**
 * @typedef {object} StartOptions
 * @property {number} port
 * @property {string} data absolute path
 */

/**
 * @param {string[]} args
 * @returns {StartOptions}
 */
export function readStartOptions(args) {
  let values;
  try {
    ({ values } = parseArgs({
      args,
      options: { port: { type: 'string' }, data: { type: 'string' }, help: { type: 'boolean' } },
    }));
  } catch (error) {
    throw new StartError(`${error instanceof Error ? error.message : String(error)}\n\n${USAGE}`);
  }
  if (values.help === true) {
    process.stdout.write(`${USAGE}\n`);
    process.exit(0);
  }
  const port = values.port === undefined ? DEFAULT_PORT : Number(values.port);
  if (!Number.isInteger(port) || port < 1 || port > 65535) {
    throw new StartError(`--port ${String(values.port)}: give a whole number from 1 to 65535.`);
  }
  const data = values.data ?? 'data';
  return { port, data: isAbsolute(data) ? data : join(root, data) };
}

/**
 * Said before anything else runs: older versions fail later with errors nobody can read.
 * @returns {void}
 */
export function requireNode() {
  const [major = 0, minor = 0] = process.versions.node.split('.').map(Number);
  if (major < 20 || (major === 20 && minor < 19)) {
    throw new StartError(`Node ${process.versions.node} is too old: install Node 20.19 or newer.`);
  }
}
