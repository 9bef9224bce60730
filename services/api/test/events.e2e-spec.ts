import type { NestExpressApplication } from '@nestjs/platform-express';
import { accessSchema, newScenario, startRunsResponseSchema, studySchema, type Run } from '@noonwell/schema';
import type { Agent } from 'supertest';
import { readSettings } from '../src/config/settings';
import { createApp } from '../src/create-app';
import { EventsService } from '../src/events/events.service';
import { queryAsAdmin } from './support/admin-query';
import { EventReader } from './support/event-reader';
import { PASSWORD, addTenant, signIn, type Person, type Tenant } from './support/people';
import { startTestApp, type TestApp } from './support/test-app';
import { addWeatherYear } from './support/weather-rows';
import { WorkerHand } from './support/worker-hand';

const JWT_SECRET = 'a secret that two processes of one server share';

describe('events of runs', () => {
  let test: TestApp;
  /** Another process of the same server: another app on the same database. */
  let second: NestExpressApplication;
  let tenant: Tenant;
  let other: Tenant;
  let engineer: Agent;
  let student: Agent;
  let weatherYearId: string;
  const readers: EventReader[] = [];

  beforeAll(async () => {
    test = await startTestApp({ jwtSecret: JWT_SECRET });
    second = await createApp({
      ...readSettings({ DATABASE_URL: test.database.appUrl, LOG_LEVEL: 'error', NODE_ENV: 'test' }),
      jwtSecret: JWT_SECRET,
    });
    await second.listen(0, '127.0.0.1');
    tenant = await addTenant(test.em, 'Copper');
    other = await addTenant(test.em, 'Amber');
    engineer = await signIn(test, tenant.people.engineer);
    student = await signIn(test, tenant.people.student);
    const { userId } = tenant.people.engineer;
    weatherYearId = await addWeatherYear(test.em, tenant.workspaceId, userId, 'Desert');
  });

  afterEach(() => {
    for (const reader of readers.splice(0)) reader.close();
  });

  afterAll(async () => {
    await second.close();
    await test.close();
  });

  async function startRun(who: Agent = engineer): Promise<Run> {
    const { id } = studySchema.parse((await who.post('/api/studies').send({ name: 'Creamery' })).body);
    await who
      .post(`/api/studies/${id}/scenarios`)
      .send({ name: 'Coil', document: newScenario(), weatherYearId })
      .expect(201);
    const { runs } = startRunsResponseSchema.parse((await who.post(`/api/studies/${id}/runs`).send({})).body);
    return runs[0]!;
  }

  async function bearer(person: Person): Promise<string> {
    const answer = await test
      .client()
      .post('/api/auth/sign-in')
      .send({ email: person.email, password: PASSWORD });
    return `Bearer ${accessSchema.parse(answer.body).accessToken}`;
  }

  async function listen(person: Person, studyId: string, app = second): Promise<EventReader> {
    const reader = await EventReader.open(await app.getUrl(), studyId, await bearer(person));
    readers.push(reader);
    return reader;
  }

  const hand = (run: Run) => new WorkerHand(test.em, tenant.workspaceId, run.id);

  it('begin with the present state and follow the run to its end, in another process', async () => {
    const run = await startRun();
    await hand(run).take();
    await hand(run).reach(0.25);
    const reader = await listen(tenant.people.analyst, run.studyId);
    expect(reader.status).toBe(200);
    expect(reader.contentType).toMatch(/^text\/event-stream/);
    const about = { runId: run.id, scenarioId: run.scenarioId, failure: null };
    expect(await reader.next()).toEqual({ ...about, state: 'running', progress: 0.25 });
    await hand(run).reach(0.5);
    expect(await reader.next()).toEqual({ ...about, state: 'running', progress: 0.5 });
    await hand(run).finish();
    expect(await reader.next()).toEqual({ ...about, state: 'done', progress: 1 });
  });

  it('tell of cancelling and of failure with its sentence', async () => {
    const run = await startRun();
    const reader = await listen(tenant.people.engineer, run.studyId);
    await reader.until(({ state }) => state === 'queued');
    await engineer.post(`/api/runs/${run.id}/cancel`).expect(200);
    await reader.until(({ state }) => state === 'cancelled');
    await engineer.post(`/api/runs/${run.id}/retry`).expect(200);
    await reader.until(({ state }) => state === 'queued');
    await hand(run).take();
    await hand(run).fail('Receiver, weather record 13: too hot.');
    const failed = await reader.until(({ state }) => state === 'failed');
    expect(failed.failure).toBe('Receiver, weather record 13: too hot.');
  });

  it('tell of the asked study only', async () => {
    const [here, there] = [await startRun(), await startRun()];
    const reader = await listen(tenant.people.engineer, here.studyId);
    await reader.until(({ runId }) => runId === here.id);
    await hand(there).take();
    await hand(here).take();
    const next = await reader.until(({ state }) => state === 'running');
    expect(next.runId).toBe(here.id);
  });

  it('are refused to those who may not see the study', async () => {
    const shared = await startRun();
    const hidden = await startRun(student);
    const refusals: [Person, Run][] = [
      [other.people.admin, shared],
      [tenant.people.analyst, hidden],
    ];
    for (const [person, run] of refusals) {
      const reader = await listen(person, run.studyId);
      expect(reader.status).toBe(404);
      expect(reader.contentType).toMatch(/^application\/problem\+json/);
    }
    const nobody = await EventReader.open(await second.getUrl(), shared.studyId, '');
    readers.push(nobody);
    expect(nobody.status).toBe(401);
    expect((await listen(tenant.people.admin, hidden.studyId)).status).toBe(200);
  });

  it('end once the person may no longer see the study', async () => {
    const run = await startRun();
    const person = tenant.people.analyst;
    const reader = await listen(person, run.studyId);
    await reader.next();
    await queryAsAdmin(test.database, 'update refresh_tokens set revoked_at = now() where user_id = $1', [
      person.userId,
    ]);
    await second.get(EventsService).checkAll();
    expect(await reader.next()).toBeUndefined();
  });

  it('say what happened while the session that listens was lost', async () => {
    const run = await startRun();
    await hand(run).take();
    const reader = await listen(tenant.people.engineer, run.studyId);
    await reader.until(({ state }) => state === 'running');
    // Ends the sessions that listen, as a restart of the database would, and ends the run in the gap.
    await queryAsAdmin(
      test.database,
      `select pg_terminate_backend(pid, 5000) from pg_stat_activity
       where datname = current_database() and query ilike 'listen %'`,
    );
    await queryAsAdmin(test.database, "update runs set state = 'failed', failure = 'unheard' where id = $1", [
      run.id,
    ]);
    const event = await reader.until(({ state }) => state === 'failed');
    expect(event.failure).toBe('unheard');
  });

  it('leave nothing behind when the client goes', async () => {
    const run = await startRun();
    const events = second.get(EventsService);
    const openUntil = async (count: number) => {
      while (events.openStreams !== count) await new Promise(setImmediate);
    };
    await openUntil(0);
    const reader = await listen(tenant.people.engineer, run.studyId);
    await reader.next();
    expect(events.openStreams).toBe(1);
    reader.close();
    await openUntil(0);
  });
});
