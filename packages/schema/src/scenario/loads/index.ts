import { z } from 'zod';
import { fieldRegistry } from '../../field.js';
import { commercialHotWaterSchema } from './commercial-hot-water.js';

/** A new load is a new file and one line here (and its model in the engine's registry). */
export const loadSchema = z.discriminatedUnion('kind', [commercialHotWaterSchema]).register(fieldRegistry, {
  label: 'Load',
  unit: '',
  help: 'Who uses the heat.',
  source: '',
  defaultValue: 'commercialHotWater',
  choices: { commercialHotWater: 'Commercial hot water' },
});
