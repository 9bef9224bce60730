import process from 'node:process';
import { entry } from './paths.mjs';

/**
 * Environment of the app's processes: everything they need, stated once.
 * @param {import('./roles.mjs').DatabaseUrls} database
 * @param {import('./secrets.mjs').Secrets} secrets
 * @param {number} port
 * @returns {NodeJS.ProcessEnv}
 */
export function appEnvironment(database, secrets, port) {
  return {
    ...process.env,
    // The running app must not be able to change tables.
    DATABASE_OWNER_URL: undefined,
    NODE_ENV: process.env['NODE_ENV'] ?? 'production',
    HOST: '127.0.0.1',
    PORT: String(port),
    DATABASE_URL: database.appUrl,
    NOONWELL_JWT_SECRET: secrets.jwtSecret,
    NOONWELL_WEB_DIST: entry.web,
    NOONWELL_DEMO: process.env['NOONWELL_DEMO'] === 'off' ? 'off' : 'on',
  };
}

/**
 * Environment of the migration, which alone acts as the owner of the tables.
 * @param {import('./roles.mjs').DatabaseUrls} database
 * @returns {NodeJS.ProcessEnv}
 */
export function migrationEnvironment(database) {
  return { ...process.env, DATABASE_OWNER_URL: database.ownerUrl, DATABASE_APP_ROLE: database.appRole };
}
