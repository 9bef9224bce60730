import { DomainError, requireRange } from '../errors.js';

/** A day that comes every year. */
export interface MonthDay {
  /** 1 January … 12 December. */
  readonly month: number;
  /** 1 … 31; 29 February counts only in the years that have it. */
  readonly day: number;
}

/** A scheduled outage, both days included. One that ends before it begins goes on over the new year. */
export interface Outage {
  readonly from: MonthDay;
  readonly to: MonthDay;
}

/** Most days that each month can have. */
const LONGEST_MONTH_DAYS = [31, 29, 31, 30, 31, 30, 31, 31, 30, 31, 30, 31] as const;

/**
 * Which records of a weather year fall into a scheduled outage.
 *
 * Days are compared by month and day, so that a leap year moves none of them, and a typical year with months of
 * several calendar years has each day once. A record belongs to the day on which it starts.
 *
 * @param outages - may overlap; a day in two of them is out once
 * @param startLocalMs - start of each record, local standard time written as if it were UTC [ms]
 * @returns 1 for a record inside an outage, else 0
 * @throws DomainError for a month or day that does not exist
 */
export function outageRecords(outages: readonly Outage[], startLocalMs: Float64Array): Uint8Array {
  const ranges = outages.map(({ from, to }) => [dayKey(from), dayKey(to)] as const);
  const out = new Uint8Array(startLocalMs.length);
  if (ranges.length === 0) return out;
  for (let record = 0; record < out.length; record++) {
    const date = new Date(startLocalMs[record]!);
    const day = keyOf(date.getUTCMonth() + 1, date.getUTCDate());
    const isOut = ranges.some(([from, to]) =>
      from <= to ? day >= from && day <= to : day >= from || day <= to,
    );
    out[record] = isOut ? 1 : 0;
  }
  return out;
}

function dayKey({ month, day }: MonthDay): number {
  requireRange('month of an outage', month, 1, 12);
  if (!Number.isInteger(month)) throw new DomainError('month of an outage', month, 'whole numbers');
  requireRange(`day of an outage in month ${month}`, day, 1, LONGEST_MONTH_DAYS[month - 1]!);
  if (!Number.isInteger(day)) throw new DomainError('day of an outage', day, 'whole numbers');
  return keyOf(month, day);
}

function keyOf(month: number, day: number): number {
  return month * 32 + day;
}
