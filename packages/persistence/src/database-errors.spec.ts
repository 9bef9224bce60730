import type { EntityManager } from '@mikro-orm/postgresql';
import { createTestDatabase, type TestDatabase } from '@noonwell/testkit/postgres';
import { randomUUID } from 'node:crypto';
import {
  RunRow,
  Study,
  createOrm,
  isForeignKeyViolation,
  loggable,
  plainMessage,
  withWorkspace,
} from './index.js';

type Work = (em: EntityManager) => Promise<unknown>;

describe('errors of the database', () => {
  let database: TestDatabase;
  let orm: Awaited<ReturnType<typeof createOrm>>;

  beforeAll(async () => {
    database = await createTestDatabase();
    orm = await createOrm({ databaseUrl: database.appUrl, poolMax: 1 });
  });
  afterAll(async () => {
    await orm.close(true);
    await database.drop();
  });

  const errorOf = (work: Work, workspaceId = randomUUID()): Promise<unknown> =>
    withWorkspace(orm.em, workspaceId, work).catch((error: unknown) => error);
  const study = () => ({
    id: randomUUID(),
    workspaceId: randomUUID(),
    name: 'Confidential - name',
    question: 'Confidential question',
    sandbox: false,
    owner: randomUUID(),
    createdAt: new Date(),
    updatedAt: new Date(),
  });

  const ways: Record<string, Work> = {
    'the manager': (em) => em.insert(Study, study()),
    'the query builder': (em) => em.createQueryBuilder(Study).insert(study()).execute(),
    'a plain statement': (em) =>
      em.execute('update studies set name = ?, workspace_id = workspace_id / 0', ['Confidential - name']),
  };

  it.each(Object.entries(ways))(
    'of %s go to the log with their reason and without the statement',
    async (_, work) => {
      const error = await errorOf(work);
      // Else there would be nothing to hide.
      expect(String(error)).toContain('Confidential');
      const shown = loggable(error);
      expect(shown).toMatchObject({ code: expect.stringMatching(/^\w{5}$/) as unknown });
      expect(plainMessage(error)).toMatch(/^(new row violates row-level security|operator does not exist)/);
      expect(JSON.stringify(shown)).not.toContain('Confidential');
    },
  );

  it('tell a reference that does not hold from everything else', async () => {
    const workspaceId = randomUUID();
    const orphan: Work = (em) =>
      em
        .createQueryBuilder(RunRow)
        .insert({
          id: randomUUID(),
          workspaceId,
          study: randomUUID(),
          scenario: randomUUID(),
          scenarioVersion: randomUUID(),
          weatherYear: randomUUID(),
          modelVersion: '1',
          requestedBy: randomUUID(),
          state: 'queued',
          createdAt: new Date(),
        })
        .execute();
    expect(isForeignKeyViolation(await errorOf(orphan, workspaceId))).toBe(true);
    expect(isForeignKeyViolation(await errorOf((em) => em.insert(Study, study())))).toBe(false);
    expect(isForeignKeyViolation(undefined)).toBe(false);
  });

  it('leaves other errors as they are', () => {
    const error = new Error('The scenario - a coil - cannot be run.');
    expect(loggable(error)).toBe(error);
    expect(plainMessage(error)).toBe(error.message);
    expect(plainMessage('text')).toBe('text');
  });
});
