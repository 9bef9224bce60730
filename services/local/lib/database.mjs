import process from 'node:process';
import { ensurePostgresPrograms } from './debian.mjs';
import { startOwnPostgres } from './cluster.mjs';
import { capture } from './exec.mjs';
import { appEnvironment, migrationEnvironment } from './environment.mjs';
import { entry } from './paths.mjs';
import { ensureGivenRoles, ensureOwnRoles } from './roles.mjs';
import { readOrCreateSecrets } from './secrets.mjs';
import { step } from './step.mjs';

/**
 * The database, started and with its roles, but not migrated yet.
 * @param {string} data
 * @returns {Promise<{ database: import('./roles.mjs').DatabaseUrls, secrets: import('./secrets.mjs').Secrets, stop: () => Promise<void> }>}
 */
export async function openDatabase(data) {
  const given = process.env['DATABASE_URL'];
  const { secrets, fresh } = readOrCreateSecrets(data);
  if (given !== undefined && given !== '') {
    const database = await step('Connecting to the PostgreSQL in DATABASE_URL', () =>
      ensureGivenRoles(given, process.env['DATABASE_OWNER_URL'], secrets),
    );
    return { database, secrets, stop: () => Promise.resolve() };
  }
  await ensurePostgresPrograms();
  const server = await startOwnPostgres(data, secrets, fresh);
  try {
    return { database: await ensureOwnRoles(server.port, secrets), secrets, stop: server.stop };
  } catch (error) {
    await server.stop();
    throw error;
  }
}

/**
 * Brings the tables to the present schema, then adds the demo unless NOONWELL_DEMO=off.
 * @param {import('./roles.mjs').DatabaseUrls} database
 * @param {import('./secrets.mjs').Secrets} secrets
 * @param {number} port
 * @returns {Promise<void>}
 */
export async function migrateAndSeed(database, secrets, port) {
  await step('Migrating the database', async () => {
    await capture(process.execPath, [entry.migrate], {
      env: migrationEnvironment(database),
      what: 'The migration',
    });
  });
  const env = appEnvironment(database, secrets, port);
  if (env['NOONWELL_DEMO'] === 'off') return;
  await step('Seeding the demo (invented data)', async () => {
    await capture(process.execPath, [entry.seed], { env, what: 'Seeding the demo' });
  });
}
