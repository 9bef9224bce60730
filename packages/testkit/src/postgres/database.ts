import { identifier, randomName } from './names.js';
import { urlFor, withAdmin, type TestPostgresAddress } from './server.js';

/** Carries the server's address from the test runner's set-up to its worker processes. */
export const TEST_POSTGRES_ENV = 'NOONWELL_TEST_POSTGRES';

export interface TestDatabase {
  readonly name: string;
  /** As the role that owns the tables. */
  readonly ownerUrl: string;
  /** As the role the app connects with. */
  readonly appUrl: string;
  readonly appRole: string;
  /** Superuser, in this database: for looking at what row-level security hides. */
  readonly adminUrl: string;
  /** Ends open sessions and removes the database. */
  drop(): Promise<void>;
}

/**
 * A fresh copy of the migrated template database. Without an address the one the runner's set-up left in
 * {@link TEST_POSTGRES_ENV} is used.
 */
export async function createTestDatabase(
  address: TestPostgresAddress = addressFromEnvironment(),
): Promise<TestDatabase> {
  const name = randomName('test_db');
  await withAdmin(address.adminUrl, (client) =>
    client.query(
      `CREATE DATABASE ${identifier(name)} OWNER ${identifier(address.ownerRole)} TEMPLATE ${identifier(address.templateDatabase)}`,
    ),
  );
  const admin = new URL(address.adminUrl);
  return {
    name,
    ownerUrl: urlFor(address.adminUrl, address.ownerRole, address.ownerPassword, name),
    appUrl: urlFor(address.adminUrl, address.appRole, address.appPassword, name),
    appRole: address.appRole,
    adminUrl: urlFor(address.adminUrl, admin.username, admin.password, name),
    drop: async () => {
      await withAdmin(address.adminUrl, (client) =>
        client.query(`DROP DATABASE IF EXISTS ${identifier(name)} WITH (FORCE)`),
      );
    },
  };
}

function addressFromEnvironment(): TestPostgresAddress {
  const text = process.env[TEST_POSTGRES_ENV];
  if (text === undefined) {
    throw new Error(
      `${TEST_POSTGRES_ENV} is not set: run this test through jest, whose set-up starts PostgreSQL.`,
    );
  }
  // Written by our own set-up in the parent process, never by a user.
  return JSON.parse(text) as TestPostgresAddress;
}
