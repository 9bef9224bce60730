import { randomBytes } from 'node:crypto';
import { chmodSync, existsSync, mkdirSync, readFileSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';

/**
 * @typedef {object} Secrets
 * @property {string} superuserPassword of our own PostgreSQL
 * @property {string} ownerPassword of the role that owns the tables
 * @property {string} appPassword of the role the app connects as
 * @property {string} jwtSecret signs access tokens
 */

/**
 * Reads the secrets of this data folder, or makes them the first time. Only this account may read the file.
 * @param {string} data
 * @returns {{ secrets: Secrets, fresh: boolean }}
 */
export function readOrCreateSecrets(data) {
  mkdirSync(data, { recursive: true, mode: 0o711 });
  // PostgreSQL runs as another account below root and has to pass through, but not list.
  chmodSync(data, 0o711);
  const file = join(data, 'secrets.json');
  if (existsSync(file)) {
    return { secrets: /** @type {Secrets} */ (JSON.parse(readFileSync(file, 'utf8'))), fresh: false };
  }
  const secret = () => randomBytes(32).toString('hex');
  const secrets = {
    superuserPassword: secret(),
    ownerPassword: secret(),
    appPassword: secret(),
    jwtSecret: secret(),
  };
  writeFileSync(file, `${JSON.stringify(secrets, null, 2)}\n`, { mode: 0o600 });
  return { secrets, fresh: true };
}
