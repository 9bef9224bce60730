import type { PipeSettings } from '@noonwell/engine';
import { z } from 'zod';
import { COMMON_PRACTICE, INVENTED, numberField } from '../../field.js';
import type { CrossFieldProblem } from '../problem.js';
import { toSizes } from './sizes-to-engine.js';
import { PIPE_SIZES } from './sizes.js';

export const buriedPipeSchema = z.strictObject({
  kind: z.literal('buried'),
  ...PIPE_SIZES,
  depthM: numberField({
    label: 'Depth of the axis',
    unit: 'm',
    min: 0.05,
    max: 10,
    defaultValue: 0.8,
    help: "From the ground's surface to the middle of the pipe. The two pipes lie apart: what they give each other is left out.",
    source: INVENTED,
  }),
  soilConductivityWmK: numberField({
    label: 'Conductivity of the ground',
    unit: 'W/(m·K)',
    min: 0.1,
    max: 5,
    defaultValue: 1.5,
    help: 'Dry sand about 0.4, moist loam 1 to 2, wet clay or rock more.',
    source: COMMON_PRACTICE,
  }),
  soilDiffusivityMm2S: numberField({
    label: 'Diffusivity of the ground',
    unit: 'mm²/s',
    min: 0.1,
    max: 2,
    defaultValue: 0.6,
    help: "Says how deep and how late the year's wave of the air's temperature reaches into the ground.",
    source: COMMON_PRACTICE,
  }),
});

export type BuriedPipeDocument = z.infer<typeof buriedPipeSchema>;

export function buriedSettings(pipe: BuriedPipeDocument): PipeSettings {
  return {
    kind: 'buried',
    ...toSizes(pipe),
    depthM: pipe.depthM,
    soilConductivityWmK: pipe.soilConductivityWmK,
    soilDiffusivityM2S: pipe.soilDiffusivityMm2S * 1e-6,
  };
}

export function buriedProblems(pipe: BuriedPipeDocument): CrossFieldProblem[] {
  const outerRadiusM = (pipe.boreMm / 2 + pipe.wallMm + pipe.insulationMm) / 1000;
  return pipe.depthM > outerRadiusM
    ? []
    : [
        {
          path: 'carryAndKeep.pipe.depthM',
          message: `The pipe would look out of the ground: its axis must lie deeper than its outer radius of ${outerRadiusM} m`,
        },
      ];
}
