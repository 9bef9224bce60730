import {
  newScenario,
  runSchema,
  scenarioViewSchema,
  serializeScenario,
  startRunsResponseSchema,
  studySchema,
} from '@noonwell/schema';
import type { Agent } from 'supertest';
import { queryAsAdmin } from './support/admin-query';
import { addTenant, signIn, type Tenant } from './support/people';
import { startTestApp, type TestApp } from './support/test-app';
import { addWeatherYear } from './support/weather-rows';
import { WorkerHand, twoDays } from './support/worker-hand';

/** The coil scenario as format version 1 wrote it: no place, no outages, one kind of pipe. */
function version1() {
  const { place: _place, ...rest } = newScenario('coil');
  const { outages: _outages, ...caught } = rest.catch;
  const { kind: _kind, ...pipe } = rest.carryAndKeep.pipe;
  return { ...rest, formatVersion: 1, catch: caught, carryAndKeep: { ...rest.carryAndKeep, pipe } };
}

describe('documents of older versions', () => {
  let test: TestApp;
  let tenant: Tenant;
  let engineer: Agent;

  beforeAll(async () => {
    test = await startTestApp();
    tenant = await addTenant(test.em, 'Copper');
    engineer = await signIn(test, tenant.people.engineer);
  });
  afterAll(() => test.close());

  it('a stored scenario comes out in the newest version and stays as it was stored', async () => {
    const { id } = studySchema.parse(
      (await engineer.post('/api/studies').send({ name: 'Creamery' }).expect(201)).body,
    );
    const made = scenarioViewSchema.parse(
      (
        await engineer
          .post(`/api/studies/${id}/scenarios`)
          .send({ name: 'Coil', document: newScenario('coil'), weatherYearId: null })
          .expect(201)
      ).body,
    );
    await queryAsAdmin(test.database, 'update scenario_versions set document = $1 where id = $2', [
      JSON.stringify(version1()),
      made.versionId,
    ]);

    const read = await engineer.get(`/api/scenarios/${made.id}`).expect(200);
    expect(read.body).toMatchObject({ version: 1, document: newScenario('coil') });
    const exported = await engineer.get(`/api/scenario-versions/${made.versionId}/export`).expect(200);
    expect(exported.text).toBe(serializeScenario(newScenario('coil')));
    // Saving what was read changes nothing, so there is no new version either.
    const saved = await engineer
      .put(`/api/scenarios/${made.id}`)
      .send({ basedOnVersion: 1, document: made.document, weatherYearId: null })
      .expect(200);
    expect(saved.body).toMatchObject({ version: 1 });
    expect(
      await queryAsAdmin(test.database, 'select document from scenario_versions where id = $1', [
        made.versionId,
      ]),
    ).toEqual([{ document: version1() }]);
  });

  it('a scenario exported long ago can be added', async () => {
    const { id } = studySchema.parse(
      (await engineer.post('/api/studies').send({ name: 'Creamery' }).expect(201)).body,
    );
    const added = await engineer
      .post(`/api/studies/${id}/scenarios`)
      .send({ name: 'Coil', document: version1(), weatherYearId: null })
      .expect(201);
    expect(added.body).toMatchObject({ document: newScenario('coil') });
  });

  it('a summary from before horizon and outages is read with nothing in them', async () => {
    const weatherYearId = await addWeatherYear(
      test.em,
      tenant.workspaceId,
      tenant.people.engineer.userId,
      'Desert',
    );
    const { id } = studySchema.parse(
      (await engineer.post('/api/studies').send({ name: 'Creamery' }).expect(201)).body,
    );
    await engineer
      .post(`/api/studies/${id}/scenarios`)
      .send({ name: 'Coil', document: newScenario('coil'), weatherYearId })
      .expect(201);
    const started = await engineer.post(`/api/studies/${id}/runs`).send({}).expect(200);
    const [run] = startRunsResponseSchema.parse(started.body).runs;
    const hand = new WorkerHand(test.em, tenant.workspaceId, run!.id);
    await hand.take();
    await hand.finish();
    const stored = twoDays().summary.replaceAll(/,\s*"(?:belowHorizonProfile|outOfService)": 0/g, '');
    expect(stored).not.toContain('outOfService');
    await queryAsAdmin(test.database, 'update run_results set summary = $1 where run_id = $2', [
      stored,
      run!.id,
    ]);

    const read = runSchema.parse((await engineer.get(`/api/runs/${run!.id}`).expect(200)).body);
    expect(read.summary).toEqual(JSON.parse(twoDays().summary));
    // The bytes that were stored are handed out as they are; who reads them parses them with the schema.
    expect((await engineer.get(`/api/runs/${run!.id}/summary`).expect(200)).text).toBe(stored);
  });
});
