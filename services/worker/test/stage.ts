import { randomUUID } from 'node:crypto';
import { join } from 'node:path';
import { BullModule } from '@nestjs/bullmq';
import { Test, type TestingModule } from '@nestjs/testing';
import { MikroORM } from '@mikro-orm/postgresql';
import { MODEL_VERSION, type WeatherYear } from '@noonwell/engine';
import {
  Membership,
  OutboxMessage,
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
  chooseQueueBackend,
  createOrm,
  listen,
  requestRun,
  withScope,
  withWorkspace,
  type Listener,
  type RunOutcome,
} from '@noonwell/persistence';
import { RUN_YEAR_QUEUE, newScenario, type RunYearJob } from '@noonwell/schema';
import { createTestDatabase, type TestDatabase } from '@noonwell/testkit/postgres';
import { syntheticYear } from '@noonwell/testkit';
import { encodeWeatherYear, summariseWeather } from '@noonwell/weather';
import { Worker, type Job } from 'bullmq';
import pg from 'pg';
import type { ThreadEntry } from '../src/jobs/run-year/threads';
import { OutboxRelay } from '../src/outbox/outbox-relay';
import { Reconciler } from '../src/reconciler/reconciler';
import { WORKER_SETTINGS, type WorkerSettings } from '../src/settings';
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

/** Any result will do where only its fate is looked at. */
export const OUTCOME: RunOutcome = {
  modelVersion: MODEL_VERSION,
  summary: '{}',
  columns: Uint8Array.of(1, 2, 3),
  engineMs: 1,
};

export type Parts = TestingModule;

export interface HandWorker {
  readonly token: string;
  /** Makes the run's job active, and those before it. */
  take(runId: string): Promise<Job<unknown>>;
}

type Orm = Awaited<ReturnType<typeof createOrm>>;

/** A database of its own with one workspace, one person and one scenario, and what tests do with them. */
export class Stage {
  readonly workers: TestingModule[] = [];
  private readonly hands: Worker[] = [];
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

  /** Relay, reconciler and queue without a worker and without timers: tests call them by hand. */
  async startParts(): Promise<Parts> {
    const parts = await Test.createTestingModule({
      imports: [
        BullModule.forRoot({ connection: chooseQueueBackend(this.settings).connection }),
        BullModule.registerQueue({ name: RUN_YEAR_QUEUE }),
      ],
      providers: [
        { provide: WORKER_SETTINGS, useValue: this.settings },
        { provide: MikroORM, useValue: this.orm },
        OutboxRelay,
        Reconciler,
      ],
    }).compile();
    parts.useLogger(false);
    this.workers.push(parts);
    return parts;
  }

  /** Takes jobs from the queue by hand. */
  handWorker(): HandWorker {
    const { connection } = chooseQueueBackend(this.settings);
    const worker = new Worker(RUN_YEAR_QUEUE, null, { connection, lockDuration: 60_000 });
    this.hands.push(worker);
    const token = randomUUID();
    return {
      token,
      take: async (runId) => {
        for (;;) {
          // Declared as always giving a job, it gives none from an empty queue.
          const job = (await worker.getNextJob(token, { block: false })) as Job<unknown> | undefined;
          if (job === undefined) throw new Error(`The job of run ${runId} does not wait.`);
          if (job.id === runId) return job;
        }
      },
    };
  }

  /**
   * A new version of the scenario with its run, queued in one transaction.
   * @param beforeCommit what happens elsewhere while that transaction is still open
   */
  async queueRun(
    document: unknown = newScenario(),
    beforeCommit: (job: RunYearJob) => Promise<void> = () => Promise.resolve(),
  ): Promise<RunYearJob> {
    const { workspace, user, study, scenario, weather } = this.ids;
    const versionId = randomUUID();
    const job = await withWorkspace(this.orm.em, workspace, async (em) => {
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
      const runId = await requestRun(em, {
        workspaceId: workspace,
        studyId: study,
        scenarioId: scenario,
        scenarioVersionId: versionId,
        weatherYearId: weather,
        modelVersion: MODEL_VERSION,
        requestedById: user,
      });
      const queued = { runId, workspaceId: workspace };
      await beforeCommit(queued);
      return queued;
    });
    return job;
  }

  messagesOf(runId: string): Promise<OutboxMessage[]> {
    return withWorkspace(this.orm.em, this.ids.workspace, (em) => em.find(OutboxMessage, { runId }));
  }

  /** Waits until a session of this database waits for another's lock. */
  async untilBlocked(): Promise<void> {
    const admin = new pg.Client({ connectionString: this.database.adminUrl });
    await admin.connect();
    try {
      for (;;) {
        const blocked = await admin.query(
          'select 1 from pg_stat_activity where datname = current_database() and cardinality(pg_blocking_pids(pid)) > 0',
        );
        if ((blocked.rowCount ?? 0) > 0) return;
      }
    } finally {
      await admin.end();
    }
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
    for (const hand of this.hands) await hand.close(true);
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
