import type { TableDateOrder } from '@noonwell/schema';
import { isLeapYear, longestMonthDays } from '../calendar.js';

/** Where the time stamp of a line stands; columns are indices from 0. */
export type TimeLayout =
  | { readonly kind: 'stamp'; readonly column: number }
  | { readonly kind: 'dateAndTime'; readonly date: number; readonly time: number }
  | {
      readonly kind: 'parts';
      readonly year: number;
      readonly month: number;
      readonly day: number;
      readonly hour: number;
      /** −1 where there is none. */
      readonly minute: number;
    };

/** Columns of the time stamp, in the order of its parts. */
export function timeColumns(layout: TimeLayout): number[] {
  switch (layout.kind) {
    case 'stamp':
      return [layout.column];
    case 'dateAndTime':
      return [layout.date, layout.time];
    case 'parts':
      return [layout.year, layout.month, layout.day, layout.hour, layout.minute].filter((at) => at >= 0);
  }
}

export interface TimeLabel {
  /** The label as if its clock were UTC; UTC itself where `statesOffset`. */
  readonly ms: number;
  /** The label carries "Z" or an offset. */
  readonly statesOffset: boolean;
}

const DATE = /^(\d{1,4})([-/.])(\d{1,2})\2(\d{1,4})(?!\d)/;
const COMPACT_DATE = /^(\d{4})(\d{2})(\d{2})/;
const TIME = /^(\d{1,2}):(\d{2})(?::(\d{2})(?:[.,]\d+)?)?\s*([ap]m)?/i;
const COMPACT_TIME = /^(\d{2})(\d{2})(?:\d{2})?(?!\d)/;
const OFFSET = /^(?:z|utc|gmt|([+-])(\d{2}):?(\d{2})?)$/i;
const FIRST_YEAR = 1850;
const LAST_YEAR = 2150;

interface DateParts {
  readonly first: number;
  readonly second: number;
  readonly third: number;
  readonly yearIsFirst: boolean;
  readonly rest: string;
}

function splitDate(text: string): DateParts | null {
  const separated = DATE.exec(text);
  const match = separated ?? COMPACT_DATE.exec(text);
  if (match === null) return null;
  const [first, second, third] =
    separated === null ? [match[1], match[2], match[3]] : [match[1], match[3], match[4]];
  const yearIsFirst = (first ?? '').length === 4;
  // A year needs four digits: of "18" nobody knows the century, nor whether it is a day.
  if (!yearIsFirst && (third ?? '').length !== 4) return null;
  return {
    first: Number(first),
    second: Number(second),
    third: Number(third),
    yearIsFirst,
    rest: text.slice(match[0].length).replace(/^[\sT:,]+/i, ''),
  };
}

/** Whether a cell holds a date, and whether a time of day follows in the same cell. */
export function looksLikeStamp(cell: string): 'no' | 'date' | 'dateTime' {
  const date = splitDate(cell.trim());
  if (date === null) return 'no';
  if (date.rest === '') return 'date';
  return readTimeOfDay(date.rest) === null ? 'no' : 'dateTime';
}

/** Whether a cell holds a time of day by itself: "07:00", or an hour from 0 to 24. */
export function looksLikeTimeOfDay(cell: string): boolean {
  return /^(?:\d{1,2}:\d{2}(?::\d{2})?\s*(?:[ap]m)?|\d{1,2})$/i.test(cell.trim());
}

interface TimeOfDay {
  readonly minutes: number;
  /** Minutes east of UTC; null where none is stated. */
  readonly offsetMinutes: number | null;
}

/** 24:00 is the end of its own day. */
function readTimeOfDay(text: string): TimeOfDay | null {
  const clock = TIME.exec(text);
  const compact = clock === null ? COMPACT_TIME.exec(text) : null;
  const bare = clock === null && compact === null ? /^(\d{1,2})(?![\d:])/.exec(text) : null;
  const match = clock ?? compact ?? bare;
  if (match === null) return null;
  let hour = Number(match[1]);
  const minute = bare === null ? Number(match[2]) : 0;
  const half = clock?.[4]?.toLowerCase();
  if (half !== undefined) {
    if (hour < 1 || hour > 12) return null;
    hour = (hour % 12) + (half === 'pm' ? 12 : 0);
  }
  if (minute > 59 || hour > 24 || (hour === 24 && minute > 0)) return null;
  const rest = text.slice(match[0].length).trim();
  const offset = rest === '' ? null : OFFSET.exec(rest);
  if (rest !== '' && offset === null) return null;
  const east =
    offset === null
      ? null
      : (offset[1] === '-' ? -1 : 1) * (Number(offset[2] ?? 0) * 60 + Number(offset[3] ?? 0));
  return { minutes: hour * 60 + minute, offsetMinutes: east };
}

