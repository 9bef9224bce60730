import { existsSync, readFileSync } from 'node:fs';
import { join } from 'node:path';
import { expect, it } from 'vitest';
import { emptySunPosition, sunPosition } from '../../src/sun/position.js';
import { angularSeparationRad, degrees, radians } from '../angles.js';
import { SUN_TOLERANCES } from './tolerances.js';

/**
 * 512 positions at four sites from 1910 to 2210, made by the reference program of Reda & Andreas with 1000 mbar, 10 °C
 * and no clock correction; zenith with refraction. The file is not part of the repository.
 */
const folder = process.env['NOONWELL_WEATHER_DIR'];
const file = folder === undefined ? undefined : join(folder, 'spa_reference_testdata.csv');
const present = file !== undefined && existsSync(file);

it.skipIf(!present)('meets the 512 reference positions (needs NOONWELL_WEATHER_DIR)', () => {
  const rows = readFileSync(file!, 'utf8')
    .split(/\r?\n/)
    .filter((line) => line !== '' && !line.startsWith('#'))
    .map((line) => line.split(','));
  expect(rows).toHaveLength(512);

  const sun = emptySunPosition();
  const misses = rows
    .map(([date, ...numbers]) => {
      const [latitudeDeg, longitudeDeg, azimuthDeg, zenithDeg] = numbers.map(Number);
      sunPosition(Date.parse(date!), radians(latitudeDeg!), radians(longitudeDeg!), 100_000, 10, sun);
      const separationDeg = degrees(
        angularSeparationRad(
          sun.elevationRad,
          sun.azimuthRad,
          radians(90 - zenithDeg!),
          radians(azimuthDeg!),
        ),
      );
      return { date, separationDeg };
    })
    .filter(({ separationDeg }) => !(separationDeg < SUN_TOLERANCES.referenceSeparationDeg));
  expect(misses).toEqual([]);
});
