import { OnWorkerEvent, Processor, WorkerHost } from '@nestjs/bullmq';
import { Inject, Logger, type OnApplicationBootstrap, type OnModuleDestroy } from '@nestjs/common';
import { MikroORM } from '@mikro-orm/postgresql';
import { MODEL_VERSION } from '@noonwell/engine';
import {
  claimRun,
  loggable,
  recordCancelled,
  recordFailure,
  requeueRun,
  storeResult,
  withWorkspace,
  type RunClaim,
} from '@noonwell/persistence';
import { RUN_YEAR_QUEUE, runYearJobSchema, type RunYearJob } from '@noonwell/schema';
import { DelayedError, UnrecoverableError, type Job } from 'bullmq';
import type { WorkerSettings } from '../../settings';
import { RunRefused } from './calculate-run';
import { ProgressWriter } from './progress-writer';
import { RunThreads } from './threads';

/** Times that a job may be taken from a worker that died before its run counts as the reason. */
const MOST_CRASHES = 3;

/** What the queue remembers of a job; the run's row says more. */
export type JobOutcome = 'stored' | 'nothing to do' | 'claim lost';

/**
 * Takes runs from the queue: claims the row, has a thread do the arithmetic, stores the result. A run that failed
 * or was cancelled is final; anything else that goes wrong (the database is away, a thread died) is tried again.
 */
export class RunYearProcessor extends WorkerHost implements OnApplicationBootstrap, OnModuleDestroy {
  private readonly logger = new Logger(RunYearProcessor.name);
  private readonly stopping = new AbortController();

  constructor(
    @Inject(MikroORM) private readonly orm: MikroORM,
    @Inject(RunThreads) private readonly threads: RunThreads,
  ) {
    super();
  }

  onApplicationBootstrap(): void {
    this.worker.run().catch((error: unknown) => {
      this.logger.error({ err: loggable(error) }, 'The queue can no longer be read');
    });
  }

  /** Takes no more jobs, gives the runs in progress back and waits until that is written. */
  async onModuleDestroy(): Promise<void> {
    await this.worker.pause(true);
    this.stopping.abort();
    await this.worker.close();
    await this.threads.close();
  }

  @OnWorkerEvent('error')
  onError(error: Error): void {
    this.logger.warn({ err: loggable(error) }, 'Trouble with the queue');
  }

  async process(job: Job<unknown>, token?: string): Promise<JobOutcome> {
    const parsed = runYearJobSchema.safeParse(job.data);
    if (!parsed.success) throw new UnrecoverableError(`Job ${String(job.id)} names no run.`);
    const { runId } = parsed.data;
    const claim: RunClaim = { runId, token: `${token ?? ''}:${String(job.attemptsStarted)}` };
    try {
      return await this.runClaimed(parsed.data, claim);
    } catch (error) {
      if (error instanceof UnrecoverableError) throw error;
      if (this.stopping.signal.aborted) {
        await this.giveBack(parsed.data, claim, job, token);
      }
      const lastTry = job.attemptsMade + 1 >= (job.opts.attempts ?? 1);
      this.logger.error({ err: loggable(error), runId, lastTry }, 'A run broke off');
      if (lastTry) {
        const sentence = `The run broke off ${String(job.attemptsMade + 1)} times for a reason inside Noonwell, not in the scenario. Try again; if it happens once more, tell whoever runs this server the run's id, ${runId}.`;
        await this.inWorkspace(parsed.data, (em) => recordFailure(em, claim, sentence));
      }
      throw error;
    }
  }

  private async runClaimed(job: RunYearJob, claim: RunClaim): Promise<JobOutcome> {
    const claimed = await this.inWorkspace(job, (em) => claimRun(em, claim));
    if (claimed === 'nothing to do') return claimed;
    if (claimed.modelVersion !== MODEL_VERSION) {
      return this.fail(
        job,
        claim,
        `This run was asked for with version ${claimed.modelVersion} of the calculation, and the server now has ${MODEL_VERSION}. Start the scenario again.`,
      );
    }
    const progress = new ProgressWriter(this.orm.em, job.workspaceId, claim);
    try {
      const signal = AbortSignal.any([progress.signal, this.stopping.signal]);
      const outcome = await this.threads.run(claimed, signal, (done) => {
        progress.reached(done);
      });
      await progress.close();
      const stored = await this.inWorkspace(job, (em) => storeResult(em, claim, job.workspaceId, outcome));
      this.logger.log(
        { runId: job.runId, stored, engineMs: Math.round(outcome.engineMs) },
        'A run is through',
      );
      if (stored === 'cancelled') throw new UnrecoverableError('The run was cancelled.');
      return stored;
    } catch (error) {
      if (error instanceof RunRefused) return await this.fail(job, claim, error.message);
      if (progress.verdict === 'cancel') {
        await this.inWorkspace(job, (em) => recordCancelled(em, claim));
        throw new UnrecoverableError('The run was cancelled.');
      }
      if (progress.verdict === 'claim lost') return 'claim lost';
      throw error;
    } finally {
      await progress.close();
    }
  }

  private async fail(job: RunYearJob, claim: RunClaim, sentence: string): Promise<never> {
    await this.inWorkspace(job, (em) => recordFailure(em, claim, sentence));
    this.logger.log({ runId: job.runId, sentence }, 'A run failed');
    throw new UnrecoverableError(sentence);
  }

  /** The worker is going down: the run waits for the next one, and no try is used up. */
  private async giveBack(
    data: RunYearJob,
    claim: RunClaim,
    job: Job<unknown>,
    token?: string,
  ): Promise<never> {
    await this.inWorkspace(data, (em) => requeueRun(em, claim, data));
    await job.moveToDelayed(Date.now(), token);
    throw new DelayedError();
  }

  private inWorkspace<Result>(
    job: RunYearJob,
    work: Parameters<typeof withWorkspace<Result>>[2],
  ): Promise<Result> {
    return withWorkspace(this.orm.em, job.workspaceId, work);
  }
}

/** Ties the processor to its queue. Called instead of written as a decorator: the options come from settings. */
export function readQueueWith(settings: WorkerSettings): void {
  Processor(RUN_YEAR_QUEUE, {
    autorun: false,
    concurrency: settings.concurrentRuns,
    lockDuration: settings.lockMs,
    stalledInterval: Math.ceil(settings.lockMs / 2),
    maxStalledCount: MOST_CRASHES,
  })(RunYearProcessor);
}
