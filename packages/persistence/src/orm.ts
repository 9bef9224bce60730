import type { MikroORM as Orm } from '@mikro-orm/core';
import { defineConfig, MikroORM, type Options, type PostgreSqlDriver } from '@mikro-orm/postgresql';
import { ENTITIES } from './entities.js';
import { QUEUE_SCHEMA } from './queue/migrate.js';

export interface OrmSettings {
  /** Connection string of the app role. */
  readonly databaseUrl: string;
  /** Connections at most; the queue has its own. */
  readonly poolMax?: number;
}

/** Options shared by the API, the worker, tests and seeds. Connects lazily. */
export function ormOptions({ databaseUrl, poolMax = 10 }: OrmSettings): Options {
  return defineConfig({
    clientUrl: databaseUrl,
    entities: ENTITIES,
    // Where a query follows a relation, the policies of row-level security stand; joining every reference for
    // the filter's sake would only repeat them.
    autoJoinRefsForFilters: false,
    forceUtcTimezone: true,
    pool: { min: 0, max: poolMax },
    // An aborted transaction is reported by the error that caused it, not by MikroORM's debug output.
    debug: false,
    schemaGenerator: { ignoreSchema: [QUEUE_SCHEMA] },
    // Rows come and go by the request's own transaction only.
    allowGlobalContext: false,
  });
}

export function createOrm(settings: OrmSettings): Promise<Orm<PostgreSqlDriver>> {
  return MikroORM.init(ormOptions(settings));
}
