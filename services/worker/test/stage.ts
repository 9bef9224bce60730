import { randomUUID } from 'node:crypto';
import { join } from 'node:path';
import { Test, type TestingModule } from '@nestjs/testing';
import { MODEL_VERSION, type WeatherYear } from '@noonwell/engine';
import {
  Membership,
  RUNS_CHANNEL,
  RunResultRow,
  RunRow,
  ScenarioRow,
  ScenarioVersion,
  Study,
  User,
  WeatherColumns,
  WeatherYear as WeatherYearRow,
  Workspace,
  createOrm,
  listen,
  requestRun,
  withScope,
  withWorkspace,
  type Listener,
} from '@noonwell/persistence';
import { newScenario, type RunYearJob } from '@noonwell/schema';
import { createTestDatabase, type TestDatabase } from '@noonwell/testkit/postgres';
import { syntheticYear } from '@noonwell/testkit';
import { encodeWeatherYear, summariseWeather } from '@noonwell/weather';
import type { ThreadEntry } from '../src/jobs/run-year/threads';
import type { WorkerSettings } from '../src/settings';
import { WorkerModule } from '../src/worker.module';
import { Gate } from './gate';

/** jest's own transform does not reach into threads and processes: these settings have them read the sources. */
export const SOURCE_CONDITION = '--conditions=@noonwell/source';
export const SOURCE_ENV = { ...process.env, TSX_TSCONFIG_PATH: join(__dirname, '..', 'tsconfig.json') };

export function gatedThread(gate: Gate): ThreadEntry {
  return {
    file: join(__dirname, 'from-source.cjs'),
    options: {
      execArgv: [SOURCE_CONDITION],
      env: SOURCE_ENV,
      workerData: { entry: join(__dirname, 'gated-thread.ts'), gate: gate.buffer },
    },
  };
}

type Orm = Awaited<ReturnType<typeof createOrm>>;

/** A database of its own with one workspace, one person and one scenario, and what tests do with them. */
export class Stage {
  readonly workers: TestingModule[] = [];
  private readonly listeners = new Set<Listener>();

  private constructor(
    readonly database: TestDatabase,
    readonly orm: Orm,
    readonly ids: { workspace: string; user: string; study: string; scenario: string; weather: string },
  ) {}

  static async create(records = 48): Promise<Stage> {
    const database = await createTestDatabase();
    const orm = await createOrm({ databaseUrl: database.appUrl, poolMax: 6 });
    const ids = {
      workspace: randomUUID(),
      user: randomUUID(),
      study: randomUUID(),
      scenario: randomUUID(),
      weather: randomUUID(),
    };
    await fill(orm, ids, firstRecords(syntheticYear(), records));
    return new Stage(database, orm, ids);
  }

  get settings(): WorkerSettings {
    return {
      databaseUrl: this.database.appUrl,
      redisUrl: undefined,
      concurrentRuns: 2,
      lockMs: 1000,
      reconcileMs: 60_000,
      logLevel: 'silent',
    };
  }

  /** A worker in this process. */
  async startWorker(gate: Gate): Promise<TestingModule> {
    const app = await Test.createTestingModule({
      imports: [WorkerModule.with(this.settings, gatedThread(gate))],
    }).compile();
    app.useLogger(false);
    await app.init();
    this.workers.push(app);
    return app;
  }

  /** A new version of the scenario with its run, queued in one transaction. */
  async queueRun(document: unknown = newScenario()): Promise<RunYearJob> {
    const { workspace, user, study, scenario, weather } = this.ids;
    const versionId = randomUUID();
    const runId = await withWorkspace(this.orm.em, workspace, async (em) => {
      const version = 1 + (await em.count(ScenarioVersion, { scenario }));
      await em.insert(ScenarioVersion, {
        id: versionId,
        workspaceId: workspace,
        scenario,
        version,
        document,
        weatherYear: weather,
        createdAt: new Date(),
        createdBy: user,
      });
      return requestRun(em, {
        workspaceId: workspace,
        studyId: study,
        scenarioId: scenario,
        scenarioVersionId: versionId,
        weatherYearId: weather,
        modelVersion: MODEL_VERSION,
        requestedById: user,
      });
    });
    return { runId, workspaceId: workspace };
  }

