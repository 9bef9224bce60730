import { availableParallelism } from 'node:os';
import { z } from 'zod';

const LONGEST_LOCK_MS = 10 * 60_000;

const environmentSchema = z.object({
  DATABASE_URL: z.string().min(1, { error: 'give the address of the database as the app role' }),
  REDIS_URL: z.string().optional(),
  /** Runs at once. One processor is left to the database and the API. */
  NOONWELL_WORKER_RUNS: z.coerce
    .number()
    .int()
    .min(1)
    .max(64)
    .default(Math.max(1, availableParallelism() - 1)),
  /** How long a run is held without a sign of life before another worker takes it. */
  NOONWELL_WORKER_LOCK_MS: z.coerce.number().int().min(200).max(LONGEST_LOCK_MS).default(10_000),
  /** How often run rows are compared with the queue. */
  NOONWELL_RECONCILE_MS: z.coerce.number().int().min(100).max(LONGEST_LOCK_MS).default(15_000),
  LOG_LEVEL: z.enum(['fatal', 'error', 'warn', 'info', 'debug', 'trace', 'silent']).default('info'),
});

/** Token of the settings for Nest. */
export const WORKER_SETTINGS = Symbol('worker settings');

export interface WorkerSettings {
  readonly databaseUrl: string;
  readonly redisUrl: string | undefined;
  readonly concurrentRuns: number;
  readonly lockMs: number;
  readonly reconcileMs: number;
  readonly logLevel: string;
}

/** The worker's settings. @throws Error that names each variable that is missing or out of range */
export function workerSettings(environment: NodeJS.ProcessEnv): WorkerSettings {
  const read = environmentSchema.safeParse(environment);
  if (!read.success) {
    const faults = read.error.issues.map((issue) => `${issue.path.join('.')}: ${issue.message}`);
    throw new Error(`The worker cannot start.\n${faults.join('\n')}`);
  }
  return {
    databaseUrl: read.data.DATABASE_URL,
    redisUrl: read.data.REDIS_URL,
    concurrentRuns: read.data.NOONWELL_WORKER_RUNS,
    lockMs: read.data.NOONWELL_WORKER_LOCK_MS,
    reconcileMs: read.data.NOONWELL_RECONCILE_MS,
    logLevel: read.data.LOG_LEVEL,
  };
}
