import { Inject, Injectable, type FactoryProvider, type OnApplicationShutdown } from '@nestjs/common';
import { MikroORM } from '@mikro-orm/postgresql';
import { createOrm } from '@noonwell/persistence';
import type { WorkerSettings } from './settings';

/** Sessions beside those of the runs: the relay's, its look at a row, the reconciler's. */
const OTHER_SESSIONS = 3;

export function databaseProvider(settings: WorkerSettings): FactoryProvider {
  return {
    provide: MikroORM,
    useFactory: () =>
      createOrm({
        databaseUrl: settings.databaseUrl,
        poolMax: settings.concurrentRuns + OTHER_SESSIONS,
      }),
  };
}

/** Closes the database last: whoever still writes does so in an earlier step of the shutdown. */
@Injectable()
export class DatabaseCloser implements OnApplicationShutdown {
  constructor(@Inject(MikroORM) private readonly orm: MikroORM) {}

  async onApplicationShutdown(): Promise<void> {
    await this.orm.close();
  }
}
