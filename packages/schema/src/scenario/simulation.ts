import { z } from 'zod';
import { fieldRegistry } from '../field.js';

export const STEP_MINUTES = [60, 30, 15, 10, 5, 2.5, 1] as const;

export const simulationSchema = z.strictObject({
  stepMinutes: z.literal(STEP_MINUTES).register(fieldRegistry, {
    label: 'Step',
    unit: 'min',
    help: 'Time step of the calculation. Five minutes is within 0.3 % of the limit for yearly sums.',
    source: "convergence study in the engine's validation",
    defaultValue: 5,
    choices: {
      60: '60 min',
      30: '30 min',
      15: '15 min',
      10: '10 min',
      5: '5 min',
      2.5: '2.5 min',
      1: '1 min',
    },
  }),
});
