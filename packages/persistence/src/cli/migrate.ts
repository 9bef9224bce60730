/** `node dist/cli/migrate.js`: DATABASE_OWNER_URL owns the tables; DATABASE_APP_ROLE, or else the user of DATABASE_URL, is the app's role. */
import process from 'node:process';
import { plainMessage } from '../database-errors.js';
import { migrateDatabase } from '../migrate.js';

function required(name: string): string {
  const value = process.env[name];
  if (value === undefined || value === '') throw new Error(`${name} is not set.`);
  return value;
}

try {
  const appRole =
    process.env['DATABASE_APP_ROLE'] ?? decodeURIComponent(new URL(required('DATABASE_URL')).username);
  await migrateDatabase(required('DATABASE_OWNER_URL'), appRole);
  process.stdout.write('The database has the present schema.\n');
} catch (error) {
  process.stderr.write(`Migration failed: ${plainMessage(error)}\n`);
  process.exitCode = 1;
}
