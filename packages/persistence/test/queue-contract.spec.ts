/** What Noonwell needs of its queue, on every backend it can be put on. */
import { spawn } from 'node:child_process';
import { randomUUID } from 'node:crypto';
import { once } from 'node:events';
import { join } from 'node:path';
import { createTestDatabase, type TestDatabase } from '@noonwell/testkit/postgres';
import { Queue, UnrecoverableError, Worker, type Job } from 'bullmq';
import pg from 'pg';
import { chooseQueueBackend, migrateQueue, type QueueBackend } from '../src/queue/index.js';
import { redisAvailable, startTestRedis, type TestRedis } from './redis-server.js';

const backends = ['postgres', 'redis'] as const;

describe.each(backends)('queue on %s', (name) => {
  if (name === 'redis' && !redisAvailable()) {
    it.skip('needs redis-server on PATH or TEST_REDIS_URL', () => undefined);
    return;
  }
  let database: TestDatabase;
  let redis: TestRedis | undefined;
  let backend: QueueBackend;
  let queue: Queue;
  let workers: Worker[] = [];
  const job = { attempts: 3, backoff: { type: 'fixed', delay: 10 } };

  beforeAll(async () => {
    database = await createTestDatabase();
    const owner = new pg.Client({ connectionString: database.ownerUrl });
    await owner.connect();
    await migrateQueue(owner, database.appRole);
    await owner.end();
    if (name === 'redis') redis = await startTestRedis();
  });

  beforeEach(() => {
    backend = chooseQueueBackend({ databaseUrl: database.appUrl, redisUrl: redis?.url });
    queue = new Queue(`contract-${randomUUID()}`, { connection: backend.connection });
  });

  afterEach(async () => {
    await Promise.all(workers.map((worker) => worker.close(true)));
    workers = [];
    await queue.obliterate({ force: true });
    await queue.close();
  });

  afterAll(async () => {
    await redis?.stop();
    await database.drop();
  });

  function startWorker(work: (job: Job) => Promise<unknown>, concurrency = 1): Worker {
    const worker = new Worker(queue.name, work, {
      connection: backend.connection,
      concurrency,
      lockDuration: 1000,
      stalledInterval: 200,
    });
    worker.on('error', () => undefined);
    workers.push(worker);
    return worker;
  }

  const finished = (worker: Worker) => once(worker, 'completed') as Promise<[Job, unknown]>;

  it('is the backend that was asked for', () => {
    expect(backend.name).toBe(name);
  });

  it('hands a job to a worker and remembers what it gave', async () => {
    const id = randomUUID();
    await queue.add('run', { runId: id }, { ...job, jobId: id });
    const worker = startWorker((given) => Promise.resolve(given.data));
    const [done] = await finished(worker);
    expect(done.id).toBe(id);
    expect(done.returnvalue).toEqual({ runId: id });
  });

  it('runs a job once that was added twice', async () => {
    const id = randomUUID();
    await Promise.all([
      queue.add('run', {}, { ...job, jobId: id }),
      queue.add('run', {}, { ...job, jobId: id }),
    ]);
    const last = randomUUID();
    await queue.add('run', {}, { ...job, jobId: last });
    const seen: (string | undefined)[] = [];
    const worker = startWorker((given) => {
      seen.push(given.id);
      return Promise.resolve();
    });
    await new Promise<void>((resolve) => {
      worker.on('completed', (given) => {
        if (given.id === last) resolve();
      });
    });
    expect(seen).toEqual([id, last]);
  });

  it('works on several jobs at once although its pool is small', async () => {
    let together = 0;
    const all = new Promise<void>((resolve) => {
      startWorker(async () => {
        together += 1;
        if (together === 6) resolve();
        await all;
      }, 6);
    });
    await Promise.all(Array.from({ length: 6 }, () => queue.add('run', {}, { ...job, jobId: randomUUID() })));
    await all;
    expect(together).toBe(6);
  });

  it('tries again after an error, and not after a final one', async () => {
    const id = randomUUID();
    const tries: number[] = [];
    const worker = startWorker((given) => {
      tries.push(given.attemptsMade);
      if (tries.length === 1) throw new Error('the database is away');
      throw new UnrecoverableError('the scenario has no water');
    });
    const failed = new Promise<string>((resolve) => {
      worker.on('failed', (_, error) => {
        if (error instanceof UnrecoverableError) resolve(error.message);
      });
    });
    await queue.add('run', {}, { ...job, jobId: id });
    expect(await failed).toBe('the scenario has no water');
    expect(tries).toEqual([0, 1]);
    expect(await queue.getJobState(id)).toBe('failed');
  });

  it('takes the id of a finished job again once that job is removed', async () => {
    const id = randomUUID();
    const worker = startWorker(() => Promise.resolve());
    let done = finished(worker);
    const first = await queue.add('run', {}, { ...job, jobId: id });
    await done;
    await first.remove();
    done = finished(worker);
    await queue.add('run', {}, { ...job, jobId: id });
    const [again] = await done;
    expect(again.id).toBe(id);
  });

  it('gives the job of a killed process to another worker', async () => {
    const id = randomUUID();
    const child = spawn(
      process.execPath,
      ['--conditions=@noonwell/source', '--import', 'tsx', join(__dirname, 'hanging-worker.ts')],
      {
        env: {
          ...process.env,
          DATABASE_URL: database.appUrl,
          REDIS_URL: redis?.url ?? '',
          TEST_QUEUE: queue.name,
        },
        stdio: ['ignore', 'pipe', 'inherit'],
      },
    );
    await queue.add('run', {}, { ...job, jobId: id });
    const [line] = (await once(child.stdout, 'data')) as [Buffer];
    expect(line.toString().trim()).toBe(`taken ${id}`);
    child.kill('SIGKILL');
    await once(child, 'exit');

    const worker = startWorker(() => Promise.resolve('finished by the second'));
    const [done] = await finished(worker);
    expect(done.id).toBe(id);
    expect(done.stalledCounter).toBe(1);
    // A process that reads TypeScript takes seconds to start on a busy machine.
  }, 60_000);
});
