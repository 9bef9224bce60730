import type { MikroORM } from '@mikro-orm/core';
import type { PostgreSqlDriver } from '@mikro-orm/postgresql';
import { createTestDatabase, type TestDatabase } from '@noonwell/testkit/postgres';
import { randomUUID } from 'node:crypto';
import pg from 'pg';
import { APP_GRANTS } from '../grants.js';
import {
  Membership,
  Study,
  User,
  Workspace,
  createOrm,
  setScope,
  withScope,
  withSystemTask,
  withWorkspace,
} from '../index.js';

/** One workspace with one engineer and one study. */
async function addTenant(orm: MikroORM<PostgreSqlDriver>, name: string) {
  const ids = {
    workspaceId: randomUUID(),
    userId: randomUUID(),
    studyId: randomUUID(),
    email: `${name}@example.test`,
  };
  await withScope(orm.em, { workspaceId: ids.workspaceId, userId: ids.userId }, async (em) => {
    em.create(Workspace, { id: ids.workspaceId, name });
    em.create(User, { id: ids.userId, email: ids.email, name, passwordHash: null, disabledAt: null });
    await em.flush();
    em.create(Membership, { workspaceId: ids.workspaceId, user: ids.userId, role: 'engineer' });
    em.create(Study, {
      id: ids.studyId,
      workspaceId: ids.workspaceId,
      name: `${name}'s study`,
      question: '',
      sandbox: false,
      owner: ids.userId,
    });
    await em.flush();
  });
  return ids;
}

