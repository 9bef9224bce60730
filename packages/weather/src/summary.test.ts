import { describe, expect, it } from 'vitest';
import { weatherSummarySchema } from '@noonwell/schema';
import { syntheticYear } from '@noonwell/testkit';
import { summariseWeather } from './index.js';

describe('summary of a weather year', () => {
  it('adds records to kWh/m² by month, with values clipped at 0', () => {
    const dniWm2 = new Float64Array(8760);
    dniWm2[0] = 500;
    dniWm2[1] = -4;
    dniWm2[8759] = 1000;
    const flags = new Uint16Array(8760);
    flags[3] = 5;
    const summary = summariseWeather({ ...syntheticYear(), dniWm2, flags });
    expect(summary.dniKwhM2).toBe(1.5);
    expect(summary.monthlyDniKwhM2[0]).toBe(0.5);
    expect(summary.monthlyDniKwhM2[11]).toBe(1);
    expect(summary.flaggedRecords).toBe(1);
  });

  it('weighs a record by its interval', () => {
    const half = { ...syntheticYear(), intervalMinutes: 30 };
    expect(summariseWeather(half).ghiKwhM2).toBeCloseTo(summariseWeather(syntheticYear()).ghiKwhM2 / 2, 9);
  });

  it('is what the schema says', () => {
    expect(weatherSummarySchema.parse(summariseWeather(syntheticYear()))).toBeDefined();
  });
});
