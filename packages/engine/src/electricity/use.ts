import type { RecordCalendar } from '../calendar.js';
import { requireRange } from '../errors.js';
import { hourlyShares, type Schedule } from '../schedule.js';

export interface ElectricityUseSettings {
  /** Own use of the site in a year, without pump and tracker [J]. */
  readonly annualUseJ: number;
  readonly schedule: Schedule;
}

const YEAR_S = 8760 * 3600;

/**
 * Own use of the site in each record [W], in the schedule's proportions and summing to the yearly use. A run
 * over part of a year uses that part of it.
 */
export function siteUseW(
  settings: ElectricityUseSettings,
  calendar: RecordCalendar,
  intervalS: number,
): Float64Array {
  requireRange('electricity use [J/a]', settings.annualUseJ, 0, 1e18);
  const shares = hourlyShares(settings.schedule, calendar);
  const total = shares.reduce((sum, share) => sum + share, 0);
  if (!(total > 0)) return shares.fill(0);
  const useJ = settings.annualUseJ * Math.min(1, (shares.length * intervalS) / YEAR_S);
  return shares.map((share) => (useJ * share) / (total * intervalS));
}
