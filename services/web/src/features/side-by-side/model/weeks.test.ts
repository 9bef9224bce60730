import { describe, expect, it } from 'vitest';
import { dayStarts, fullestWeek, weekBeside, weekFrom, weekOf } from './weeks.js';

const HOUR_MS = 3_600_000;

/** A year of hours whose months come from different years, as in a typical year. */
function typicalYear(intervalMinutes = 60): Float64Array {
  const records: number[] = [];
  for (let month = 0; month < 12; month++) {
    const year = 1999 + ((month * 5) % 7);
    const days = month === 1 ? 28 : new Date(Date.UTC(year, month + 1, 0)).getUTCDate();
    const start = Date.UTC(year, month, 1);
    for (let at = 0; at < days * 24 * HOUR_MS; at += intervalMinutes * 60_000) records.push(start + at);
  }
  return Float64Array.from(records);
}

const year = typicalYear();

describe('weeks of a run', () => {
  it('counts the days of a year joined from many', () => {
    expect(dayStarts(year)).toHaveLength(366);
    expect(dayStarts(typicalYear(30)).at(-1)).toBe(17_520);
  });

  it('finds a week by its first day, across the joint of two months', () => {
    expect(weekFrom(year, '06-28')).toEqual({ from: '06-28', to: '07-04', start: 178 * 24, end: 185 * 24 });
  });

  it('stays inside the year at its end', () => {
    expect(weekFrom(year, '12-30')).toMatchObject({ from: '12-25', to: '12-31', end: 8760 });
  });

  it('takes the next day for one that the year lacks', () => {
    expect(weekFrom(year, '02-29')?.from).toBe('03-01');
  });

  it('moves by weeks and stops at the ends', () => {
    const week = weekFrom(year, '01-03')!;
    expect(weekBeside(year, week, 7).from).toBe('01-10');
    expect(weekBeside(year, week, -7).from).toBe('01-01');
  });

  it('finds the seven days with the most beam', () => {
    const dni = new Float64Array(8760);
    dni.fill(900, 100 * 24, 107 * 24);
    expect(fullestWeek(year, dni)).toMatchObject({ start: 100 * 24, end: 107 * 24 });
  });

  it('cuts a view of the column, not a copy', () => {
    const column = new Float64Array(8760);
    const view = weekOf(column, weekFrom(year, '06-28')!);
    expect(view).toHaveLength(168);
    expect(view.buffer).toBe(column.buffer);
  });

  it('has no week in an empty year, and a short one in a short year', () => {
    expect(weekFrom(new Float64Array(), '01-01')).toBeNull();
    expect(weekFrom(year.subarray(0, 48), '06-01')).toMatchObject({ start: 0, end: 48 });
  });
});
