import { createPostgresBackend, createRedisBackend, setDefaultBackendFactory } from 'bullmq';

/** Where the queue lives. PostgreSQL is the default: one server to install, start and back up. */
export type QueueBackendName = 'postgres' | 'redis';

export interface QueueSettings {
  /** As the app role. */
  readonly databaseUrl: string;
  /** Puts the queue on Redis, for fleets that outgrow about a thousand jobs a second. */
  readonly redisUrl?: string | undefined;
}

export interface QueueBackend {
  readonly name: QueueBackendName;
  /** For the `connection` of every queue and worker. */
  readonly connection: Readonly<Record<string, string | number | null>>;
}

/**
 * Sessions that each queue or worker keeps for itself, beside one that listens. A pool of its own: jobs that wait
 * for the queue never hold the sessions that read and write the data.
 */
const SESSIONS = 2;

/**
 * The one place that decides where jobs are kept. bullmq holds the choice for the whole process and reads it when
 * a queue or worker is made, so call this before any module that makes one is loaded.
 */
export function chooseQueueBackend(settings: QueueSettings): QueueBackend {
  if (settings.redisUrl !== undefined && settings.redisUrl !== '') {
    setDefaultBackendFactory(createRedisBackend);
    // null: a worker's blocking call waits for Redis to come back instead of failing.
    return { name: 'redis', connection: { url: settings.redisUrl, maxRetriesPerRequest: null } };
  }
  setDefaultBackendFactory(createPostgresBackend);
  return { name: 'postgres', connection: { connectionString: settings.databaseUrl, max: SESSIONS } };
}
