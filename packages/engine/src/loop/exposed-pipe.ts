import { pipeConductanceWmK } from '../heat-transfer/pipe-insulation.js';
import type { PipeSizes, PipeSurroundings } from './pipe-surroundings.js';

/** A pipe in the open: it loses heat to the air. */
export interface ExposedPipeSettings extends PipeSizes {
  readonly kind: 'exposed';
  /** From the jacket to the air, radiation included [W/(m²·K)]. */
  readonly outsideFilmWm2K: number;
}

export function exposedPipe(settings: ExposedPipeSettings): PipeSurroundings {
  return { conductanceWmK: pipeConductanceWmK(settings), outsideC: (airC) => airC };
}
