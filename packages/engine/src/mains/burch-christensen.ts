import { requireRange } from '../errors.js';
import type { WeatherYear } from '../weather-year.js';

/** Days that a table of mains temperatures covers: 1…366. */
const DAYS = 366;

/** Water in the ground does not freeze in a mains that flows [°C]. */
const LOWEST_MAINS_C = 0.5;

/** Half a year [d]: by which the southern hemisphere's seasons differ. */
const HALF_YEAR_DAYS = 365 / 2;

const RAD_PER_DEG = Math.PI / 180;

/** What the relation needs to know of a site's air. */
export interface AirClimate {
  /** Mean over the year [°C]. */
  readonly meanC: number;
  /** Warmest less coldest of the monthly means [K]. */
  readonly monthlySpreadK: number;
  readonly southern: boolean;
}

/**
 * Temperature of the mains water on a day of the year.
 *
 * T = mean + 6 + ratio × ½ (max − min of the monthly means) × sin(0.986 (day − 15 − lag) − 90°) in °F, with
 * ratio 0.4 + 0.01 (mean − 44) and lag 35 − (mean − 44) days: water follows the air a month later and less far,
 * and a little warmer for the heat of the ground it crosses. Half a year is added in the south.
 *
 * @param climate of the site's air **[mean −60…45 °C, spread 0…80 K]**
 * @param dayOfYear **[1…366]**
 * @returns **[°C, ≥ 0.5]**
 * @throws DomainError for a climate out of its range
 *
 * Source: Burch & Christensen 2007, Towards Development of an Algorithm for Mains Water Temperature, Proc. ASES
 * (coefficients from memory). Made from sites in the United States; elsewhere an estimate.
 * @example
 * burchChristensenMainsC({ meanC: 10, monthlySpreadK: 20, southern: false }, 200) // 17.46
 */
export function burchChristensenMainsC(climate: AirClimate, dayOfYear: number): number {
  requireRange('mean air temperature [°C]', climate.meanC, -60, 45);
  requireRange('spread of the monthly means [K]', climate.monthlySpreadK, 0, 80);
  requireRange('day of the year', dayOfYear, 1, DAYS);
  const meanF = 1.8 * climate.meanC + 32;
  const amplitudeF = (0.4 + 0.01 * (meanF - 44)) * 0.5 * (1.8 * climate.monthlySpreadK);
  const lagDays = 35 - (meanF - 44);
  const season = dayOfYear - 15 - lagDays + (climate.southern ? HALF_YEAR_DAYS : 0);
  const mainsF = meanF + 6 + amplitudeF * Math.sin((0.986 * season - 90) * RAD_PER_DEG);
  return Math.max(LOWEST_MAINS_C, (mainsF - 32) / 1.8);
}

/**
 * Mean and monthly spread of a weather year's air.
 *
 * Each record counts alike for the mean, each calendar month alike for the spread. A file cut to a few months
 * gives the spread of those it has.
 *
 * @throws DomainError for a year without records or with a temperature that is no number
 */
export function airClimate(weather: WeatherYear): AirClimate {
  const { dryBulbC, startLocalMs } = weather;
  requireRange('records of the weather year', dryBulbC.length, 1, Number.MAX_SAFE_INTEGER);
  const sums = new Float64Array(12);
  const counts = new Float64Array(12);
  for (let i = 0; i < dryBulbC.length; i++) {
    const month = new Date(startLocalMs[i]!).getUTCMonth();
    sums[month]! += dryBulbC[i]!;
    counts[month]! += 1;
  }
  let sum = 0;
  let coldest = Infinity;
  let warmest = -Infinity;
  for (let month = 0; month < 12; month++) {
    sum += sums[month]!;
    if (counts[month] === 0) continue;
    const mean = sums[month]! / counts[month]!;
    coldest = Math.min(coldest, mean);
    warmest = Math.max(warmest, mean);
  }
  return {
    meanC: sum / dryBulbC.length,
    monthlySpreadK: warmest - coldest,
    southern: weather.latitudeDeg < 0,
  };
}

/**
 * Mains temperature for each day of a weather year, computed once from its air.
 * @param weather dry-bulb and latitude are used
 * @returns a function from day of the year **[1…366]** to temperature **[°C, ≥ 0.5]**
 * @throws DomainError for a year without records, a climate out of range, or (the function) for another day
 *
 * Source: {@link burchChristensenMainsC}.
 */
export function createMains(weather: WeatherYear): (dayOfYear: number) => number {
  const climate = airClimate(weather);
  const byDay = Float64Array.from({ length: DAYS }, (_, i) => burchChristensenMainsC(climate, i + 1));
  return (dayOfYear) => {
    requireRange('day of the year', dayOfYear, 1, DAYS);
    return byDay[Math.floor(dayOfYear) - 1]!;
  };
}
