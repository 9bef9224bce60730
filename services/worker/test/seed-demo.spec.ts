import { createYearRun } from '@noonwell/engine';
import {
  RunResultRow,
  RunRow,
  ScenarioRow,
  Study,
  WeatherYear,
  Workspace,
  createOrm,
  withScope,
} from '@noonwell/persistence';
import { runSummarySchema } from '@noonwell/schema';
import { createTestDatabase, type TestDatabase } from '@noonwell/testkit/postgres';
import { seedDemoWorkspace } from '../src/demo/seed-demo-workspace';
import type { StartYear } from '../src/jobs/run-year/calculate-run';
import { firstRecords } from './stage';

describe('the demo', () => {
  let database: TestDatabase;
  let orm: Awaited<ReturnType<typeof createOrm>>;
  const quiet = () => undefined;
  /** The engine on the year's first ten days: jest's transform makes it slow, and a whole year adds nothing here. */
  const tenDays: StartYear = (machine, weather) => createYearRun(machine, firstRecords(weather, 240));

  beforeAll(async () => {
    database = await createTestDatabase();
    orm = await createOrm({ databaseUrl: database.appUrl, poolMax: 3 });
  });

  afterAll(async () => {
    await orm.close();
    await database.drop();
  });

  /** The demo workspace's id, as anybody can see it. */
  async function demoId(): Promise<string | undefined> {
    const demo = await withScope(orm.em, {}, (em) => em.findOne(Workspace, { isDemo: true }));
    return demo?.id;
  }

  it('is there whole or not at all', async () => {
    const broken = seedDemoWorkspace(
      orm.em,
      () => {
        throw new Error('no engine');
      },
      quiet,
    );
    await expect(broken).rejects.toThrow('no engine');
    expect(await demoId()).toBeUndefined();
  }, 60_000);

  it('is made once, also by two starts at once, with both scenarios run on a synthetic year', async () => {
    const made = await Promise.all([
      seedDemoWorkspace(orm.em, tenDays, quiet),
      seedDemoWorkspace(orm.em, tenDays, quiet),
    ]);
    expect(made.sort()).toEqual([false, true]);
    expect(await seedDemoWorkspace(orm.em, tenDays, quiet)).toBe(false);

    const workspaceId = (await demoId()) ?? '';
    await withScope(orm.em, { workspaceId }, async (em) => {
      const [study, ...others] = await em.find(Study, {});
      expect(others).toEqual([]);
      expect(study).toMatchObject({ name: 'Brackenfold Creamery', sandbox: false });
      const scenarios = await em.find(ScenarioRow, {}, { orderBy: { position: 'asc' } });
      expect(scenarios.map(({ name }) => name)).toEqual(['Present coil receiver', 'Dual cell receiver']);
      const runs = await em.find(RunRow, {});
      expect(runs.map(({ state }) => state)).toEqual(['done', 'done']);
      for (const { synthetic } of await em.find(WeatherYear, {})) expect(synthetic).toBe(true);
      const summaries = (await em.find(RunResultRow, {})).map(({ summary }) =>
        runSummarySchema.parse(JSON.parse(summary)),
      );
      for (const summary of summaries) {
        expect(summary.hours).toBe(240);
        expect(summary.ledger.residualOfBeam).toBeLessThan(1e-9);
      }
      // The study asks for electricity against heat: one receiver makes some, the other none.
      const power = summaries.map(({ powerAcKwh }) => powerAcKwh).sort((a, b) => a - b);
      expect(power[0]).toBe(0);
      expect(power[1]).toBeGreaterThan(0);
    });
  }, 120_000);
});
