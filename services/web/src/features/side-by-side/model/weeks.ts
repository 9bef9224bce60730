/** One entry a weather record, as it comes off the wire. */
export type Column = Float64Array | Float32Array;

/** A day of the calendar, "06-21": typical years join months of different years, so the year says nothing. */
export type CalendarDay = `${number}-${number}`;

export const DAYS_SHOWN = 7;
const DAY_MS = 86_400_000;

export interface Week {
  readonly from: CalendarDay;
  /** Last day shown. */
  readonly to: CalendarDay;
  /** First record, and the one behind the last. */
  readonly start: number;
  readonly end: number;
}

/** Record at which each day of the year begins; the one behind the last record closes the list. */
export function dayStarts(startLocalMs: Column): Int32Array {
  const starts: number[] = [];
  let day = NaN;
  for (let record = 0; record < startLocalMs.length; record++) {
    const recordDay = Math.floor(startLocalMs[record]! / DAY_MS);
    if (recordDay !== day) starts.push(record);
    day = recordDay;
  }
  return Int32Array.from([...starts, startLocalMs.length]);
}

/** The week that begins on a day, moved back where the year would end before it is over. Null for an empty year. */
export function weekFrom(startLocalMs: Column, day: CalendarDay): Week | null {
  const starts = dayStarts(startLocalMs);
  const days = starts.length - 1;
  if (days < 1) return null;
  let first = days - 1;
  // The first day that is not before the one asked for: a 29 February that the year lacks becomes 1 March.
  for (let index = 0; index < days; index++) {
    if (calendarDay(startLocalMs[starts[index]!]!) >= day) {
      first = index;
      break;
    }
  }
  return weekAt(startLocalMs, starts, first);
}

/** First days that a week can be asked for: every day of the year. */
export function daysOf(startLocalMs: Column): CalendarDay[] {
  return Array.from(dayStarts(startLocalMs).subarray(0, -1), (record) => calendarDay(startLocalMs[record]!));
}

/** The week so many days after (or before) another, held inside the year. */
export function weekBeside(startLocalMs: Column, week: Week, days: number): Week {
  const starts = dayStarts(startLocalMs);
  return weekAt(startLocalMs, starts, starts.indexOf(week.start) + days) ?? week;
}

/** The seven days in a row with the most of a channel: the page opens there when the address names no week. */
export function fullestWeek(startLocalMs: Column, channel: Column): Week | null {
  const starts = dayStarts(startLocalMs);
  let best = 0;
  let most = -Infinity;
  for (let day = 0; day + DAYS_SHOWN < starts.length; day++) {
    let total = 0;
    for (let record = starts[day]!; record < starts[day + DAYS_SHOWN]!; record++) total += channel[record]!;
    if (total > most) {
      most = total;
      best = day;
    }
  }
  return weekAt(startLocalMs, starts, best);
}

/** A view of the week's entries: nothing is copied. */
export function weekOf(column: Column, week: Week): Column {
  return column.subarray(week.start, week.end);
}

export function calendarDay(localMs: number): CalendarDay {
  return new Date(localMs).toISOString().slice(5, 10) as CalendarDay;
}

function weekAt(startLocalMs: Column, starts: Int32Array, day: number): Week | null {
  const days = starts.length - 1;
  if (days < 1) return null;
  const first = Math.max(0, Math.min(day, days - DAYS_SHOWN));
  const last = Math.min(days, first + DAYS_SHOWN);
  return {
    from: calendarDay(startLocalMs[starts[first]!]!),
    to: calendarDay(startLocalMs[starts[last]! - 1]!),
    start: starts[first]!,
    end: starts[last]!,
  };
}
