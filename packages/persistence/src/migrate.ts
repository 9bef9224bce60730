import { MikroORM } from '@mikro-orm/postgresql';
import { Migrator } from '@mikro-orm/migrations';
import pg from 'pg';
import { APP_GRANTS } from './grants.js';
import { MIGRATIONS } from './migrations/index.js';
import { ormOptions } from './orm.js';
import { migrateQueue } from './queue/migrate.js';

/** The database cannot be brought to the present schema; the message says what to change. */
export class MigrationError extends Error {
  override readonly name = 'MigrationError';
}

/**
 * Brings a database to the present schema as its owner, queue tables included, and grants the app role what it
 * needs. Running it again changes nothing.
 *
 * @param ownerUrl connection string of the role that owns the database
 * @param appRole name of the role the API and the worker connect with
 */
export async function migrateDatabase(ownerUrl: string, appRole: string): Promise<void> {
  await refuseStrongAppRole(ownerUrl, appRole);
  const orm = await MikroORM.init({
    ...ormOptions({ databaseUrl: ownerUrl, poolMax: 2 }),
    extensions: [Migrator],
    migrations: {
      migrationsList: MIGRATIONS,
      tableName: 'noonwell_migrations',
      snapshot: false,
      silent: true,
      allOrNothing: true,
      transactional: true,
    },
  });
  try {
    await orm.migrator.up();
  } finally {
    await orm.close(true);
  }
  await withOwner(ownerUrl, async (client) => {
    await migrateQueue(client, appRole);
    const role = client.escapeIdentifier(appRole);
    await client.query(`grant usage on schema public to ${role}`);
    for (const [table, rights] of Object.entries(APP_GRANTS)) {
      await client.query(`revoke all on ${table} from ${role}`);
      await client.query(`grant ${rights.join(', ')} on ${table} to ${role}`);
    }
  });
}

/** Row-level security means nothing to a superuser or to a role with BYPASSRLS. */
async function refuseStrongAppRole(ownerUrl: string, appRole: string): Promise<void> {
  await withOwner(ownerUrl, async (client) => {
    const { rows } = await client.query<{ strong: boolean; owner: boolean }>(
      'select rolsuper or rolbypassrls as strong, rolname = current_user as owner from pg_roles where rolname = $1',
      [appRole],
    );
    const role = rows[0];
    if (role === undefined) {
      throw new MigrationError(
        `There is no role "${appRole}". Create it first: create role … login nosuperuser nobypassrls.`,
      );
    }
    if (role.strong || role.owner) {
      throw new MigrationError(
        `The role "${appRole}" ${role.owner ? 'owns the tables' : 'is superuser or has BYPASSRLS'}: it would see every workspace. Give the app a role of its own without those rights.`,
      );
    }
  });
}

async function withOwner(ownerUrl: string, work: (client: pg.Client) => Promise<void>): Promise<void> {
  const client = new pg.Client({ connectionString: ownerUrl });
  await client.connect();
  try {
    await work(client);
  } finally {
    await client.end();
  }
}
