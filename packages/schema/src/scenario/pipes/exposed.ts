import type { PipeSettings } from '@noonwell/engine';
import { z } from 'zod';
import { COMMON_PRACTICE, numberField } from '../../field.js';
import { toSizes } from './sizes-to-engine.js';
import { PIPE_SIZES } from './sizes.js';

export const exposedPipeSchema = z.strictObject({
  kind: z.literal('exposed'),
  ...PIPE_SIZES,
  outsideFilmWm2K: numberField({
    label: 'Film coefficient outside',
    unit: 'W/(m²·K)',
    min: 1,
    max: 200,
    defaultValue: 20,
    help: 'Convection and radiation from the jacket to the air together.',
    source: COMMON_PRACTICE,
  }),
});

export function exposedSettings(pipe: z.infer<typeof exposedPipeSchema>): PipeSettings {
  return { kind: 'exposed', ...toSizes(pipe), outsideFilmWm2K: pipe.outsideFilmWm2K };
}
