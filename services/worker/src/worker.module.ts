import { BullModule } from '@nestjs/bullmq';
import { Module, type DynamicModule } from '@nestjs/common';
import { chooseQueueBackend } from '@noonwell/persistence';
import { RUN_YEAR_QUEUE } from '@noonwell/schema';
import { LoggerModule } from 'nestjs-pino';
import { DatabaseCloser, databaseProvider } from './database';
import { RunYearProcessor, readQueueWith } from './jobs/run-year/processor';
import { RunThreads, type ThreadEntry } from './jobs/run-year/threads';
import { OutboxRelay } from './outbox/outbox-relay';
import { Reconciler } from './reconciler/reconciler';
import { WORKER_SETTINGS, type WorkerSettings } from './settings';

@Module({})
export class WorkerModule {
  /** @param thread what calculates a run, where it is not the engine's own */
  static with(settings: WorkerSettings, thread?: ThreadEntry): DynamicModule {
    readQueueWith(settings);
    return {
      module: WorkerModule,
      imports: [
        LoggerModule.forRoot({ pinoHttp: { level: settings.logLevel } }),
        // Before any queue is made: bullmq reads the choice then.
        BullModule.forRoot({ connection: chooseQueueBackend(settings).connection }),
        BullModule.registerQueue({ name: RUN_YEAR_QUEUE }),
      ],
      providers: [
        { provide: WORKER_SETTINGS, useValue: settings },
        databaseProvider(settings),
        DatabaseCloser,
        { provide: RunThreads, useFactory: () => new RunThreads(thread) },
        RunYearProcessor,
        OutboxRelay,
        Reconciler,
      ],
    };
  }
}
