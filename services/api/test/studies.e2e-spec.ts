import {
  newScenario,
  pageOf,
  parseScenarioText,
  problemSchema,
  scenarioViewSchema,
  serializeScenario,
  STUDENT_QUOTA,
  studySchema,
  studySummarySchema,
  MOST_SCENARIOS,
  type ScenarioView,
  type StudyView,
} from '@noonwell/schema';
import { randomUUID } from 'node:crypto';
import type { Agent } from 'supertest';
import { meetUncommitted } from './support/admin-query';
import { addTenant, signIn, type Tenant } from './support/people';
import { startTestApp, type TestApp } from './support/test-app';
import { addWeatherYear } from './support/weather-rows';

const studyPageSchema = pageOf(studySummarySchema);

describe('studies and scenarios', () => {
  let test: TestApp;
  let tenant: Tenant;
  let other: Tenant;
  let engineer: Agent;
  let student: Agent;

  beforeAll(async () => {
    test = await startTestApp();
    tenant = await addTenant(test.em, 'Copper');
    other = await addTenant(test.em, 'Amber');
    engineer = await signIn(test, tenant.people.engineer);
    student = await signIn(test, tenant.people.student);
  });
  afterAll(() => test.close());

  const makeStudy = async (who: Agent = engineer, name = 'Creamery'): Promise<StudyView> =>
    studySchema.parse((await who.post('/api/studies').send({ name }).expect(201)).body);
  const coil = () => ({ name: 'Coil', document: newScenario('coil'), weatherYearId: null });
  const addScenario = async (
    study: StudyView,
    body: object = coil(),
    who: Agent = engineer,
  ): Promise<ScenarioView> =>
    scenarioViewSchema.parse(
      (await who.post(`/api/studies/${study.id}/scenarios`).send(body).expect(201)).body,
    );
  const weather = (owner: Tenant = tenant) =>
    addWeatherYear(test.em, owner.workspaceId, owner.people.engineer.userId, 'Desert');
  /** A save of the scenario as it is, with a change. */
  const saved = ({ version, document, weatherYearId }: ScenarioView, change: object = {}) => ({
    basedOnVersion: version,
    document,
    weatherYearId,
    ...change,
  });
  const withDish = (document: ScenarioView['document'], apertureDiameterM: unknown) => ({
    ...document,
    catch: { ...document.catch, dish: { ...document.catch.dish, apertureDiameterM } },
  });

  it('makes, changes, lists and removes a study', async () => {
    const study = await makeStudy(engineer, '  Creamery at the brook ');
    expect(study).toMatchObject({
      name: 'Creamery at the brook',
      question: '',
      sandbox: false,
      mayWrite: true,
      scenarios: [],
    });
    const changed = await engineer
      .patch(`/api/studies/${study.id}`)
      .send({ question: 'Is it worth it?' })
      .expect(200);
    expect(changed.body).toMatchObject({ name: 'Creamery at the brook', question: 'Is it worth it?' });
    const list = await engineer.get('/api/studies').query({ pageSize: 1 }).expect(200);
    expect(list.body).toMatchObject({
      pageSize: 1,
      items: [{ id: study.id, ownerName: tenant.people.engineer.name }],
    });
    await engineer.delete(`/api/studies/${study.id}`).expect(204);
    await engineer.get(`/api/studies/${study.id}`).expect(404);
  });

  it('sets named fields only', async () => {
    const study = await makeStudy();
    for (const extra of [{ ownerId: randomUUID() }, { sandbox: true }, { workspaceId: other.workspaceId }]) {
      await engineer
        .patch(`/api/studies/${study.id}`)
        .send({ name: 'Mine', ...extra })
        .expect(400);
      await engineer
        .post('/api/studies')
        .send({ name: 'Mine', ...extra })
        .expect(400);
    }
    expect((await engineer.get(`/api/studies/${study.id}`)).body).toMatchObject({ name: 'Creamery' });
  });

  it('gives scenarios the lowest free slot, so that the others keep their colours', async () => {
    const study = await makeStudy();
    const made: ScenarioView[] = [];
    for (let at = 0; at < MOST_SCENARIOS; at += 1) made.push(await addScenario(study));
    expect(made.map(({ position }) => position)).toEqual([...made.keys()]);
    const full = await engineer.post(`/api/studies/${study.id}/scenarios`).send(coil()).expect(409);
    expect(problemSchema.parse(full.body).type).toBe('urn:noonwell:problem:too-many-scenarios');
    await engineer.delete(`/api/scenarios/${made[2]!.id}`).expect(204);
    expect((await addScenario(study)).position).toBe(2);
  });

  it('makes a version of each save that changes something, and keeps the old ones', async () => {
    const study = await makeStudy();
    const first = await addScenario(study);
    const same = await engineer
      .put(`/api/scenarios/${first.id}`)
      .send(saved(first, { name: 'Renamed' }))
      .expect(200);
    expect(same.body).toMatchObject({ name: 'Renamed', version: 1 });
    const document = withDish(first.document, 8);
    const second = await engineer
      .put(`/api/scenarios/${first.id}`)
      .send(saved(first, { document }))
      .expect(200);
    expect(second.body).toMatchObject({
      version: 2,
      document: { catch: { dish: { apertureDiameterM: 8 } } },
    });
    const versions = await engineer.get(`/api/scenarios/${first.id}/versions`).expect(200);
    expect(versions.body).toMatchObject({
      total: 2,
      items: [{ version: 2 }, { version: 1, id: first.versionId }],
    });
  });

  it('refuses a save that is based on an older version', async () => {
    const scenario = await addScenario(await makeStudy());
    const change = (diameterM: number) =>
      engineer
        .put(`/api/scenarios/${scenario.id}`)
        .send(saved(scenario, { document: withDish(scenario.document, diameterM) }));
    const answers = await Promise.all([change(8), change(9)]);
    expect(answers.map(({ status }) => status).sort()).toEqual([200, 409]);
    const lost = answers.find(({ status }) => status === 409);
    expect(problemSchema.parse(lost?.body).type).toBe('urn:noonwell:problem:version-conflict');
    expect((await engineer.get(`/api/scenarios/${scenario.id}`)).body).toMatchObject({ version: 2 });
  });

  it('exports the bytes that the command line writes', async () => {
    const scenario = await addScenario(await makeStudy(), { ...coil(), name: 'Present coil / 2 m²' });
    const answer = await engineer.get(`/api/scenario-versions/${scenario.versionId}/export`).expect(200);
    expect(answer.text).toBe(serializeScenario(newScenario('coil')));
    expect(parseScenarioText(answer.text).ok).toBe(true);
    expect(answer.headers['content-disposition']).toContain('present-coil-2-m');
  });

  const dish = newScenario('coil');
  it.each([
    ['a negative diameter', withDish(dish, -6), 'document.catch.dish.apertureDiameterM'],
    ['a text for a number', withDish(dish, '6'), 'document.catch.dish.apertureDiameterM'],
    [
      'null, which is how JSON writes NaN',
      withDish(dish, Number.NaN),
      'document.catch.dish.apertureDiameterM',
    ],
    [
      'a tank of 0 L',
      { ...dish, carryAndKeep: { ...dish.carryAndKeep, tank: { ...dish.carryAndKeep.tank, volumeM3: 0 } } },
      'document.carryAndKeep.tank.volumeM3',
    ],
    ['an unknown field', { ...dish, extra: 1 }, 'document'],
    [
      'a receiver larger than the dish',
      { ...dish, catch: { ...dish.catch, receiver: { ...dish.catch.receiver, faceSideM: 5 } } },
      'document.catch.receiver.faceSideM',
    ],
  ])('refuses %s and saves nothing', async (_, document, path) => {
    const study = await makeStudy();
    const answer = await engineer
      .post(`/api/studies/${study.id}/scenarios`)
      .send({ ...coil(), document })
      .expect(400);
    const { errors } = problemSchema.parse(answer.body);
    expect(errors?.some((error) => error.path?.startsWith(path))).toBe(true);
    expect((await engineer.get(`/api/studies/${study.id}`)).body).toMatchObject({ scenarios: [] });
  });

  it('points a whole study at a weather year, with a version of each scenario that changes', async () => {
    const study = await makeStudy();
    const desert = await weather();
    await addScenario(study);
    await addScenario(study, { ...coil(), weatherYearId: desert });
    const pointed = await engineer
      .put(`/api/studies/${study.id}/weather-year`)
      .send({ weatherYearId: desert })
      .expect(200);
    const { scenarios, weatherYears } = studySchema.parse(pointed.body);
    expect(scenarios.map(({ version, weatherYearId }) => [version, weatherYearId])).toEqual([
      [2, desert],
      [1, desert],
    ]);
    expect(weatherYears.map(({ name }) => name)).toEqual(['Desert']);
    const inUse = await engineer.delete(`/api/weather-years/${desert}`).expect(409);
    expect(problemSchema.parse(inUse.body).type).toBe('urn:noonwell:problem:weather-in-use');
  });

  it('finds no weather year of another workspace, and saves nothing that names one', async () => {
    const study = await makeStudy();
    const scenario = await addScenario(study);
    const theirs = await weather(other);
    await engineer.put(`/api/studies/${study.id}/weather-year`).send({ weatherYearId: theirs }).expect(404);
    await engineer
      .put(`/api/scenarios/${scenario.id}`)
      .send(saved(scenario, { weatherYearId: theirs }))
      .expect(404);
    await engineer
      .post(`/api/studies/${study.id}/scenarios`)
      .send({ ...coil(), weatherYearId: theirs })
      .expect(404);
    expect((await engineer.get(`/api/studies/${study.id}`)).body).toMatchObject({
      scenarios: [{ version: 1, weatherYearId: null }],
    });
  });

  it('lets those who come upon a study just being deleted find nothing, and leaves nothing behind', async () => {
    const year = await weather();
    const study = await makeStudy();
    const scenario = await addScenario(study, { ...coil(), weatherYearId: year });
    const answers = await meetUncommitted(
      test.database,
      'delete from studies where id = $1',
      [study.id],
      [
        () => engineer.post(`/api/studies/${study.id}/scenarios`).send(coil()),
        () => engineer.put(`/api/scenarios/${scenario.id}`).send(saved(scenario, { weatherYearId: null })),
        () => engineer.put(`/api/studies/${study.id}/weather-year`).send({ weatherYearId: year }),
        () => engineer.post(`/api/studies/${study.id}/runs`).send({}),
        () => engineer.delete(`/api/studies/${study.id}`),
      ],
    );
    expect(answers.map(({ status }) => status)).toEqual([404, 404, 404, 404, 404]);
  });

  it('saves nothing on a weather year that is just being deleted, and says so', async () => {
    const year = await weather();
    const study = await makeStudy();
    const [answer] = await meetUncommitted(
      test.database,
      'delete from weather_years where id = $1',
      [year],
      [() => engineer.post(`/api/studies/${study.id}/scenarios`).send({ ...coil(), weatherYearId: year })],
    );
    expect(answer?.status).toBe(409);
    expect(problemSchema.parse(answer?.body).type).toBe('urn:noonwell:problem:changed-meanwhile');
    expect((await engineer.get(`/api/studies/${study.id}`)).body).toMatchObject({ scenarios: [] });
  });

  it('refuses a question that PostgreSQL cannot hold, and takes one of several lines', async () => {
    for (const question of ['a\u0000b', 'a\u0007b']) {
      const answer = await engineer.post('/api/studies').send({ name: 'Creamery', question }).expect(400);
      expect(problemSchema.parse(answer.body).errors?.map(({ path }) => path)).toEqual(['question']);
    }
    await engineer.post('/api/studies').send({ name: 'Creamery', question: 'One\n\ttwo' }).expect(201);
  });

  it("hides a student's sandbox from colleagues, not from administrators, and keeps shared studies from students", async () => {
    const own = await makeStudy(student, 'My first dish');
    expect(own).toMatchObject({ sandbox: true, mayWrite: true });
    const scenario = await addScenario(own, coil(), student);
    for (const path of [
      `studies/${own.id}`,
      `scenarios/${scenario.id}`,
      `scenarios/${scenario.id}/versions`,
    ]) {
      await engineer.get(`/api/${path}`).expect(404);
    }
    await engineer.get(`/api/scenario-versions/${scenario.versionId}/export`).expect(404);
    expect(JSON.stringify((await engineer.get('/api/studies')).body)).not.toContain(own.id);
    const admin = await signIn(test, tenant.people.admin);
    await admin.patch(`/api/studies/${own.id}`).send({ question: 'Seen' }).expect(200);

    const shared = await makeStudy();
    const theirs = await addScenario(shared);
    expect((await student.get(`/api/studies/${shared.id}`).expect(200)).body).toMatchObject({
      mayWrite: false,
    });
    await student.patch(`/api/studies/${shared.id}`).send({ name: 'Mine' }).expect(403);
    await student.delete(`/api/studies/${shared.id}`).expect(403);
    await student.post(`/api/studies/${shared.id}/scenarios`).send(coil()).expect(403);
    await student.put(`/api/scenarios/${theirs.id}`).send(saved(theirs)).expect(403);
    await student.delete(`/api/scenarios/${theirs.id}`).expect(403);
  });

  it('stops a student at the quota, also with requests at once', async () => {
    const list = studyPageSchema.parse((await student.get('/api/studies').query({ pageSize: 200 })).body);
    const before = list.items.filter(({ sandbox }) => sandbox).length;
    const room = STUDENT_QUOTA.studies - before;
    const answers = await Promise.all(
      Array.from({ length: room + 3 }, () => student.post('/api/studies').send({ name: 'Again' })),
    );
    expect(answers.filter(({ status }) => status === 201)).toHaveLength(room);
    expect(answers.filter(({ status }) => status === 409)).toHaveLength(3);
  });
});
