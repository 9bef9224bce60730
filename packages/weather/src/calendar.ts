/** Months and weekdays as they are written in messages and files; Monday is weekday 0. */
export const WEEKDAYS = [
  'Monday',
  'Tuesday',
  'Wednesday',
  'Thursday',
  'Friday',
  'Saturday',
  'Sunday',
] as const;

export const MONTHS = [
  'January',
  'February',
  'March',
  'April',
  'May',
  'June',
  'July',
  'August',
  'September',
  'October',
  'November',
  'December',
] as const;

const LEAP_MONTH_DAYS = [31, 29, 31, 30, 31, 30, 31, 31, 30, 31, 30, 31] as const;
const MONTH_START_DAY = LEAP_MONTH_DAYS.map((_, month) =>
  LEAP_MONTH_DAYS.slice(0, month).reduce((sum, days) => sum + days, 0),
);

/** Hours of a leap year: a slot is an hour's place in it, so that each (month, day, hour) has one slot in every year. */
export const LEAP_YEAR_HOURS = 8784;
export const FEBRUARY_29_FIRST_SLOT = (31 + 28) * 24;
export const FEBRUARY_29_END_SLOT = FEBRUARY_29_FIRST_SLOT + 24;

/** Days of a month (1 … 12) in a leap year; 0 for another number. */
export function longestMonthDays(month: number): number {
  return LEAP_MONTH_DAYS[month - 1] ?? 0;
}

/** Slot of the hour that ends at `hour` (1 … 24) of a day. */
export function slotOf(month: number, day: number, hour: number): number {
  return ((MONTH_START_DAY[month - 1] ?? 0) + day - 1) * 24 + hour - 1;
}

/** "17 June, hour 14": the hour that ends at 14:00. */
export function slotText(slot: number): string {
  const dayOfYear = Math.floor(slot / 24);
  let month = 11;
  while ((MONTH_START_DAY[month] ?? 0) > dayOfYear) month -= 1;
  return `${dayOfYear - (MONTH_START_DAY[month] ?? 0) + 1} ${MONTHS[month] ?? ''}, hour ${(slot % 24) + 1}`;
}

export function isLeapYear(year: number): boolean {
  return (year % 4 === 0 && year % 100 !== 0) || year % 400 === 0;
}

const HOUR_MS = 3_600_000;

/** Start of a slot in a calendar year: local standard time written as if it were UTC [ms since 1970]. */
export function slotStartLocalMs(year: number, slot: number): number {
  const hours = isLeapYear(year) || slot < FEBRUARY_29_FIRST_SLOT ? slot : slot - 24;
  return Date.UTC(year, 0, 1) + hours * HOUR_MS;
}
