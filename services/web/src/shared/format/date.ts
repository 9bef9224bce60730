import { LOCALE } from './locale.js';
import { NO_VALUE } from './number.js';

const instantFormat = new Intl.DateTimeFormat(LOCALE, { dateStyle: 'medium', timeStyle: 'short' });
const monthFormat = new Intl.DateTimeFormat(LOCALE, { month: 'short', timeZone: 'UTC' });
const longMonthFormat = new Intl.DateTimeFormat(LOCALE, { month: 'long', timeZone: 'UTC' });
const dayFormat = new Intl.DateTimeFormat(LOCALE, { day: 'numeric', month: 'short', timeZone: 'UTC' });

const firstOfMonths = Array.from({ length: 12 }, (_, month) => new Date(Date.UTC(2001, month, 1)));

/** Jan … Dec */
export const MONTH_NAMES: readonly string[] = firstOfMonths.map((date) => monthFormat.format(date));
/** January … December */
export const LONG_MONTH_NAMES: readonly string[] = firstOfMonths.map((date) => longMonthFormat.format(date));

/** A moment of the real world in the reader's own time zone: "12 Mar 2026, 14:05". */
export function formatInstant(iso: string | null | undefined): string {
  return iso == null ? NO_VALUE : instantFormat.format(new Date(iso));
}

/** A day of a weather year, whose times are local standard time written as if it were UTC: "5 Jun". */
export function formatWeatherDay(localMs: number): string {
  return dayFormat.format(new Date(localMs));
}

/** A length of time in words: "0.4 s", "12 s", "3 min". @param ms [ms] */
export function formatDurationMs(ms: number | null | undefined): string {
  if (ms == null) return NO_VALUE;
  if (ms < 9_950) return `${(ms / 1000).toFixed(1)}\u00a0s`;
  if (ms < 120_000) return `${Math.round(ms / 1000)}\u00a0s`;
  return `${Math.round(ms / 60_000)}\u00a0min`;
}
