import { InjectQueue } from '@nestjs/bullmq';
import {
  Inject,
  Injectable,
  Logger,
  type OnApplicationBootstrap,
  type OnModuleDestroy,
} from '@nestjs/common';
import { MikroORM, type EntityManager } from '@mikro-orm/postgresql';
import {
  OUTBOX_CHANNEL,
  OutboxMessage,
  RunRow,
  listen,
  loggable,
  withSystemTask,
  withWorkspace,
  type Listener,
} from '@noonwell/persistence';
import { RUN_YEAR_QUEUE, runYearJobOptions, runYearJobSchema } from '@noonwell/schema';
import { Queue } from 'bullmq';
import { Repeating } from '../repeating';
import { WORKER_SETTINGS, type WorkerSettings } from '../settings';

/** Names the lock that lets one relay work at a time, in whichever process. */
const RELAY_LOCK = 'noonwell outbox relay';
const BATCH = 100;
/** For messages that had to wait for their old job to end, and for signals that were missed. */
const LOOK_AGAIN_MS = 1000;

/**
 * Takes the messages that the API left with its run rows to the queue. A message is deleted after its job was
 * added; a crash in between adds the job again, which the job's id, the run's id, makes one.
 */
@Injectable()
export class OutboxRelay implements OnApplicationBootstrap, OnModuleDestroy {
  private readonly logger = new Logger(OutboxRelay.name);
  private readonly repeating = new Repeating(
    () => this.relay(),
    (error) => {
      this.logger.error({ err: loggable(error) }, 'Runs cannot reach the queue at the moment');
    },
  );
  private listener: Listener | undefined;

  constructor(
    @Inject(MikroORM) private readonly orm: MikroORM,
    @InjectQueue(RUN_YEAR_QUEUE) private readonly queue: Queue,
    @Inject(WORKER_SETTINGS) private readonly settings: WorkerSettings,
  ) {}

  onApplicationBootstrap(): void {
    this.repeating.start(LOOK_AGAIN_MS);
    this.listener = listen({
      databaseUrl: this.settings.databaseUrl,
      channel: OUTBOX_CHANNEL,
      onSignal: () => {
        this.repeating.wake();
      },
      onError: (error) => {
        this.logger.warn(
          { err: loggable(error) },
          'Not listening for new runs at the moment; looking once a second',
        );
      },
    });
  }

  async onModuleDestroy(): Promise<void> {
    await this.listener?.close();
    await this.repeating.stop();
  }

  /** Looks at each message once. */
  async relay(): Promise<void> {
    await withSystemTask(this.orm.em, 'outbox-relay', async (em) => {
      if (!(await this.isMine(em))) return;
      const messages = await em.find(
        OutboxMessage,
        {},
        { filters: { workspace: false }, orderBy: { id: 'asc' }, limit: BATCH },
      );
      const sent: number[] = [];
      for (const message of messages) {
        if (await this.send(message)) sent.push(message.id);
      }
      if (sent.length > 0) {
        await em.nativeDelete(OutboxMessage, { id: { $in: sent } }, { filters: { workspace: false } });
      }
    });
  }

  private async isMine(em: EntityManager): Promise<boolean> {
    const [row] = await em.execute<{ mine: boolean }[]>(
      'select pg_try_advisory_xact_lock(hashtextextended(?, 0)) as mine',
      [RELAY_LOCK],
    );
    return row?.mine === true;
  }

  /** @returns whether the message has done its work and can go */
  private async send(message: OutboxMessage): Promise<boolean> {
    const job = runYearJobSchema.parse(message.payload);
    const run = await withWorkspace(this.orm.em, job.workspaceId, (em) =>
      em.findOne(RunRow, { id: job.runId }, { fields: ['state'] }),
    );
    // Cancelled meanwhile, or sent before by a relay that died before it could delete the message.
    if (run?.state !== 'queued') return true;
    const state = await this.queue.getJobState(job.runId);
    // The job of the run's earlier try is still closing: its id is free in a moment.
    if (state === 'active') return false;
    if (state === 'completed' || state === 'failed') await this.queue.remove(job.runId);
    await this.queue.add(RUN_YEAR_QUEUE, job, runYearJobOptions(job.runId));
    return true;
  }
}
