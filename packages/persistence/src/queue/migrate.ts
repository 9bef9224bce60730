import { runMigrations } from 'bullmq';
import type pg from 'pg';

/** Schema of the queue's own tables; the data's migrations leave it alone. */
export const QUEUE_SCHEMA = 'bullmq';

/**
 * Brings the queue's tables to the present version as their owner and lets the app role use them: rows only, no
 * tables of its own (so a job must carry its id; numbering jobs makes a sequence). Also run where the queue lives on Redis, so that switching back needs no migration.
 * @param client one session (not a pool) of the role that owns the database
 */
export async function migrateQueue(client: pg.Client, appRole: string): Promise<void> {
  await runMigrations(client, QUEUE_SCHEMA);
  const schema = client.escapeIdentifier(QUEUE_SCHEMA);
  const role = client.escapeIdentifier(appRole);
  await client.query(`
    GRANT USAGE ON SCHEMA ${schema} TO ${role};
    GRANT SELECT, INSERT, UPDATE, DELETE ON ALL TABLES IN SCHEMA ${schema} TO ${role};
    GRANT USAGE, SELECT ON ALL SEQUENCES IN SCHEMA ${schema} TO ${role};
    GRANT EXECUTE ON ALL FUNCTIONS IN SCHEMA ${schema} TO ${role};
    REVOKE INSERT, UPDATE, DELETE ON ${schema}.migration FROM ${role};
  `);
}
