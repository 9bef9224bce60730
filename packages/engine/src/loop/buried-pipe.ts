import { groundTemperatureC, type SurfaceWave } from '../ground/kusuda-achenbach.js';
import { buriedPipeConductanceWmK } from '../heat-transfer/buried-pipe.js';
import type { PipeSizes, PipeSurroundings } from './pipe-surroundings.js';

/** A pipe in the ground: it loses heat to undisturbed ground at its depth. */
export interface BuriedPipeSettings extends PipeSizes {
  readonly kind: 'buried';
  /** From the surface of the ground to the pipe's axis [m]. */
  readonly depthM: number;
  readonly soilConductivityWmK: number;
  readonly soilDiffusivityM2S: number;
}

export function buriedPipe(settings: BuriedPipeSettings, surface: SurfaceWave): PipeSurroundings {
  const { depthM, soilDiffusivityM2S } = settings;
  return {
    conductanceWmK: buriedPipeConductanceWmK(settings),
    outsideC: (_airC, day) => groundTemperatureC(surface, depthM, soilDiffusivityM2S, day),
  };
}
