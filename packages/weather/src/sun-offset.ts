import { sunPosition, type SunPosition, type WeatherYear } from '@noonwell/engine';
import type { TableLabel } from '@noonwell/schema';
import { LABEL_SHARE } from './label.js';

/** The search for the clock: −60 … +60 min about the label, in steps of 5 min. Source: model section 2. */
const SEARCH_MINUTES = 60;
const STEP_MINUTES = 5;
const OFFSETS = Array.from(
  { length: (2 * SEARCH_MINUTES) / STEP_MINUTES + 1 },
  (_, at) => at * STEP_MINUTES - SEARCH_MINUTES,
);

/** Hours with less beam or sun than this say little about the clock (own choice). */
const LEAST_BEAM_WM2 = 20;
/** Sunny hours needed before a month, or a year, can be judged (own choice). */
const LEAST_RECORDS = 40;
const MONTHS_IN_YEAR = 12;
const RAD_PER_DEG = Math.PI / 180;

export interface SunOffset {
  /** Minutes added to the label at which GHI = DHI + DNI cos z closes best; null with too few sunny records. */
  readonly bestMinutes: number | null;
  /** The same for each month. */
  readonly monthlyBestMinutes: readonly (number | null)[];
  /** Mean |GHI − DHI − DNI cos z| over mean GHI at the best offset; null with too few sunny records. */
  readonly closureError: number | null;
}

/**
 * Finds the shift of the clock at which the three irradiances agree with the sun's height. Nothing is changed.
 *
 * @param year weather year
 * @param label what a record's label names of its interval: the offset counts from there
 * @returns best offset [min, −60 … 60], for the year and by month
 * Source: component closure as in Long & Shi 2008, Open Atmos. Sci. J. 2:23; the search is our own.
 */
export function findSunOffset(year: WeatherYear, label: TableLabel): SunOffset {
  const misses = Array.from({ length: MONTHS_IN_YEAR }, () => new Float64Array(OFFSETS.length));
  const counts = new Int32Array(MONTHS_IN_YEAR);
  const ghiSums = new Float64Array(MONTHS_IN_YEAR);
  const labelMs = LABEL_SHARE[label] * year.intervalMinutes * 60_000 - year.utcOffsetHours * 3_600_000;
  const latitudeRad = year.latitudeDeg * RAD_PER_DEG;
  const longitudeRad = year.longitudeDeg * RAD_PER_DEG;
  const sun: SunPosition = { elevationRad: 0, azimuthRad: 0, trueElevationRad: 0 };

  // About one record an hour says as much as all; one more than an hour's, so that every minute has its turn.
  const perHour = Math.round(60 / year.intervalMinutes);
  const stride = perHour > 1 ? perHour + 1 : 1;
  for (let at = 0; at < year.startLocalMs.length; at += stride) {
    const dni = year.dniWm2[at]!;
    if (!(dni >= LEAST_BEAM_WM2)) continue;
    const ghi = year.ghiWm2[at]!;
    const month = new Date(year.startLocalMs[at]!).getUTCMonth();
    const ofMonth = misses[month]!;
    counts[month]! += 1;
    ghiSums[month]! += ghi;
    for (let offset = 0; offset < OFFSETS.length; offset += 1) {
      const utcMs = year.startLocalMs[at]! + labelMs + OFFSETS[offset]! * 60_000;
      sunPosition(utcMs, latitudeRad, longitudeRad, year.pressurePa[at]!, year.dryBulbC[at]!, sun);
      const cosZenith = Math.max(0, Math.sin(sun.elevationRad));
      ofMonth[offset]! += Math.abs(ghi - year.dhiWm2[at]! - dni * cosZenith);
    }
  }

  const total = OFFSETS.map((_, offset) => misses.reduce((sum, ofMonth) => sum + ofMonth[offset]!, 0));
  const records = counts.reduce((sum, count) => sum + count, 0);
  const ghiSum = ghiSums.reduce((sum, ghi) => sum + ghi, 0);
  const enough = records >= LEAST_RECORDS && ghiSum > 0;
  return {
    bestMinutes: enough ? bestOf(total) : null,
    monthlyBestMinutes: misses.map((ofMonth, month) =>
      counts[month]! >= LEAST_RECORDS ? bestOf(ofMonth) : null,
    ),
    closureError: enough ? Math.min(...total) / ghiSum : null,
  };
}

function bestOf(missByOffset: ArrayLike<number>): number {
  let best = 0;
  for (let offset = 1; offset < OFFSETS.length; offset += 1) {
    if (missByOffset[offset]! < missByOffset[best]!) best = offset;
  }
  return OFFSETS[best]!;
}

/** Whether an offset lies at the end of the search, so that the true one may lie beyond. */
export function isAtSearchEnd(minutes: number): boolean {
  return Math.abs(minutes) === SEARCH_MINUTES;
}
