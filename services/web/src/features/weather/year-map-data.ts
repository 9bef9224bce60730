const DAY_HOURS = 24;
const DAY_MS = 86_400_000;

/** A year as a grid: one row an hour of the day, one column a day, in the order of the file. */
export interface YearMap {
  /** 24 rows of one value a day; NaN where the file has no record. */
  readonly rows: readonly Float64Array[];
  /** Local time of the first record of each day, for labels [ms]. */
  readonly dayMs: Float64Array;
  /** First day of each month and the month, 0 … 11, in the order of the file. */
  readonly monthStarts: readonly { readonly day: number; readonly month: number }[];
  /** Means by hour of the day (rows) and month (columns). */
  readonly hourByMonth: readonly Float64Array[];
}

/**
 * Lays a channel out by day and hour; shorter intervals are averaged to hours. Months of a typical year
 * come from different calendar years, so days are counted where the date changes, not by the calendar.
 *
 * @param startLocalMs starts of the records, local standard time as if UTC [ms]
 * @param values one a record
 */
export function layOutYear(startLocalMs: ArrayLike<number>, values: ArrayLike<number>): YearMap {
  const dayOf = new Int32Array(startLocalMs.length);
  const dayStarts: number[] = [];
  let lastDate = Number.NaN;
  for (let at = 0; at < startLocalMs.length; at += 1) {
    const date = Math.floor(startLocalMs[at]! / DAY_MS);
    if (date !== lastDate) dayStarts.push(startLocalMs[at]!);
    lastDate = date;
    dayOf[at] = dayStarts.length - 1;
  }
  const days = dayStarts.length;
  const sums = grid(DAY_HOURS, days);
  const counts = grid(DAY_HOURS, days);
  const monthSums = grid(DAY_HOURS, 12);
  const monthCounts = grid(DAY_HOURS, 12);
  for (let at = 0; at < startLocalMs.length; at += 1) {
    const start = startLocalMs[at]!;
    const date = new Date(start);
    const hour = date.getUTCHours();
    const month = date.getUTCMonth();
    sums[hour]![dayOf[at]!]! += values[at]!;
    counts[hour]![dayOf[at]!]! += 1;
    monthSums[hour]![month]! += values[at]!;
    monthCounts[hour]![month]! += 1;
  }
  const monthStarts: { day: number; month: number }[] = [];
  dayStarts.forEach((start, day) => {
    const month = new Date(start).getUTCMonth();
    if (monthStarts.at(-1)?.month !== month) monthStarts.push({ day, month });
  });
  return {
    rows: divide(sums, counts),
    dayMs: Float64Array.from(dayStarts),
    monthStarts,
    hourByMonth: divide(monthSums, monthCounts),
  };
}

function grid(rows: number, columns: number): Float64Array[] {
  return Array.from({ length: rows }, () => new Float64Array(columns));
}

/** 0 / 0 gives NaN, which charts leave blank. */
function divide(sums: readonly Float64Array[], counts: readonly Float64Array[]): Float64Array[] {
  return sums.map((row, at) => row.map((sum, column) => sum / counts[at]![column]!));
}
