import { describe, expect, it } from 'vitest';
import { outageRecords, type MonthDay } from './outage.js';

const HOUR_MS = 3_600_000;
const year = (calendarYear: number, days: number): Float64Array =>
  Float64Array.from({ length: days * 24 }, (_, hour) => Date.UTC(calendarYear, 0, 1) + hour * HOUR_MS);
const on = (month: number, day: number): MonthDay => ({ month, day });
const hoursOut = (records: Uint8Array): number => records.reduce((sum, out) => sum + out, 0);

describe('outageRecords', () => {
  it('counts both days of a range, hour by hour', () => {
    const out = outageRecords([{ from: on(3, 1), to: on(3, 2) }], year(2021, 365));
    expect(hoursOut(out)).toBe(48);
    expect([out[59 * 24 - 1], out[59 * 24], out[61 * 24 - 1], out[61 * 24]]).toEqual([0, 1, 1, 0]);
  });

  it('goes on over the new year where it ends before it begins', () => {
    const out = outageRecords([{ from: on(12, 30), to: on(1, 3) }], year(2021, 365));
    expect(hoursOut(out)).toBe(5 * 24);
    expect([out[0], out[3 * 24], out[364 * 24]]).toEqual([1, 0, 1]);
  });

  it('has 29 February only in the years that have it', () => {
    const outages = [{ from: on(2, 29), to: on(2, 29) }];
    expect(hoursOut(outageRecords(outages, year(2021, 365)))).toBe(0);
    expect(hoursOut(outageRecords(outages, year(2020, 366)))).toBe(24);
    const across = [{ from: on(2, 28), to: on(3, 1) }];
    expect(hoursOut(outageRecords(across, year(2021, 365)))).toBe(48);
    expect(hoursOut(outageRecords(across, year(2020, 366)))).toBe(72);
  });

  it('counts a day once where ranges overlap, and none without a range', () => {
    const twice = [
      { from: on(5, 1), to: on(5, 10) },
      { from: on(5, 5), to: on(5, 12) },
    ];
    expect(hoursOut(outageRecords(twice, year(2021, 365)))).toBe(12 * 24);
    expect(hoursOut(outageRecords([], year(2021, 365)))).toBe(0);
  });

  it.each([
    ['month', on(13, 1)],
    ['month', on(0, 1)],
    ['month', on(1.5, 1)],
    ['day of an outage in month 2', on(2, 30)],
    ['day', on(4, 31)],
    ['day', on(1, 0)],
    ['day', on(1, 1.5)],
  ])('refuses a %s that does not exist: %o', (words, bad) => {
    expect(() => outageRecords([{ from: bad, to: on(12, 31) }], year(2021, 1))).toThrow(words);
    expect(() => outageRecords([{ from: on(1, 1), to: bad }], year(2021, 1))).toThrow(words);
  });
});