  run(runId: string): Promise<RunRow> {
    return withWorkspace(this.orm.em, this.ids.workspace, (em) => em.findOneOrFail(RunRow, { id: runId }));
  }

  results(runId: string): Promise<RunResultRow[]> {
    return withWorkspace(this.orm.em, this.ids.workspace, (em) => em.find(RunResultRow, { runId }));
  }

  /** Waits until the run's row is as wanted; the row's own signals say when to look. */
  async until(runId: string, wanted: (run: RunRow) => boolean): Promise<RunRow> {
    return new Promise<RunRow>((resolve, reject) => {
      const look = () => {
        this.run(runId).then((run) => {
          if (!wanted(run)) return;
          this.listeners.delete(listener);
          void listener.close();
          resolve(run);
        }, reject);
      };
      const listener = listen({
        databaseUrl: this.database.appUrl,
        channel: RUNS_CHANNEL,
        onConnected: look,
        onSignal: look,
        onError: reject,
      });
      this.listeners.add(listener);
    });
  }

  async close(): Promise<void> {
    await Promise.all([...this.listeners].map((listener) => listener.close()));
    for (const app of this.workers) await app.close();
    await this.orm.close();
    await this.database.drop();
  }
}

/** A weather year cut short: the engine runs through whatever there is. */
export function firstRecords(year: WeatherYear, records: number): WeatherYear {
  const cut = (values: Float64Array) => values.slice(0, records);
  return {
    ...year,
    startLocalMs: cut(year.startLocalMs),
    dniWm2: cut(year.dniWm2),
    ghiWm2: cut(year.ghiWm2),
    dhiWm2: cut(year.dhiWm2),
    dryBulbC: cut(year.dryBulbC),
    windMs: cut(year.windMs),
    relativeHumidityPct: cut(year.relativeHumidityPct),
    pressurePa: cut(year.pressurePa),
    flags: year.flags.slice(0, records),
  };
}

async function fill(orm: Orm, ids: Stage['ids'], year: WeatherYear): Promise<void> {
  const now = new Date();
  const mine = { workspaceId: ids.workspace, createdAt: now };
  await withScope(orm.em, { workspaceId: ids.workspace, userId: ids.user }, async (em) => {
    await em.insert(Workspace, { id: ids.workspace, name: 'Test', isDemo: false, createdAt: now });
    await em.insert(User, {
      id: ids.user,
      email: `${ids.user}@example.test`,
      name: 'Tester',
      createdAt: now,
    });
    await em.insert(Membership, {
      ...mine,
      id: randomUUID(),
      user: ids.user,
      role: 'engineer',
      updatedAt: now,
    });
    await em.insert(WeatherYearRow, {
      ...mine,
      id: ids.weather,
      name: 'Two days',
      format: 'synthetic',
      synthetic: true,
      latitudeDeg: year.latitudeDeg,
      longitudeDeg: year.longitudeDeg,
      altitudeM: year.altitudeM,
      utcOffsetHours: year.utcOffsetHours,
      originalFileName: 'two-days.epw',
      originalBytes: 0,
      originalSha256: '',
      warnings: [],
      summary: summariseWeather(year),
      createdBy: ids.user,
    });
    await em.insert(WeatherColumns, {
      workspaceId: ids.workspace,
      weatherYearId: ids.weather,
      bytes: encodeWeatherYear(year),
    });
    await em.insert(Study, {
      ...mine,
      id: ids.study,
      name: 'Study',
      question: '',
      sandbox: false,
      owner: ids.user,
      updatedAt: now,
    });
    await em.insert(ScenarioRow, {
      ...mine,
      id: ids.scenario,
      study: ids.study,
      name: 'Scenario',
      position: 0,
      newestVersion: 1,
      updatedAt: now,
    });
  });
}
