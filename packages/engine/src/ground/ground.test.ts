import { describe, expect, it } from 'vitest';
import { documentedExamples, evaluateExample } from '../../validation/documented-examples.js';
import { madeWeather } from '../../validation/simulate/made-weather.js';
import { DomainError } from '../errors.js';
import { groundTemperatureC } from './kusuda-achenbach.js';
import { dayAtMiddle, surfaceWave } from './surface-wave.js';

const HOUR_MS = 3_600_000;

describe('groundTemperatureC', () => {
  it.each(documentedExamples(new URL('.', import.meta.url)))('$file: $expression', (example) => {
    const value = evaluateExample(example, { groundTemperatureC });
    expect(Math.abs(value - example.promised)).toBeLessThanOrEqual(example.halfUnit);
  });

  it.each([
    ['mean', { meanC: NaN, amplitudeK: 1, coldestDay: 1 }, 1, 1e-6, 1],
    ['amplitude', { meanC: 1, amplitudeK: -1, coldestDay: 1 }, 1, 1e-6, 1],
    ['coldest day', { meanC: 1, amplitudeK: 1, coldestDay: 400 }, 1, 1e-6, 1],
    ['depth', { meanC: 1, amplitudeK: 1, coldestDay: 1 }, -1, 1e-6, 1],
    ['diffusivity', { meanC: 1, amplitudeK: 1, coldestDay: 1 }, 1, 0, 1],
    ['day of the year', { meanC: 1, amplitudeK: 1, coldestDay: 1 }, 1, 1e-6, 400],
  ])('refuses a bad %s by name', (words, wave, depthM, diffusivityM2S, day) => {
    const call = () => groundTemperatureC(wave, depthM, diffusivityM2S, day);
    expect(call).toThrow(DomainError);
    expect(call).toThrow(words);
  });
});

describe('surfaceWave', () => {
  const hourly = (airC: (day: number) => number, records = 8760, calendarYear = 2021) => {
    const startLocalMs = Float64Array.from(
      { length: records },
      (_, hour) => Date.UTC(calendarYear, 0, 1) + hour * HOUR_MS,
    );
    const dryBulbC = startLocalMs.map((ms) => airC(dayAtMiddle(ms, 60)));
    return { dryBulbC, startLocalMs, intervalMinutes: 60 };
  };

  it('finds mean, amplitude and coldest day of a wave, through the swing of its days', () => {
    const wave = surfaceWave(
      hourly((day) => 12 - 9 * Math.cos((2 * Math.PI * (day - 25)) / 365) + 6 * Math.sin(2 * Math.PI * day)),
    );
    expect(wave.meanC).toBeCloseTo(12, 9);
    expect(wave.amplitudeK).toBeCloseTo(9, 9);
    expect(wave.coldestDay).toBeCloseTo(25, 6);
  });

  it('is coldest in the middle of the year in the south', () => {
    expect(surfaceWave(madeWeather({ latitudeDeg: -35 })).coldestDay).toBeGreaterThan(170);
    expect(surfaceWave(madeWeather({ latitudeDeg: -35 })).coldestDay).toBeLessThan(195);
  });

  it('takes months of several years by their place in the year, as typical years join them', () => {
    const year = hourly((day) => 12 - 9 * Math.cos((2 * Math.PI * (day - 25)) / 365));
    const joined = year.startLocalMs.map((ms) =>
      new Date(ms).getUTCMonth() < 6 ? ms - 4 * 365 * 24 * HOUR_MS - 24 * HOUR_MS : ms,
    );
    expect(new Date(joined[0]!).toISOString()).toBe('2017-01-01T00:00:00.000Z');
    expect(surfaceWave({ ...year, startLocalMs: joined })).toEqual(surfaceWave(year));
  });

  it('stands still at the mean where months are missing', () => {
    const wave = surfaceWave(hourly((day) => day, 31 * 24));
    expect(wave.amplitudeK).toBe(0);
    expect(wave.meanC).toBeCloseTo(16.5, 9);
  });

  it('refuses a year without records', () => {
    expect(() => surfaceWave(hourly(() => 1, 0))).toThrow('records of the weather year');
  });
});
