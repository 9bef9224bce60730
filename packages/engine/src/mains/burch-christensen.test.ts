import { describe, expect, it } from 'vitest';
import { documentedExamples, evaluateExample } from '../../validation/documented-examples.js';
import { DomainError } from '../errors.js';
import type { WeatherYear } from '../weather-year.js';
import { airClimate, burchChristensenMainsC, createMains, type AirClimate } from './burch-christensen.js';

const HOUR_MS = 3_600_000;
const mild: AirClimate = { meanC: 10, monthlySpreadK: 20, southern: false };

/** Hourly year whose air has one temperature in each month. */
function yearOf(monthlyC: readonly number[], latitudeDeg = 45, hours = 8760): WeatherYear {
  const startLocalMs = Float64Array.from({ length: hours }, (_, i) => Date.UTC(2023, 0, 1) + i * HOUR_MS);
  const constant = (value: number): Float64Array => new Float64Array(hours).fill(value);
  return {
    latitudeDeg,
    longitudeDeg: 0,
    altitudeM: 100,
    utcOffsetHours: 0,
    intervalMinutes: 60,
    firstWeekday: 6,
    startLocalMs,
    dniWm2: constant(0),
    ghiWm2: constant(0),
    dhiWm2: constant(0),
    dryBulbC: startLocalMs.map((ms) => monthlyC[new Date(ms).getUTCMonth()]!),
    windMs: constant(2),
    relativeHumidityPct: constant(50),
    pressurePa: constant(101325),
    flags: new Uint16Array(hours),
  };
}

describe('burchChristensenMainsC', () => {
  it.each(documentedExamples(new URL('.', import.meta.url)))('$file: $expression', (example) => {
    const value = evaluateExample(example, { burchChristensenMainsC });
    expect(Math.abs(value - example.promised)).toBeLessThanOrEqual(example.halfUnit);
  });

  it('comes late after the coldest and warmest air, and less far', () => {
    const days = Array.from({ length: 365 }, (_, i) => burchChristensenMainsC(mild, i + 1));
    const coldest = days.indexOf(Math.min(...days)) + 1;
    const warmest = days.indexOf(Math.max(...days)) + 1;
    expect(coldest).toBeGreaterThan(31);
    expect(warmest).toBeGreaterThan(coldest + 175);
    expect(warmest).toBeLessThan(coldest + 190);
    expect(Math.max(...days) - Math.min(...days)).toBeLessThan(mild.monthlySpreadK);
  });

  it('is half a year later in the south', () => {
    const south = { ...mild, southern: true };
    expect(burchChristensenMainsC(south, 20)).toBeCloseTo(burchChristensenMainsC(mild, 202.5), 12);
  });

  it('never freezes', () => {
    expect(burchChristensenMainsC({ meanC: -5, monthlySpreadK: 50, southern: false }, 60)).toBe(0.5);
  });

  it.each([
    ['mean air temperature', { ...mild, meanC: Number.NaN }, 100],
    ['spread of the monthly means', { ...mild, monthlySpreadK: -1 }, 100],
    ['day of the year', mild, 0],
    ['day of the year', mild, 367],
  ])('refuses a bad %s by name', (quantity, climate, day) => {
    expect(() => burchChristensenMainsC(climate, day)).toThrow(DomainError);
    expect(() => burchChristensenMainsC(climate, day)).toThrow(quantity);
  });
});

describe('airClimate and createMains', () => {
  const monthly = [0, 2, 5, 9, 14, 18, 20, 19, 15, 10, 5, 1];

  it('take mean and spread from the records', () => {
    const climate = airClimate(yearOf(monthly));
    expect(climate.monthlySpreadK).toBeCloseTo(20, 12);
    const days = [31, 28, 31, 30, 31, 30, 31, 31, 30, 31, 30, 31];
    const mean = monthly.reduce((sum, tC, month) => sum + tC * days[month]!, 0) / 365;
    expect(climate.meanC).toBeCloseTo(mean, 12);
    expect(climate.southern).toBe(false);
  });

  it('tell each day what the relation gives, the last of a leap year too', () => {
    const weather = yearOf(monthly);
    const mains = createMains(weather);
    for (const day of [1, 45, 200, 365, 366]) {
      expect(mains(day)).toBe(burchChristensenMainsC(airClimate(weather), day));
    }
    expect(() => mains(0)).toThrow('day of the year');
    expect(() => mains(367)).toThrow('day of the year');
  });

  it('know the southern hemisphere by the latitude', () => {
    expect(createMains(yearOf(monthly, -45))(20)).toBeGreaterThan(createMains(yearOf(monthly, 45))(20));
  });

  it('refuse an empty year and a missing temperature', () => {
    expect(() => createMains(yearOf(monthly, 45, 0))).toThrow('records of the weather year');
    const holed = yearOf(monthly);
    holed.dryBulbC[5] = Number.NaN;
    expect(() => createMains(holed)).toThrow('mean air temperature');
  });
});
