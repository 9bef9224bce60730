import { spawn, type ChildProcess } from 'node:child_process';
import { once } from 'node:events';
import { join } from 'node:path';
import { Gate } from './gate';
import { SOURCE_CONDITION, SOURCE_ENV, Stage } from './stage';

describe('a worker that goes down in the middle of a run', () => {
  let stage: Stage;
  const children: ChildProcess[] = [];

  beforeAll(async () => {
    stage = await Stage.create();
  });

  afterAll(async () => {
    for (const child of children) child.kill('SIGKILL');
    await stage.close();
  });

  function startProcess(): ChildProcess {
    const child = spawn(
      process.execPath,
      [SOURCE_CONDITION, '--import', 'tsx', join(__dirname, 'worker-process.ts')],
      {
        env: {
          ...SOURCE_ENV,
          DATABASE_URL: stage.database.appUrl,
          REDIS_URL: '',
          NOONWELL_WORKER_LOCK_MS: String(stage.settings.lockMs),
          NOONWELL_RECONCILE_MS: String(stage.settings.reconcileMs),
          LOG_LEVEL: 'silent',
        },
        stdio: ['ignore', 'ignore', 'inherit'],
      },
    );
    children.push(child);
    return child;
  }

  it('by SIGKILL leaves it to the next worker, which stores one result', async () => {
    const { runId } = await stage.queueRun();
    const doomed = startProcess();
    const running = await stage.until(runId, (row) => row.state === 'running' && row.progress > 0);
    doomed.kill('SIGKILL');
    await once(doomed, 'exit');

    const gate = new Gate();
    gate.open();
    await stage.startWorker(gate);
    const done = await stage.until(runId, (row) => row.state === 'done');
    // The same try of the person's: nobody had to press anything.
    expect(done).toMatchObject({ attempt: 1, progress: 1, failure: null });
    expect(done.startedAt).toEqual(running.startedAt);
    expect(await stage.results(runId)).toHaveLength(1);
  }, 90_000);

  it('by SIGTERM gives it back at once', async () => {
    const [app] = stage.workers.splice(0);
    await app?.close();
    const { runId } = await stage.queueRun();
    const leaving = startProcess();
    await stage.until(runId, (row) => row.state === 'running' && row.progress > 0);
    leaving.kill('SIGTERM');
    const [back] = await Promise.all([
      stage.until(runId, (row) => row.state === 'queued'),
      once(leaving, 'exit'),
    ]);
    expect(back).toMatchObject({ attempt: 1, claimToken: null });

    const gate = new Gate();
    gate.open();
    await stage.startWorker(gate);
    await stage.until(runId, (row) => row.state === 'done');
    expect(await stage.results(runId)).toHaveLength(1);
  }, 90_000);
});
