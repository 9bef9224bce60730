import type { WeatherYear } from './weather-year.js';

const MS_PER_DAY = 86_400_000;

/** Month, weekday and hour of each weather record, in local standard time. */
export interface RecordCalendar {
  /** 0 January … 11 December. */
  readonly month: Uint8Array;
  /** 0 the hour from 0 to 1 … 23. */
  readonly hour: Uint8Array;
  readonly weekend: Uint8Array;
  /** 1 … 366. */
  readonly dayOfYear: Uint16Array;
}

/**
 * Calendar of a weather year. Weekdays are counted on from the first record's, because the months of a
 * typical year come from different calendar years.
 */
export function recordCalendar(weather: WeatherYear): RecordCalendar {
  const records = weather.startLocalMs.length;
  const calendar = {
    month: new Uint8Array(records),
    hour: new Uint8Array(records),
    weekend: new Uint8Array(records),
    dayOfYear: new Uint16Array(records),
  };
  const firstMidnightOffsetMs = (weather.startLocalMs[0] ?? 0) % MS_PER_DAY;
  const intervalMs = weather.intervalMinutes * 60_000;
  for (let record = 0; record < records; record++) {
    const startMs = weather.startLocalMs[record]!;
    const date = new Date(startMs);
    const daysSinceStart = Math.floor((firstMidnightOffsetMs + record * intervalMs) / MS_PER_DAY);
    calendar.month[record] = date.getUTCMonth();
    calendar.hour[record] = date.getUTCHours();
    calendar.weekend[record] = (weather.firstWeekday + daysSinceStart) % 7 >= 5 ? 1 : 0;
    calendar.dayOfYear[record] =
      1 + Math.floor((startMs - Date.UTC(date.getUTCFullYear(), 0, 1)) / MS_PER_DAY);
  }
  return calendar;
}
