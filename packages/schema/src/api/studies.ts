import { z } from 'zod';
import { scenarioSchema } from '../scenario/scenario.js';
import { idSchema, instantSchema, nameSchema } from './common.js';
import { runSchema } from './runs.js';

/** A few lines of text; PostgreSQL holds no NUL, and nobody types other control characters. */
const questionSchema = z
  .string()
  .trim()
  .max(500)
  .regex(/^(?:[^\p{Cc}]|[\t\r\n])*$/u, { error: 'a question holds no control characters' });

export const createStudyRequestSchema = z.strictObject({
  name: nameSchema,
  question: questionSchema.default(''),
});
export const changeStudyRequestSchema = z.strictObject({
  name: nameSchema.optional(),
  question: questionSchema.optional(),
});

export const studySummarySchema = z.object({
  id: idSchema,
  name: z.string(),
  question: z.string(),
  /** A student's own study, seen by its owner and administrators only. */
  sandbox: z.boolean(),
  ownerName: z.string(),
  scenarioCount: z.int(),
  /** Weather years that the scenarios point at, by name; a synthetic one is marked wherever it is named. */
  weatherYears: z.array(z.object({ id: idSchema, name: z.string(), synthetic: z.boolean() })),
  activeRuns: z.int(),
  lastRunFinishedAt: instantSchema.nullable(),
  updatedAt: instantSchema,
  /** Whether the asking person may change it. */
  mayWrite: z.boolean(),
});
export type StudySummary = z.infer<typeof studySummarySchema>;

/** A scenario of a study: its newest version, the weather year it points at and the newest run of that version on that year. */
export const scenarioViewSchema = z.object({
  id: idSchema,
  studyId: idSchema,
  name: z.string(),
  /** Slot that keeps its colour in every chart: 0 is the baseline. */
  position: z.int(),
  version: z.int(),
  versionId: idSchema,
  document: scenarioSchema,
  weatherYearId: idSchema.nullable(),
  weatherYearName: z.string().nullable(),
  updatedAt: instantSchema,
  latestRun: runSchema.nullable(),
});
export type ScenarioView = z.infer<typeof scenarioViewSchema>;

export const studySchema = studySummarySchema.extend({ scenarios: z.array(scenarioViewSchema) });
export type StudyView = z.infer<typeof studySchema>;

export const createScenarioRequestSchema = z.strictObject({
  name: nameSchema,
  document: scenarioSchema,
  weatherYearId: idSchema.nullable(),
});

/** Saves a new version. `basedOnVersion` must be the newest one, else 409: nobody's edit is overwritten unseen. */
export const saveScenarioRequestSchema = z.strictObject({
  basedOnVersion: z.int().min(1),
  name: nameSchema.optional(),
  document: scenarioSchema,
  weatherYearId: idSchema.nullable(),
});

export const scenarioVersionSchema = z.object({
  id: idSchema,
  version: z.int(),
  weatherYearId: idSchema.nullable(),
  createdAt: instantSchema,
  createdByName: z.string(),
});
export type ScenarioVersionView = z.infer<typeof scenarioVersionSchema>;

/** Points every scenario of a study at one weather year (a new version of each that changes). */
export const pointStudyAtWeatherRequestSchema = z.strictObject({ weatherYearId: idSchema });
