import { surfaceWave } from '../ground/surface-wave.js';
import type { WeatherYear } from '../weather-year.js';
import { buriedPipe, type BuriedPipeSettings } from './buried-pipe.js';
import { exposedPipe, type ExposedPipeSettings } from './exposed-pipe.js';
import type { PipeSurroundings } from './pipe-surroundings.js';

/** A new kind of pipe is a new file and its lines here. */
export type PipeSettings = ExposedPipeSettings | BuriedPipeSettings;

/** @throws DomainError for a size out of its range */
export function createPipeSurroundings(settings: PipeSettings, weather: WeatherYear): PipeSurroundings {
  switch (settings.kind) {
    case 'exposed':
      return exposedPipe(settings);
    case 'buried':
      return buriedPipe(settings, surfaceWave(weather));
  }
}