/** Midnight of a date [ms]; NaN where there is no such day. */
function midnight(year: number, month: number, day: number): number {
  if (!(year >= FIRST_YEAR && year <= LAST_YEAR)) return NaN;
  if (!(day >= 1 && day <= longestMonthDays(month)) || (month === 2 && day === 29 && !isLeapYear(year)))
    return NaN;
  return Date.UTC(year, month - 1, day);
}

function dateMs({ first, second, third, yearIsFirst }: DateParts, order: TableDateOrder): number {
  if (yearIsFirst !== (order === 'yearFirst')) return NaN;
  if (yearIsFirst) return midnight(first, second, third);
  return order === 'dayFirst' ? midnight(third, second, first) : midnight(third, first, second);
}

/** The time label of a line; null where its cells hold none. */
export function readLabel(
  cells: readonly string[],
  layout: TimeLayout,
  order: TableDateOrder,
): TimeLabel | null {
  if (layout.kind === 'parts') return readParts(cells, layout);
  const dateText = (cells[layout.kind === 'stamp' ? layout.column : layout.date] ?? '').trim();
  const date = splitDate(dateText);
  if (date === null) return null;
  const dayMs = dateMs(date, order);
  if (Number.isNaN(dayMs)) return null;
  const timeText = layout.kind === 'stamp' ? date.rest : (cells[layout.time] ?? '').trim();
  if (layout.kind === 'dateAndTime' && date.rest !== '' && !/^0{1,2}:?00/.test(date.rest)) return null;
  // A date alone is its midnight: spreadsheets write it so.
  const time =
    layout.kind === 'stamp' && timeText === ''
      ? { minutes: 0, offsetMinutes: null }
      : readTimeOfDay(timeText);
  if (time === null) return null;
  return {
    ms: dayMs + (time.minutes - (time.offsetMinutes ?? 0)) * 60_000,
    statesOffset: time.offsetMinutes !== null,
  };
}

function readParts(
  cells: readonly string[],
  layout: Extract<TimeLayout, { kind: 'parts' }>,
): TimeLabel | null {
  const whole = (at: number) => {
    const text = (cells[at] ?? '').trim();
    return /^\d{1,4}(?:[.,]0*)?$/.test(text) ? parseInt(text, 10) : NaN;
  };
  const dayMs = midnight(whole(layout.year), whole(layout.month), whole(layout.day));
  const hour = whole(layout.hour);
  const minute = layout.minute < 0 ? 0 : whole(layout.minute);
  if (!(hour <= 24 && minute <= 59) || (hour === 24 && minute > 0) || Number.isNaN(dayMs)) return null;
  return { ms: dayMs + (hour * 60 + minute) * 60_000, statesOffset: false };
}

/** Collects what decides between day first and month first. */
export class DateOrderEvidence {
  private yearFirst = false;
  private highestFirst = 0;
  private highestSecond = 0;

  see(cell: string): void {
    const date = splitDate(cell.trim());
    if (date === null) return;
    if (date.yearIsFirst) {
      this.yearFirst = true;
      return;
    }
    this.highestFirst = Math.max(this.highestFirst, date.first);
    this.highestSecond = Math.max(this.highestSecond, date.second);
  }

  /** Null while both orders are possible, or neither is. */
  get order(): TableDateOrder | null {
    if (this.yearFirst) return 'yearFirst';
    if (this.highestFirst > 12 && this.highestSecond <= 12) return 'dayFirst';
    if (this.highestSecond > 12 && this.highestFirst <= 12) return 'monthFirst';
    return null;
  }
}

/** "2018-01-01 00:00" */
export function labelText(ms: number): string {
  return new Date(ms).toISOString().slice(0, 16).replace('T', ' ');
}
