import pg from 'pg';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { createTestDatabase, startTestPostgres, type TestPostgres } from './index.js';

async function query(url: string, sql: string): Promise<unknown[]> {
  const client = new pg.Client({ connectionString: url });
  await client.connect();
  try {
    return (await client.query<Record<string, unknown>>(sql)).rows;
  } finally {
    await client.end();
  }
}

describe('throw-away PostgreSQL', () => {
  let server: TestPostgres;

  beforeAll(async () => {
    server = await startTestPostgres({
      migrate: async (ownerUrl, appRole) => {
        await query(ownerUrl, `CREATE TABLE note (body text); GRANT SELECT, INSERT ON note TO ${appRole}`);
      },
    });
  });

  afterAll(async () => {
    await server.stop();
  });

  it('gives every test its own copy of the migrated template', async () => {
    const [first, second] = await Promise.all([createTestDatabase(server), createTestDatabase(server)]);
    await query(first.appUrl, "INSERT INTO note VALUES ('only here')");
    expect(await query(first.appUrl, 'SELECT body FROM note')).toEqual([{ body: 'only here' }]);
    expect(await query(second.appUrl, 'SELECT body FROM note')).toEqual([]);
  });

  it('connects the app as a role that owns nothing and cannot pass row-level security', async () => {
    const database = await createTestDatabase(server);
    const roles = await query(
      database.appUrl,
      'SELECT rolsuper, rolbypassrls, rolcreaterole, rolcreatedb FROM pg_roles WHERE rolname = current_user',
    );
    expect(roles).toEqual([
      { rolsuper: false, rolbypassrls: false, rolcreaterole: false, rolcreatedb: false },
    ]);
    await expect(query(database.appUrl, 'DROP TABLE note')).rejects.toThrow(/must be owner/);
    await expect(query(database.appUrl, 'CREATE TABLE mine (id int)')).rejects.toThrow(/permission denied/);
  });

  it('drops a database although sessions are still open', async () => {
    const database = await createTestDatabase(server);
    const client = new pg.Client({ connectionString: database.appUrl });
    // Stays attached: the client reports both the server's notice and the closed socket.
    const ended = new Promise((resolve) => client.on('error', resolve));
    await client.connect();
    await database.drop();
    await ended;
    await expect(query(database.appUrl, 'SELECT 1')).rejects.toThrow(/does not exist/);
  });

  it('takes the server down again when the migration fails', async () => {
    let address = '';
    const start = startTestPostgres({
      migrate: (ownerUrl) => {
        address = ownerUrl;
        return Promise.reject(new Error('no such column'));
      },
    });
    await expect(start).rejects.toThrow('no such column');
    await expect(query(address, 'SELECT 1')).rejects.toThrow(/ECONNREFUSED/);
  });
});
