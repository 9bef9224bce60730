import { z } from 'zod';
import { idSchema, instantSchema } from './common.js';
import { runSummarySchema } from '../summary/summary.js';

export const RUN_STATES = ['queued', 'running', 'done', 'failed', 'cancelled'] as const;
export type RunState = (typeof RUN_STATES)[number];
export const ACTIVE_RUN_STATES: readonly RunState[] = ['queued', 'running'];

export const runSchema = z.object({
  id: idSchema,
  studyId: idSchema,
  scenarioId: idSchema,
  scenarioVersionId: idSchema,
  scenarioVersion: z.int(),
  weatherYearId: idSchema,
  state: z.enum(RUN_STATES),
  /** 0 … 1, never falls within one attempt. */
  progress: z.number().min(0).max(1),
  /** Why it failed, in a sentence that names the part and the weather record; null otherwise. */
  failure: z.string().nullable(),
  cancelRequested: z.boolean(),
  modelVersion: z.string(),
  createdAt: instantSchema,
  startedAt: instantSchema.nullable(),
  finishedAt: instantSchema.nullable(),
  /** Time the engine took, without waiting, reading and storing. */
  engineMs: z.number().nullable(),
  summary: runSummarySchema.nullable(),
});
export type Run = z.infer<typeof runSchema>;

/** Scenarios of a study at most: so many stand side by side, and so many runs one request queues. */
export const MOST_SCENARIOS = 6;

/** Queues one run for the newest version of each named scenario (all of the study's when none is named). A result that already exists is returned, not computed again. */
export const startRunsRequestSchema = z.strictObject({
  scenarioIds: z.array(idSchema).min(1).max(MOST_SCENARIOS).optional(),
});
export const startRunsResponseSchema = z.object({ runs: z.array(runSchema) });

/** One message of `GET /api/studies/:id/events` (server-sent events, event name "run"). */
export const runEventSchema = z.object({
  runId: idSchema,
  scenarioId: idSchema,
  state: z.enum(RUN_STATES),
  progress: z.number(),
  failure: z.string().nullable(),
});
export type RunEvent = z.infer<typeof runEventSchema>;
