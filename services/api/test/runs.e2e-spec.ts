import {
  STUDENT_QUOTA,
  newScenario,
  pageOf,
  problemSchema,
  runSchema,
  scenarioViewSchema,
  startRunsResponseSchema,
  studySchema,
  type Run,
  type StudyView,
} from '@noonwell/schema';
import { tableFromIPC } from 'apache-arrow';
import { randomUUID } from 'node:crypto';
import type { Agent, Response } from 'supertest';
import { queryAsAdmin } from './support/admin-query';
import { addTenant, signIn, type Tenant } from './support/people';
import { startTestApp, type TestApp } from './support/test-app';
import { addWeatherYear } from './support/weather-rows';
import { WorkerHand, twoDays } from './support/worker-hand';

const runPageSchema = pageOf(runSchema);

describe('runs', () => {
  let test: TestApp;
  let tenant: Tenant;
  let other: Tenant;
  let engineer: Agent;
  let analyst: Agent;
  let student: Agent;
  let stranger: Agent;
  let weatherYearId: string;

  beforeAll(async () => {
    test = await startTestApp();
    tenant = await addTenant(test.em, 'Copper');
    other = await addTenant(test.em, 'Amber');
    engineer = await signIn(test, tenant.people.engineer);
    analyst = await signIn(test, tenant.people.analyst);
    student = await signIn(test, tenant.people.student);
    stranger = await signIn(test, other.people.admin);
    weatherYearId = await addWeatherYear(
      test.em,
      tenant.workspaceId,
      tenant.people.engineer.userId,
      'Desert',
    );
  });
  afterAll(() => test.close());

  /** A study whose scenarios stand on the weather year. */
  async function study(
    who: Agent = engineer,
    names: readonly string[] = ['Coil', 'Cell'],
  ): Promise<StudyView> {
    const { id } = studySchema.parse((await who.post('/api/studies').send({ name: 'Creamery' })).body);
    for (const name of names) {
      await who
        .post(`/api/studies/${id}/scenarios`)
        .send({ name, document: newScenario(), weatherYearId })
        .expect(201);
    }
    return studySchema.parse((await who.get(`/api/studies/${id}`).expect(200)).body);
  }

  async function start(studyId: string, body: object = {}, who: Agent = engineer): Promise<Run[]> {
    const answer = await who.post(`/api/studies/${studyId}/runs`).send(body).expect(200);
    return startRunsResponseSchema.parse(answer.body).runs;
  }

  async function startOne(who: Agent = engineer): Promise<Run> {
    const [run] = await start((await study(who, ['Coil'])).id, {}, who);
    if (run === undefined) throw new Error('One scenario starts one run.');
    return run;
  }

  const hand = (run: Run) => new WorkerHand(test.em, tenant.workspaceId, run.id);
  const problemOf = (answer: { body: unknown }) => problemSchema.parse(answer.body);
  const messages = (runIds: readonly string[]) =>
    queryAsAdmin(test.database, 'select run_id from outbox where run_id = any($1) order by id', [runIds]);

  it('starts one for each scenario, with its message for the queue', async () => {
    const { id, scenarios } = await study();
    const runs = await start(id);
    expect(runs.map(({ scenarioId }) => scenarioId)).toEqual(scenarios.map((scenario) => scenario.id));
    for (const run of runs) {
      expect(run).toMatchObject({
        state: 'queued',
        progress: 0,
        weatherYearId,
        scenarioVersion: 1,
        summary: null,
      });
    }
    expect(await messages(runs.map((run) => run.id))).toEqual(runs.map((run) => ({ run_id: run.id })));
    // What waits is not asked for again.
    expect((await start(id)).map((run) => run.id)).toEqual(runs.map((run) => run.id));
    expect(await messages(runs.map((run) => run.id))).toHaveLength(runs.length);
  });

  it('is one run however its id is written, also where it goes to the queue again', async () => {
    const run = await startOne();
    const shouted = run.id.toUpperCase();
    await engineer.post(`/api/runs/${shouted}/cancel`).expect(200);
    await engineer.post(`/api/runs/${shouted}/retry`).expect(200);
    const payloads = await queryAsAdmin(
      test.database,
      "select payload->>'runId' as id from outbox where run_id = $1",
      [run.id],
    );
    expect(payloads).toEqual([{ id: run.id }, { id: run.id }]);
  });

  it('starts the named scenarios only, and computes nothing twice', async () => {
    const { id, scenarios } = await study();
    const [, cell] = scenarios;
    const [run, ...none] = await start(id, { scenarioIds: [cell!.id, cell!.id] });
    expect(none).toEqual([]);
    expect(run!.scenarioId).toBe(cell!.id);
    await hand(run!).take();
    await hand(run!).finish();
    const [again] = await start(id, { scenarioIds: [cell!.id] });
    expect(again).toMatchObject({ id: run!.id, state: 'done', engineMs: 12.5 });
    expect(again!.summary).toEqual(JSON.parse(twoDays().summary));

    // A changed scenario is another question.
    const { document, version } = scenarioViewSchema.parse(
      (await engineer.get(`/api/scenarios/${cell!.id}`)).body,
    );
    document.catch.dish.cleanliness = 0.91;
    await engineer
      .put(`/api/scenarios/${cell!.id}`)
      .send({ basedOnVersion: version, document, weatherYearId })
      .expect(200);
    const [fresh] = await start(id, { scenarioIds: [cell!.id] });
    expect(fresh).toMatchObject({ state: 'queued', scenarioVersion: version + 1 });
    expect(fresh!.id).not.toBe(run!.id);
  });

  it('refuses to start what cannot run, and queues nothing then', async () => {
    const empty = await study(engineer, []);
    const nothing = await engineer.post(`/api/studies/${empty.id}/runs`).send({}).expect(409);
    expect(problemOf(nothing).type).toBe('urn:noonwell:problem:nothing-to-run');

    const { id } = await study(engineer, ['Ready']);
    await engineer
      .post(`/api/studies/${id}/scenarios`)
      .send({ name: 'In the dark', document: newScenario(), weatherYearId: null })
      .expect(201);
    const dark = await engineer.post(`/api/studies/${id}/runs`).send({}).expect(409);
    expect(problemOf(dark)).toMatchObject({ type: 'urn:noonwell:problem:weather-missing' });
    expect(problemOf(dark).detail).toContain('"In the dark" has no weather year');
    expect(runPageSchema.parse((await engineer.get(`/api/studies/${id}/runs`)).body).total).toBe(0);

    for (const body of [{ scenarioIds: [] }, { scenarioIds: ['x'] }, { scenario: [] }]) {
      await engineer.post(`/api/studies/${id}/runs`).send(body).expect(400);
    }
    await engineer
      .post(`/api/studies/${id}/runs`)
      .send({ scenarioIds: [randomUUID()] })
      .expect(404);
    const foreign = (await study()).scenarios[0]!.id;
    await engineer
      .post(`/api/studies/${id}/runs`)
      .send({ scenarioIds: [foreign] })
      .expect(404);
  });

  it("cannot stand on another workspace's weather year", async () => {
    const theirs = await addWeatherYear(test.em, other.workspaceId, other.people.engineer.userId, 'Theirs');
    const { id, scenarios } = await study(engineer, ['Coil']);
    await engineer.put(`/api/studies/${id}/weather-year`).send({ weatherYearId: theirs }).expect(404);
    await engineer
      .put(`/api/scenarios/${scenarios[0]!.id}`)
      .send({ basedOnVersion: 1, document: newScenario(), weatherYearId: theirs })
      .expect(404);
    const [run] = await start(id);
    expect(run).toMatchObject({ weatherYearId, scenarioVersion: 1 });
  });

  it('lists newest first, in pages', async () => {
    const { id } = await study(engineer, ['A', 'B', 'C']);
    const runs = await start(id);
    const first = runPageSchema.parse(
      (await engineer.get(`/api/studies/${id}/runs`).query({ pageSize: 2 }).expect(200)).body,
    );
    const second = runPageSchema.parse(
      (await engineer.get(`/api/studies/${id}/runs`).query({ pageSize: 2, page: 2 }).expect(200)).body,
    );
    expect(first).toMatchObject({ total: 3, pageSize: 2 });
    expect([...first.items, ...second.items].map((run) => run.id).sort()).toEqual(
      runs.map((run) => run.id).sort(),
    );
  });

  it('gives the result of a finished run: summary bytes, columns, and chosen columns with their start', async () => {
    const run = await startOne();
    const early = await engineer.get(`/api/runs/${run.id}/summary`).expect(409);
    expect(problemOf(early).type).toBe('urn:noonwell:problem:run-not-finished');
    await engineer.get(`/api/runs/${run.id}/columns`).expect(409);
    await hand(run).take();
    await hand(run).finish();

    const summary = await analyst.get(`/api/runs/${run.id}/summary`).expect(200);
    expect(summary.headers['content-type']).toMatch(/^application\/json/);
    expect(summary.text).toBe(twoDays().summary);
    const columns = async (query: object) => {
      const answer = await analyst
        .get(`/api/runs/${run.id}/columns`)
        .query(query)
        .buffer()
        .parse(toBuffer)
        .expect(200)
        .expect('content-type', 'application/vnd.apache.arrow.stream');
      return answer.body as Buffer;
    };
    expect(Buffer.compare(await columns({}), Buffer.from(twoDays().columns))).toBe(0);
    const chosen = tableFromIPC(await columns({ channels: 'faceC' }));
    expect(chosen.schema.fields.map(({ name }) => name)).toEqual(['startLocalMs', 'faceC']);
    expect(chosen.numRows).toBe(48);
    for (const channels of ['moonC', 'faceC,', '', 'face C']) {
      const refused = await analyst.get(`/api/runs/${run.id}/columns`).query({ channels }).expect(400);
      expect(problemOf(refused).errors?.[0]?.path).toBe('channels');
    }
  });

  it('is cancelled at once while it waits', async () => {
    const run = await startOne();
    const cancelled = await engineer.post(`/api/runs/${run.id}/cancel`).expect(200);
    expect(runSchema.parse(cancelled.body)).toMatchObject({ state: 'cancelled', cancelRequested: true });
    expect(runSchema.parse(cancelled.body).finishedAt).not.toBeNull();
  });

  it('is told to stop while it runs, and stays as it ended when it was faster', async () => {
    const run = await startOne();
    await hand(run).take();
    const asked = await engineer.post(`/api/runs/${run.id}/cancel`).expect(200);
    expect(asked.body).toMatchObject({ state: 'running', cancelRequested: true });

    const fast = await startOne();
    await hand(fast).take();
    await hand(fast).finish();
    const late = await engineer.post(`/api/runs/${fast.id}/cancel`).expect(200);
    expect(late.body).toMatchObject({ state: 'done', cancelRequested: false });
  });

  it('that failed can be tried again, others cannot', async () => {
    const run = await startOne();
    const waiting = await engineer.post(`/api/runs/${run.id}/retry`).expect(409);
    expect(problemOf(waiting).type).toBe('urn:noonwell:problem:run-not-ended');
    await hand(run).take();
    await hand(run).fail('Receiver, weather record 13: too hot.');
    const failed = await engineer.get(`/api/runs/${run.id}`).expect(200);
    expect(failed.body).toMatchObject({ state: 'failed', failure: 'Receiver, weather record 13: too hot.' });

    const again = await engineer.post(`/api/runs/${run.id}/retry`).expect(200);
    expect(again.body).toMatchObject({ id: run.id, state: 'queued', progress: 0, failure: null });
    // Its first message was never taken away here: no relay runs.
    expect(await messages([run.id])).toHaveLength(2);
  });

  it('that was cancelled cannot be tried again once another answers the same question', async () => {
    const { id } = await study(engineer, ['Coil']);
    const [first] = await start(id);
    await engineer.post(`/api/runs/${first!.id}/cancel`).expect(200);
    const [second] = await start(id);
    expect(second!.id).not.toBe(first!.id);
    const refused = await engineer.post(`/api/runs/${first!.id}/retry`).expect(409);
    expect(problemOf(refused).type).toBe('urn:noonwell:problem:result-exists');
  });

  it('of a student are limited, also when they are asked for at once', async () => {
    const { id } = await study(student, ['A', 'B', 'C']);
    const other = await study(student, ['D', 'E', 'F']);
    const answers = await Promise.all(
      [id, other.id].map((studyId) => student.post(`/api/studies/${studyId}/runs`).send({})),
    );
    expect(answers.map(({ status }) => status).sort()).toEqual([200, 409]);
    const refused = answers.find(({ status }) => status === 409);
    expect(problemOf(refused!)).toMatchObject({ type: 'urn:noonwell:problem:quota-reached' });

    const open = answers[0]?.status === 200 ? id : other.id;
    // What is there already takes no place.
    const running = await start(open, {}, student);
    expect(running).toHaveLength(3);
    const closed = open === id ? other : await study(student, ['G', 'H']);
    const scenarioIds = closed.scenarios
      .slice(0, STUDENT_QUOTA.activeRuns - 3)
      .map((scenario) => scenario.id);
    await start(closed.id, { scenarioIds }, student);
    const full = await student
      .post(`/api/studies/${closed.id}/runs`)
      .send({ scenarioIds: [closed.scenarios.at(-1)!.id] })
      .expect(409);
    expect(problemOf(full).detail).toContain('Wait for one to finish or cancel it');
    await student.post(`/api/runs/${running[0]!.id}/cancel`).expect(200);
    await start(closed.id, { scenarioIds: [closed.scenarios.at(-1)!.id] }, student);
  });

  it('are seen and changed by those who may: shared, sandbox, another workspace', async () => {
    const shared = await startOne();
    await student.get(`/api/runs/${shared.id}`).expect(200);
    await student.post(`/api/runs/${shared.id}/cancel`).expect(403);
    await student.post(`/api/runs/${shared.id}/retry`).expect(403);
    await student.post(`/api/studies/${shared.studyId}/runs`).send({}).expect(403);

    await student.post(`/api/runs/${(await studentsRun()).id}/cancel`).expect(200);
    const own = await studentsRun();
    for (const who of [engineer, analyst, stranger]) {
      for (const route of [`runs/${own.id}`, `runs/${own.id}/summary`, `runs/${own.id}/columns`]) {
        await who.get(`/api/${route}`).expect(404);
      }
      await who.get(`/api/studies/${own.studyId}/runs`).expect(404);
      await who.post(`/api/studies/${own.studyId}/runs`).send({}).expect(404);
      await who.post(`/api/runs/${own.id}/cancel`).expect(404);
      await who.post(`/api/runs/${own.id}/retry`).expect(404);
    }
    const admin = await signIn(test, tenant.people.admin);
    await admin.get(`/api/runs/${own.id}`).expect(200);
    await stranger.get(`/api/runs/${shared.id}`).expect(404);
  });

  async function studentsRun(): Promise<Run> {
    // Makes room: earlier tests leave a student's runs waiting.
    await queryAsAdmin(test.database, "update runs set state = 'cancelled' where requested_by_id = $1", [
      tenant.people.student.userId,
    ]);
    return startOne(student);
  }
});

type BinaryParser = (response: Response, done: (error: Error | null, body: unknown) => void) => void;

const toBuffer: BinaryParser = (response, done) => {
  const chunks: Buffer[] = [];
  response.on('data', (chunk: string) => chunks.push(Buffer.from(chunk)));
  response.on('end', () => {
    done(null, Buffer.concat(chunks));
  });
};
