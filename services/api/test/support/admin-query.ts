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

/**
 * Does something in a transaction, starts calls that come upon it, and commits once all of them wait.
 * @returns their answers
 */
export async function meetUncommitted<Answer>(
  database: TestDatabase,
  sql: string,
  values: unknown[],
  calls: readonly (() => PromiseLike<Answer>)[],
): Promise<Answer[]> {
  const client = new Client({ connectionString: database.adminUrl });
  await client.connect();
  try {
    await client.query('begin');
    await client.query(sql, values);
    const answers = Promise.all(calls.map(async (call) => call()));
    const waiting = `select 1 from pg_stat_activity
      where datname = current_database() and cardinality(pg_blocking_pids(pid)) > 0`;
    while ((await queryAsAdmin(database, waiting)).length < calls.length);
    await client.query('commit');
    return await answers;
  } finally {
    await client.end();
  }
}