describe('row-level security through the pool of the app', () => {
  let database: TestDatabase;
  let orm: MikroORM<PostgreSqlDriver>;
  let raw: pg.Pool;
  let own: Awaited<ReturnType<typeof addTenant>>;
  let other: Awaited<ReturnType<typeof addTenant>>;

  beforeAll(async () => {
    database = await createTestDatabase();
    orm = await createOrm({ databaseUrl: database.appUrl, poolMax: 1 });
    // One connection: whatever an earlier transaction left in the session would show.
    raw = new pg.Pool({ connectionString: database.appUrl, max: 1 });
    own = await addTenant(orm, 'own');
    other = await addTenant(orm, 'other');
  });
  afterAll(async () => {
    await raw.end();
    await orm.close(true);
    await database.drop();
  });

  const names = (rows: Record<string, unknown>[]) => rows.map((row) => row['name']);
  async function asWorkspace(workspaceId: string, sql: string, values: unknown[] = []) {
    const client = await raw.connect();
    try {
      await client.query('begin');
      await client.query("select set_config('noonwell.workspace_id', $1, true)", [workspaceId]);
      const { rows } = await client.query<Record<string, unknown>>(sql, values);
      await client.query('commit');
      return rows;
    } catch (error) {
      await client.query('rollback');
      throw error;
    } finally {
      client.release();
    }
  }

  it('connects as a role without rights to get around it', async () => {
    const { rows } = await raw.query<Record<string, unknown>>(
      `select rolsuper, rolbypassrls, (select count(*)::int from pg_class where relowner = pg_roles.oid) as owned
       from pg_roles where rolname = current_user`,
    );
    expect(rows).toEqual([{ rolsuper: false, rolbypassrls: false, owned: 0 }]);
  });

  it('is forced on every table of ours', async () => {
    const { rows } = await raw.query<{ relname: string; safe: boolean }>(
      `select relname, relrowsecurity and relforcerowsecurity as safe from pg_class
       where relnamespace = 'public'::regnamespace and relkind = 'r' and relname <> 'noonwell_migrations'`,
    );
    expect(rows.map(({ relname }) => relname).sort()).toEqual(Object.keys(APP_GRANTS).sort());
    expect(rows.filter(({ safe }) => !safe)).toEqual([]);
  });

  it('shows nothing to a session that named no workspace', async () => {
    for (const table of Object.keys(APP_GRANTS)) {
      const { rows } = await raw.query<Record<string, unknown>>(`select * from ${table}`);
      expect({ table, rows }).toEqual({ table, rows: [] });
    }
  });

  it('shows one workspace its own rows only', async () => {
    expect(names(await asWorkspace(own.workspaceId, 'select name from studies'))).toEqual(["own's study"]);
    expect(names(await asWorkspace(own.workspaceId, 'select name from users'))).toEqual(['own']);
    expect(names(await asWorkspace(own.workspaceId, 'select name from workspaces'))).toEqual(['own']);
    expect(
      await asWorkspace(own.workspaceId, 'select * from studies where id = $1', [other.studyId]),
    ).toEqual([]);
  });

  it('changes and removes nothing of another workspace', async () => {
    const changed = await asWorkspace(
      own.workspaceId,
      "update studies set name = 'mine' where id = $1 returning id",
      [other.studyId],
    );
    const removed = await asWorkspace(own.workspaceId, 'delete from studies where id = $1 returning id', [
      other.studyId,
    ]);
    expect([changed, removed]).toEqual([[], []]);
    expect(names(await asWorkspace(other.workspaceId, 'select name from studies'))).toEqual([
      "other's study",
    ]);
  });

  it('refuses a row written into another workspace', async () => {
    const write = asWorkspace(
      own.workspaceId,
      `insert into studies (id, workspace_id, name, question, sandbox, owner_id, created_at, updated_at)
       values (gen_random_uuid(), $1, 'planted', '', false, $2, now(), now())`,
      [other.workspaceId, own.userId],
    );
    await expect(write).rejects.toThrow(/row-level security/);
    const move = asWorkspace(own.workspaceId, 'update studies set workspace_id = $1', [other.workspaceId]);
    await expect(move).rejects.toThrow(/row-level security/);
  });

  it('refuses a reference into another workspace, which foreign keys alone would allow', async () => {
    const write = asWorkspace(
      own.workspaceId,
      `insert into scenarios (id, workspace_id, study_id, name, position, newest_version, created_at, updated_at)
       values (gen_random_uuid(), $1, $2, 'planted', 0, 1, now(), now())`,
      [own.workspaceId, other.studyId],
    );
    await expect(write).rejects.toThrow(/foreign key/);
  });

  it('forgets the workspace with its transaction, also when that failed', async () => {
    await expect(asWorkspace(own.workspaceId, 'select 1 / 0')).rejects.toThrow(/division by zero/);
    expect((await raw.query('select * from studies')).rows).toEqual([]);
    await expect(
      withWorkspace(orm.em, own.workspaceId, (em) => em.execute('select no_such_column from studies')),
    ).rejects.toThrow(/no_such_column/);
    const left = await orm.em.fork().execute<{ id: string }[]>('select id from studies');
    expect(left).toEqual([]);
    expect(names(await asWorkspace(other.workspaceId, 'select name from studies'))).toEqual([
      "other's study",
    ]);
  });

  it('keeps versions, results and files as they were written', async () => {
    for (const table of ['scenario_versions', 'run_results', 'weather_originals', 'weather_columns']) {
      const change = asWorkspace(own.workspaceId, `update ${table} set workspace_id = workspace_id`);
      await expect(change).rejects.toThrow(/permission denied/);
      await expect(asWorkspace(own.workspaceId, `delete from ${table}`)).rejects.toThrow(/permission denied/);
    }
  });

  it('filters in MikroORM too, and fails where nobody said which workspace', async () => {
    await expect(orm.em.fork().find(Study, {})).rejects.toThrow(/filter/i);
    const found = await withWorkspace(orm.em, own.workspaceId, async (em) => ({
      all: await em.find(Study, {}),
      switchedOff: await em.find(Study, {}, { filters: false }),
      // Row-level security alone, opened by hand for the other workspace: the filter still holds.
      filterAlone: await (async () => {
        await em.execute("select set_config('noonwell.workspace_id', ?, true)", [other.workspaceId]);
        return em.find(Study, {}, { disableIdentityMap: true });
      })(),
    }));
    expect(found.all.map(({ name }) => name)).toEqual(["own's study"]);
    expect(found.switchedOff.map(({ name }) => name)).toEqual(["own's study"]);
    expect(found.filterAlone).toEqual([]);
  });

  it('finds an account by the address that signs in, and no other', async () => {
    const seen = await withScope(orm.em, { signInEmail: own.email }, (em) => em.find(User, {}));
    expect(seen.map(({ email }) => email)).toEqual([own.email]);
  });

  it('opens to a system task what its policy names and nothing else', async () => {
    const open = await withSystemTask(orm.em, 'reconciler', async (em) => ({
      studies: await em.execute<unknown[]>('select * from studies'),
      users: await em.execute<unknown[]>('select * from users'),
      outbox: await em.execute<unknown[]>('select * from outbox'),
    }));
    expect(open).toEqual({ studies: [], users: [], outbox: [] });
  });

  it('sets a scope in a transaction only', async () => {
    await expect(setScope(orm.em.fork(), { workspaceId: own.workspaceId })).rejects.toThrow(/transaction/);
  });
});
