import type { NestExpressApplication } from '@nestjs/platform-express';
import { EntityManager } from '@mikro-orm/postgresql';
import { createTestDatabase, type TestDatabase } from '@noonwell/testkit/postgres';
import supertest, { type Agent } from 'supertest';
import { readSettings, type Settings } from '../../src/config/settings';
import type { LogTarget } from '../../src/http/logging';
import { createApp } from '../../src/create-app';

// Starting the whole API on a busy machine takes longer than jest's 5 s; nothing here measures time.
jest.setTimeout(60_000);

export interface TestApp {
  readonly app: NestExpressApplication;
  readonly em: EntityManager;
  readonly database: TestDatabase;
  /** A client without a session; the Origin is what a page of this address sends. */
  client(): Agent;
  close(): Promise<void>;
}

/** The whole API on a database of its own. Limits are out of the way unless a test sets them. */
export async function startTestApp(change: Partial<Settings> = {}, logTo?: LogTarget): Promise<TestApp> {
  const database = await createTestDatabase();
  const settings = readSettings({ DATABASE_URL: database.appUrl, LOG_LEVEL: 'silent', NODE_ENV: 'test' });
  const many = 1_000_000;
  const app = await createApp(
    {
      ...settings,
      limits: { signInsPerAddress: many, signInsPerAccount: many, costlyPerPerson: many },
      ...change,
    },
    logTo,
  ).catch(async (error: unknown) => {
    await database.drop();
    throw error;
  });
  await app.listen(0, '127.0.0.1');
  const address = await app.getUrl();
  const server = app.getHttpServer();
  return {
    app,
    em: app.get(EntityManager),
    database,
    client: () => supertest.agent(server).set('Origin', address),
    close: async () => {
      await app.close();
      await database.drop();
    },
  };
}
