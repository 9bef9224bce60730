import { getQueueToken } from '@nestjs/bullmq';
import { cancelRun, claimRun, storeResult, withWorkspace } from '@noonwell/persistence';
import { RUN_YEAR_QUEUE, type RunYearJob } from '@noonwell/schema';
import { Queue, UnrecoverableError } from 'bullmq';
import { OutboxRelay } from '../src/outbox/outbox-relay';
import { Reconciler } from '../src/reconciler/reconciler';
import { OUTCOME, Stage } from './stage';

/** Relay and reconciler called by hand, on rows and jobs that were made to disagree. */
describe('the reconciler', () => {
  let stage: Stage;
  let relay: OutboxRelay;
  let reconciler: Reconciler;
  let queue: Queue;

  beforeEach(async () => {
    stage = await Stage.create();
    const parts = await stage.startParts();
    relay = parts.get(OutboxRelay);
    reconciler = parts.get(Reconciler);
    queue = parts.get<Queue>(getQueueToken(RUN_YEAR_QUEUE));
  });

  afterEach(async () => {
    await stage.close();
  });

  const inWorkspace = <Result>(work: Parameters<typeof withWorkspace<Result>>[2]) =>
    withWorkspace(stage.orm.em, stage.ids.workspace, work);

  async function sent(): Promise<RunYearJob> {
    const job = await stage.queueRun();
    await relay.relay();
    return job;
  }

  it('leaves alone what agrees: on its way, waiting, taken, finished', async () => {
    await stage.queueRun();
    expect(await reconciler.reconcile()).toBe(0);
    await relay.relay();
    expect(await reconciler.reconcile()).toBe(0);

    const taken = await sent();
    const worker = stage.handWorker();
    await worker.take(taken.runId);
    const claim = { runId: taken.runId, token: 'a' };
    await inWorkspace((em) => claimRun(em, claim));
    expect(await reconciler.reconcile()).toBe(0);
    await inWorkspace((em) => storeResult(em, claim, taken.workspaceId, OUTCOME));
    expect(await reconciler.reconcile()).toBe(0);
  });

  it('sends a waiting run to the queue again when its job got lost', async () => {
    const { runId } = await sent();
    await queue.remove(runId);
    expect(await reconciler.reconcile()).toBe(1);
    // The word is on its way already.
    expect(await reconciler.reconcile()).toBe(0);
    await relay.relay();
    expect(await queue.getJobState(runId)).toBe('waiting');
  });

  it('gives back a running run that nobody works on', async () => {
    const { runId } = await sent();
    await inWorkspace((em) => claimRun(em, { runId, token: 'gone' }));
    await queue.remove(runId);
    expect(await reconciler.reconcile()).toBe(1);
    expect(await stage.run(runId)).toMatchObject({ state: 'queued', claimToken: null, attempt: 1 });
    await relay.relay();
    expect(await queue.getJobState(runId)).toBe('waiting');
    // Whoever held it before comes too late.
    const late = { runId, token: 'gone' };
    expect(await inWorkspace((em) => storeResult(em, late, stage.ids.workspace, OUTCOME))).toBe('claim lost');
    expect(await stage.results(runId)).toEqual([]);
  });

  it('ends a run as cancelled when that was asked for and nobody works on it', async () => {
    const { runId } = await sent();
    await inWorkspace((em) => claimRun(em, { runId, token: 'gone' }));
    await inWorkspace((em) => cancelRun(em, runId));
    await queue.remove(runId);
    expect(await reconciler.reconcile()).toBe(1);
    expect((await stage.run(runId)).state).toBe('cancelled');
  });

  it('ends a run as failed when the queue gave its job up', async () => {
    const { runId } = await sent();
    const worker = stage.handWorker();
    const job = await worker.take(runId);
    await inWorkspace((em) => claimRun(em, { runId, token: 'gone' }));
    await job.moveToFailed(
      new UnrecoverableError('job stalled more than allowable limit'),
      worker.token,
      false,
    );
    expect(await reconciler.reconcile()).toBe(1);
    const run = await stage.run(runId);
    expect(run.state).toBe('failed');
    expect(run.failure).toContain('broke off each time');
  });

  it('repairs nothing twice when two of them look at once', async () => {
    const { runId } = await sent();
    await inWorkspace((em) => claimRun(em, { runId, token: 'gone' }));
    await queue.remove(runId);
    const other = (await stage.startParts()).get(Reconciler);
    const repaired = await Promise.all([reconciler.reconcile(), other.reconcile()]);
    expect(repaired[0] + repaired[1]).toBe(1);
  });
});
