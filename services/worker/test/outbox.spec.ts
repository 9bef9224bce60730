import { getQueueToken } from '@nestjs/bullmq';
import { OutboxMessage, RunRow, cancelRun, putInOutbox, withWorkspace } from '@noonwell/persistence';
import { RUN_YEAR_QUEUE, runYearJobOptions, type RunYearJob } from '@noonwell/schema';
import { Queue, UnrecoverableError } from 'bullmq';
import { OutboxRelay } from '../src/outbox/outbox-relay';
import { Stage, type Parts } from './stage';

/** The relay alone, called by hand: no worker takes the jobs away. */
describe('the outbox', () => {
  let stage: Stage;
  let parts: Parts;
  let relay: OutboxRelay;
  let queue: Queue;

  beforeAll(async () => {
    stage = await Stage.create();
    parts = await stage.startParts();
    relay = parts.get(OutboxRelay);
    queue = parts.get<Queue>(getQueueToken(RUN_YEAR_QUEUE));
  });

  afterAll(async () => {
    await stage.close();
  });

  const messages = () => withWorkspace(stage.orm.em, stage.ids.workspace, (em) => em.find(OutboxMessage, {}));

  it('takes a message to the queue once its run is committed, and not before', async () => {
    let seen: unknown;
    const job = await stage.queueRun(undefined, async ({ runId }) => {
      // The API's transaction is still open here.
      await relay.relay();
      seen = await queue.getJobState(runId);
    });
    expect(seen).toBe('unknown');
    await relay.relay();
    expect(await queue.getJobState(job.runId)).toBe('waiting');
    expect((await queue.getJob(job.runId))?.data).toEqual(job);
    expect(await messages()).toEqual([]);
  });

  it('leaves nothing behind when the transaction with the run is rolled back', async () => {
    let job: RunYearJob | undefined;
    const broken = stage.queueRun(undefined, (given) => {
      job = given;
      return Promise.reject(new Error('the connection broke'));
    });
    await expect(broken).rejects.toThrow('the connection broke');
    await relay.relay();
    expect(await queue.getJobState(job?.runId ?? '')).toBe('unknown');
    expect(await messages()).toEqual([]);
  });

  it('makes one job of a message that is sent twice, by a relay that died before deleting it', async () => {
    const job = await stage.queueRun();
    await queue.add(RUN_YEAR_QUEUE, job, runYearJobOptions(job.runId));
    const before = await queue.getJobCountByTypes('waiting');
    await relay.relay();
    expect(await queue.getJobCountByTypes('waiting')).toBe(before);
    expect(await messages()).toEqual([]);
  });

  it('is emptied by two relays at once without a job too many', async () => {
    const jobs = [await stage.queueRun(), await stage.queueRun(), await stage.queueRun()];
    const before = await queue.getJobCountByTypes('waiting');
    const other = (await stage.startParts()).get(OutboxRelay);
    await Promise.all([relay.relay(), other.relay(), relay.relay()]);
    await relay.relay();
    expect(await queue.getJobCountByTypes('waiting')).toBe(before + jobs.length);
    expect(await messages()).toEqual([]);
  });

  it('drops the message of a run that was cancelled before it went out', async () => {
    const { runId } = await stage.queueRun();
    await withWorkspace(stage.orm.em, stage.ids.workspace, (em) => cancelRun(em, runId));
    await relay.relay();
    expect(await queue.getJobState(runId)).toBe('unknown');
    expect(await messages()).toEqual([]);
  });

  it("keeps a retried run's message until the job of its earlier try has closed", async () => {
    const job = await stage.queueRun();
    await relay.relay();
    const worker = stage.handWorker();
    const active = await worker.take(job.runId);
    await withWorkspace(stage.orm.em, stage.ids.workspace, (em) => putInOutbox(em, job));
    await relay.relay();
    expect(await messages()).toHaveLength(1);

    await active.moveToFailed(new UnrecoverableError('The run was cancelled.'), worker.token, false);
    await relay.relay();
    expect(await messages()).toEqual([]);
    expect(await queue.getJobState(job.runId)).toBe('waiting');
    expect((await queue.getJob(job.runId))?.attemptsMade).toBe(0);
  });

  it('survives a failure of the queue: the message stays for the next turn', async () => {
    const job = await stage.queueRun();
    const add = jest.spyOn(queue, 'add').mockRejectedValueOnce(new Error('the queue is away'));
    await expect(relay.relay()).rejects.toThrow('the queue is away');
    add.mockRestore();
    expect(await messages()).toHaveLength(1);
    await relay.relay();
    expect(await queue.getJobState(job.runId)).toBe('waiting');
  });

  it('shows no workspace the messages of another', async () => {
    await stage.queueRun();
    const other = '00000000-0000-4000-8000-000000000001';
    const seen = await withWorkspace(stage.orm.em, other, (em) =>
      em.execute<{ count: string }[]>('select count(*) from outbox'),
    );
    expect(seen).toEqual([{ count: '0' }]);
    const runs = await withWorkspace(stage.orm.em, other, (em) => em.count(RunRow, {}));
    expect(runs).toBe(0);
  });
});
