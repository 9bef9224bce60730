import { z } from 'zod';
import { idSchema } from '../api/common.js';

/** The job of one run. Only ids travel: the row in PostgreSQL holds the data and is the truth. */
export const RUN_YEAR_QUEUE = 'run-year';
export const runYearJobSchema = z.strictObject({ runId: idSchema, workspaceId: idSchema });
export type RunYearJob = z.infer<typeof runYearJobSchema>;

/** The run id is the job id, so that a job added twice is one job. Three attempts: a killed worker is not the run's fault. */
export function runYearJobOptions(runId: string) {
  return {
    jobId: runId,
    attempts: 3,
    backoff: { type: 'exponential', delay: 1000 },
    removeOnComplete: { age: 3600, count: 1000 },
    removeOnFail: { age: 24 * 3600, count: 1000 },
  } as const;
}
