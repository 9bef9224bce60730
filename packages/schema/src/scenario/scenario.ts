import { z } from 'zod';
import { crossFieldProblems } from './cross-fields.js';
import { dishSchema } from './dish.js';
import { electricityUseSchema } from './electricity.js';
import { loadSchema } from './loads/index.js';
import { exposedPipeSchema, pumpSchema } from './loop.js';
import { receiverSchema } from './receivers/index.js';
import { simulationSchema } from './simulation.js';
import { tankSchema } from './tank.js';
import { trackerSchema } from './tracker.js';

export const SCENARIO_FORMAT = 'noonwell-scenario';
export const SCENARIO_FORMAT_VERSION = 1;

/**
 * A scenario as it is stored, exported and run: complete, so that no later change of a default can change
 * an old result. Units stand in the field names. The weather year is named beside it, not in it.
 */
export const scenarioShape = z.strictObject({
  format: z.literal(SCENARIO_FORMAT),
  formatVersion: z.literal(SCENARIO_FORMAT_VERSION),
  catch: z.strictObject({ dish: dishSchema, tracker: trackerSchema, receiver: receiverSchema }),
  carryAndKeep: z.strictObject({ pump: pumpSchema, pipe: exposedPipeSchema, tank: tankSchema }),
  use: z.strictObject({
    loads: z.array(loadSchema).length(1, { error: 'exactly one load is needed' }),
    electricity: electricityUseSchema,
  }),
  simulation: simulationSchema,
});

export const scenarioSchema = scenarioShape.superRefine((scenario, context) => {
  for (const problem of crossFieldProblems(scenario)) {
    context.addIssue({
      code: 'custom',
      path: problem.path.split('.').map((key) => (/^\d+$/.test(key) ? Number(key) : key)),
      message: problem.message,
      input: scenario,
    });
  }
});
export type Scenario = z.infer<typeof scenarioShape>;
