import { requireRange } from '../errors.js';
import type { WeatherYear } from '../weather-year.js';
import type { SurfaceWave } from './kusuda-achenbach.js';

const MS_PER_DAY = 86_400_000;
const DAYS_A_YEAR = 365;

/**
 * The ground surface's yearly wave, taken as the first harmonic of a weather year's air.
 *
 * The surface is taken at the air's temperature: bare or paved ground in the sun is warmer by a few kelvin,
 * shaded or wet ground colder. Typical years join months of several calendar years, so a record counts by its
 * place in its own year. A file without all twelve months has no yearly wave to be found: then the ground stands
 * at the mean of its records.
 *
 * @param weather dry-bulb and starts of the records are used
 * @throws DomainError for a year without records or with a mean temperature that no air has
 *
 * Source: Fourier coefficients of one year, e.g. Bracewell 2000, The Fourier Transform and Its Applications.
 */
export function surfaceWave(
  weather: Pick<WeatherYear, 'dryBulbC' | 'startLocalMs' | 'intervalMinutes'>,
): SurfaceWave {
  const { dryBulbC, startLocalMs, intervalMinutes } = weather;
  const records = dryBulbC.length;
  requireRange('records of the weather year', records, 1, Number.MAX_SAFE_INTEGER);
  const months = new Set<number>();
  let sum = 0;
  let cosine = 0;
  let sine = 0;
  for (let record = 0; record < records; record++) {
    const startMs = startLocalMs[record]!;
    const date = new Date(startMs);
    const year = date.getUTCFullYear();
    const newYearMs = Date.UTC(year, 0, 1);
    const middleMs = startMs + intervalMinutes * 30_000 - newYearMs;
    const angle = (2 * Math.PI * middleMs) / (Date.UTC(year + 1, 0, 1) - newYearMs);
    months.add(date.getUTCMonth());
    sum += dryBulbC[record]!;
    cosine += dryBulbC[record]! * Math.cos(angle);
    sine += dryBulbC[record]! * Math.sin(angle);
  }
  const meanC = sum / records;
  requireRange('mean air temperature [°C]', meanC, -60, 45);
  if (months.size < 12) return { meanC, amplitudeK: 0, coldestDay: 1 };
  // The wave is mean + a cos + b sin = mean − A cos(angle − coldest), coldest where a cos + b sin is least.
  const coldestRad = Math.atan2(-sine, -cosine);
  const turn = (coldestRad + 2 * Math.PI) % (2 * Math.PI);
  return {
    meanC,
    amplitudeK: (2 * Math.hypot(cosine, sine)) / records,
    coldestDay: 1 + (turn / (2 * Math.PI)) * DAYS_A_YEAR,
  };
}

/** Day of the year at the middle of a record, from 1 at the beginning of 1 January, with its fraction. */
export function dayAtMiddle(startLocalMs: number, intervalMinutes: number): number {
  const newYearMs = Date.UTC(new Date(startLocalMs).getUTCFullYear(), 0, 1);
  return 1 + (startLocalMs + intervalMinutes * 30_000 - newYearMs) / MS_PER_DAY;
}
