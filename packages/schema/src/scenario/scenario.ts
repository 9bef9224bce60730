import { z } from 'zod';
import { crossFieldProblems } from './cross-fields.js';
import { dishSchema } from './dish.js';
import { electricityUseSchema } from './electricity.js';
import { loadSchema } from './loads/index.js';
import { pumpSchema } from './loop.js';
import { outagesSchema } from './outages.js';
import { pipeSchema } from './pipes/index.js';
import { placeSchema } from './place.js';
import { receiverSchema } from './receivers/index.js';
import { SCENARIO_FORMAT, SCENARIO_FORMAT_VERSION } from './scenario-format.js';
import { simulationSchema } from './simulation.js';
import { tankSchema } from './tank.js';
import { trackerSchema } from './tracker.js';
import { upgradeScenario } from './upgrade.js';

/**
 * A scenario as it is stored, exported and run: complete, so that no later change of a default can change
 * an old result. Units stand in the field names. The weather year is named beside it, not in it.
 */
export const scenarioShape = z.strictObject({
  format: z.literal(SCENARIO_FORMAT),
  formatVersion: z.literal(SCENARIO_FORMAT_VERSION),
  place: placeSchema,
  catch: z.strictObject({
    dish: dishSchema,
    tracker: trackerSchema,
    outages: outagesSchema,
    receiver: receiverSchema,
  }),
  carryAndKeep: z.strictObject({ pump: pumpSchema, pipe: pipeSchema, tank: tankSchema }),
  use: z.strictObject({
    loads: z.array(loadSchema).length(1, { error: 'exactly one load is needed' }),
    electricity: electricityUseSchema,
  }),
  simulation: simulationSchema,
});

const completeScenario = scenarioShape.superRefine((scenario, context) => {
  for (const problem of crossFieldProblems(scenario)) {
    context.addIssue({
      code: 'custom',
      path: problem.path.split('.').map((key) => (/^\d+$/.test(key) ? Number(key) : key)),
      message: problem.message,
      input: scenario,
    });
  }
});

/** What every reader of documents uses: older format versions are upgraded on the way in. */
export const scenarioSchema = z.preprocess(upgradeScenario, completeScenario);
export type Scenario = z.infer<typeof scenarioShape>;
