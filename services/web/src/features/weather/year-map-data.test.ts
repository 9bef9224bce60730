import { expect, it } from 'vitest';
import { layOutYear } from './year-map-data.js';

const HOUR = 3_600_000;

it('keeps each hour in its row and each date in its column, across months of different years', () => {
  // 30 and 31 January 2003, then 1 February 1998, as typical years are joined.
  const starts = [Date.UTC(2003, 0, 30), Date.UTC(2003, 0, 31), Date.UTC(1998, 1, 1)].flatMap((day) =>
    Array.from({ length: 24 }, (_, hour) => day + hour * HOUR),
  );
  const values = starts.map((_, at) => at);
  const map = layOutYear(starts, values);
  expect(map.rows).toHaveLength(24);
  expect(Array.from(map.rows[5]!)).toEqual([5, 29, 53]);
  expect(map.monthStarts).toEqual([
    { day: 0, month: 0 },
    { day: 2, month: 1 },
  ]);
  expect(map.hourByMonth[5]![0]).toBe(17);
  expect(map.hourByMonth[5]![1]).toBe(53);
  expect(map.hourByMonth[5]![2]).toBeNaN();
});

it('averages half hours and leaves missing hours blank', () => {
  const day = Date.UTC(2001, 5, 1);
  const map = layOutYear([day, day + HOUR / 2, day + 2 * HOUR], [100, 300, 50]);
  expect(map.rows[0]![0]).toBe(200);
  expect(map.rows[1]![0]).toBeNaN();
  expect(map.rows[2]![0]).toBe(50);
});

it('takes times before 1970', () => {
  const map = layOutYear([Date.UTC(1961, 0, 1, 23), Date.UTC(1961, 0, 2, 0)], [7, 8]);
  expect(map.rows[23]![0]).toBe(7);
  expect(map.rows[0]![1]).toBe(8);
});
