import { ReferenceKind } from '@mikro-orm/core';
import { RUN_STATES, ROLES } from '@noonwell/schema';
import { createTestDatabase, type TestDatabase } from '@noonwell/testkit/postgres';
import pg from 'pg';
import { createOrm, migrateDatabase } from '../src/index.js';

describe('migrations', () => {
  let database: TestDatabase;
  beforeAll(async () => {
    database = await createTestDatabase();
  });
  afterAll(() => database.drop());

  async function query<Row extends pg.QueryResultRow>(sql: string, values: unknown[] = []): Promise<Row[]> {
    const client = new pg.Client({ connectionString: database.adminUrl });
    await client.connect();
    try {
      return (await client.query<Row>(sql, values)).rows;
    } finally {
      await client.end();
    }
  }

  it('give the tables that the entities describe: every column and whether it may be empty', async () => {
    const rows = await query<{ table_name: string; column_name: string; is_nullable: string }>(
      `select table_name, column_name, is_nullable from information_schema.columns
       where table_schema = 'public' and table_name <> 'noonwell_migrations'`,
    );
    const inDatabase = rows.map(
      (row) => `${row.table_name}.${row.column_name} ${row.is_nullable === 'YES' ? 'null' : ''}`,
    );
    const orm = await createOrm({ databaseUrl: database.appUrl });
    const described = Object.values(orm.getMetadata().getAll()).flatMap((entity) =>
      entity.props
        .filter(({ kind, persist }) => persist !== false && kind !== ReferenceKind.ONE_TO_MANY)
        .flatMap((prop) =>
          prop.fieldNames.map((field) => `${entity.tableName}.${field} ${prop.nullable ? 'null' : ''}`),
        ),
    );
    await orm.close(true);
    expect(described.sort()).toEqual(inDatabase.sort());
  });

  it('change nothing when they run again', async () => {
    const structure = () =>
      query(
        `select relname, relacl::text, (select count(*)::int from pg_policy where polrelid = pg_class.oid) as policies
         from pg_class where relnamespace in ('public'::regnamespace, 'bullmq'::regnamespace) order by relname`,
      );
    const before = await structure();
    await migrateDatabase(database.ownerUrl, database.appRole);
    expect(await structure()).toEqual(before);
  });

  it('index every column that a foreign key starts from, else removing a parent reads whole tables', async () => {
    const missing = await query<{ conname: string }>(
      `select conname from pg_constraint c where contype = 'f' and connamespace = 'public'::regnamespace
       and not exists (
         select 1 from pg_index i join pg_attribute a on a.attrelid = i.indrelid and a.attnum = i.indkey[0]
         where i.indrelid = c.conrelid and i.indkey[0] = any (c.conkey)
         -- The workspace alone narrows nothing down.
         and (a.attname <> 'workspace_id' or cardinality(c.conkey) = 1))`,
    );
    expect(missing).toEqual([]);
  });

  it('allow exactly the states and roles that the schema names', async () => {
    const checks = await query<{ definition: string }>(
      `select pg_get_constraintdef(oid) as definition from pg_constraint
       where contype = 'c' and conrelid in ('runs'::regclass, 'memberships'::regclass)`,
    );
    const allowed = checks
      .map(({ definition }) => [...definition.matchAll(/'(\w+)'::text/g)].map(([, word]) => word))
      .filter((words) => words.length > 0);
    expect(allowed).toEqual(expect.arrayContaining([[...RUN_STATES], [...ROLES]]));
  });

  it('refuse an app role that row-level security would not hold', async () => {
    const owner = new URL(database.ownerUrl).username;
    await expect(migrateDatabase(database.ownerUrl, owner)).rejects.toThrow(/owns the tables/);
    await expect(migrateDatabase(database.ownerUrl, 'postgres')).rejects.toThrow(/superuser/);
    await expect(migrateDatabase(database.ownerUrl, 'no_such_role')).rejects.toThrow(
      /no role "no_such_role"/,
    );
  });
});
