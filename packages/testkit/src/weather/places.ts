import { readFileSync } from 'node:fs';
import { generateSyntheticYear, syntheticPlaceSchema, type SyntheticPlace } from '@noonwell/weather';
import type { WeatherYear } from '@noonwell/engine';

/** The invented places of datasets/synthetic, by file name. */
export const SYNTHETIC_PLACES = ['brackenfold', 'tarn-lane', 'three-alders'] as const;
export type SyntheticPlaceName = (typeof SYNTHETIC_PLACES)[number];

const DATASETS = new URL('../../../../datasets/synthetic/', import.meta.url);

/** The checked descriptor of an invented place. */
export function readSyntheticPlace(name: SyntheticPlaceName): SyntheticPlace {
  return syntheticPlaceSchema.parse(JSON.parse(readFileSync(new URL(`${name}.json`, DATASETS), 'utf8')));
}

const years = new Map<SyntheticPlaceName, WeatherYear>();

/** Weather year of an invented place, made once a process. Do not change its columns: copy them. */
export function syntheticYear(name: SyntheticPlaceName = 'brackenfold'): WeatherYear {
  let year = years.get(name);
  if (year === undefined) {
    year = generateSyntheticYear(readSyntheticPlace(name));
    years.set(name, year);
  }
  return year;
}
