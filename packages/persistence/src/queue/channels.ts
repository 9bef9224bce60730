import { idSchema } from '@noonwell/schema';
import { z } from 'zod';

/** PostgreSQL's notification channels; the triggers that send on them stand in the migrations. */
export const RUNS_CHANNEL = 'noonwell_runs';
export const OUTBOX_CHANNEL = 'noonwell_outbox';

/** What a change of a run says: ids only. */
export const runSignalSchema = z.object({ workspaceId: idSchema, studyId: idSchema, runId: idSchema });
export type RunSignal = z.infer<typeof runSignalSchema>;
