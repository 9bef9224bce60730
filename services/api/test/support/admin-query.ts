import type { TestDatabase } from '@noonwell/testkit/postgres';
import { Client } from 'pg';

/** As the superuser of the test's server: sees past row-level security. */
export async function queryAsAdmin(
  database: TestDatabase,
  sql: string,
  values: unknown[] = [],
): Promise<unknown[]> {
  const client = new Client({ connectionString: database.adminUrl });
  await client.connect();
  try {
    return (await client.query<Record<string, unknown>>(sql, values)).rows;
  } finally {
    await client.end();
  }
}
