import { InjectQueue } from '@nestjs/bullmq';
import {
  Inject,
  Injectable,
  Logger,
  type OnApplicationBootstrap,
  type OnModuleDestroy,
} from '@nestjs/common';
import { MikroORM } from '@mikro-orm/postgresql';
import {
  RunRow,
  loggable,
  recordCancelled,
  recordFailure,
  requeueRun,
  resendRun,
  withSystemTask,
  withWorkspace,
} from '@noonwell/persistence';
import { ACTIVE_RUN_STATES, RUN_YEAR_QUEUE } from '@noonwell/schema';
import { Queue } from 'bullmq';
import { Repeating } from '../repeating';
import { WORKER_SETTINGS, type WorkerSettings } from '../settings';
import { decideRepair, type ActiveRun, type Repair } from './decide';

const BATCH = 500;

const GIVEN_UP =
  'The run was taken up several times and broke off each time before it could finish, because its worker stopped. Try again; if it happens once more, tell whoever runs this server.';

/**
 * Compares the rows of active runs with the queue. The row is the truth: a job that got lost is added again, a
 * run whose job ended without it is given back or ended. Each repair changes the row only if it still is as it
 * was read, so that several reconcilers and workers can act at once.
 */
@Injectable()
export class Reconciler implements OnApplicationBootstrap, OnModuleDestroy {
  private readonly logger = new Logger(Reconciler.name);
  private readonly repeating = new Repeating(
    () => this.reconcile(),
    (error) => {
      this.logger.error({ err: loggable(error) }, 'Runs cannot be compared with the queue at the moment');
    },
  );

  constructor(
    @Inject(MikroORM) private readonly orm: MikroORM,
    @InjectQueue(RUN_YEAR_QUEUE) private readonly queue: Queue,
    @Inject(WORKER_SETTINGS) private readonly settings: WorkerSettings,
  ) {}

  onApplicationBootstrap(): void {
    this.repeating.start(this.settings.reconcileMs);
  }

  async onModuleDestroy(): Promise<void> {
    await this.repeating.stop();
  }

  /** Looks at every active run once. @returns how many were repaired */
  async reconcile(): Promise<number> {
    let repaired = 0;
    let after = '';
    for (;;) {
      const runs = await this.activeRuns(after);
      for (const run of runs) {
        const repair = decideRepair(run, await this.queue.getJobState(run.id));
        if (repair === 'none' || !(await this.repair(run, repair))) continue;
        this.logger.warn({ runId: run.id, repair }, 'A run and the queue did not agree');
        repaired += 1;
      }
      const last = runs.at(-1);
      if (last === undefined || runs.length < BATCH) return repaired;
      after = last.id;
    }
  }

  private activeRuns(after: string): Promise<ActiveRun[]> {
    return withSystemTask(this.orm.em, 'reconciler', (em) =>
      em.find(
        RunRow,
        { state: { $in: [...ACTIVE_RUN_STATES] }, ...(after === '' ? {} : { id: { $gt: after } }) },
        {
          filters: { workspace: false },
          fields: ['id', 'workspaceId', 'state', 'cancelRequested', 'claimToken'],
          orderBy: { id: 'asc' },
          limit: BATCH,
        },
      ),
    );
  }

  private repair(run: ActiveRun, repair: Exclude<Repair, 'none'>): Promise<boolean> {
    const job = { runId: run.id, workspaceId: run.workspaceId };
    const claim = { runId: run.id, token: run.claimToken ?? '' };
    return withWorkspace(this.orm.em, run.workspaceId, (em) => {
      switch (repair) {
        case 'send to the queue':
          return resendRun(em, job);
        case 'give back to the queue':
          return requeueRun(em, claim, job);
        case 'end as cancelled':
          return recordCancelled(em, claim);
        case 'end as failed':
          return recordFailure(em, claim, GIVEN_UP);
      }
    });
  }
}
