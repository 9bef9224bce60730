import type { RecordCalendar } from './calendar.js';
import { DomainError } from './errors.js';

/** Weights by hour of day, a weekend factor and month factors. */
export interface Schedule {
  /** 24 weights, hours 0–1 … 23–24 of local standard time; only ratios count. */
  readonly hourlyWeights: readonly number[];
  /** Saturday and Sunday against a working day. */
  readonly weekendFactor: number;
  /** 12 factors, January first. */
  readonly monthFactors: readonly number[];
}

/**
 * Share of a working day's use that falls in one hour around each record [1/h]: the 24 hours of a working day
 * in a month of factor 1 sum to 1.
 *
 * @throws DomainError when the lists have the wrong length or no hour has a weight
 */
export function hourlyShares(schedule: Schedule, calendar: RecordCalendar): Float64Array {
  const { hourlyWeights, weekendFactor, monthFactors } = schedule;
  const total = hourlyWeights.reduce((sum, weight) => sum + weight, 0);
  if (hourlyWeights.length !== 24 || !(total > 0)) {
    throw new DomainError('hourly weights', hourlyWeights.join(' '), '24 weights, at least one above 0');
  }
  if (monthFactors.length !== 12)
    throw new DomainError('month factors', monthFactors.join(' '), '12 factors');
  return Float64Array.from(calendar.month, (month, record) => {
    const daily = monthFactors[month]! * (calendar.weekend[record] === 1 ? weekendFactor : 1);
    return (daily * hourlyWeights[calendar.hour[record]!]!) / total;
  });
}
