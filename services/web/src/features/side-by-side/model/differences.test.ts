import { describe, expect, it } from 'vitest';
import { differences, equalWithinRounding } from './differences.js';
import { FIGURES, type FigureKey } from './figures.js';
import { summaryFixture } from './fixtures.js';

function differenceOf(key: FigureKey, baseline: number | null, other: number | null) {
  const rows = differences(
    summaryFixture({ summary: { [key]: baseline } }),
    summaryFixture({ summary: { [key]: other } }),
  );
  const row = rows.find(({ figure }) => figure.key === key);
  if (!row) throw new Error(`no row ${key}`);
  return row;
}

describe('differences', () => {
  it('has a name and a unit for every figure, taken from the schema', () => {
    expect(FIGURES.filter(({ label, unit }) => label === '' || unit === '')).toEqual([]);
    expect(FIGURES.find(({ key }) => key === 'solarFraction')?.label).toBe('Solar fraction');
    expect(FIGURES.find(({ key }) => key === 'cellMaxC')).toMatchObject({
      label: 'Hottest cell',
      unit: '°C',
    });
  });

  it('is other minus baseline, also as a share of the baseline', () => {
    expect(differenceOf('heatDeliveredKwh', 10_000, 6400)).toMatchObject({
      absolute: -3600,
      ratio: -0.36,
      verdict: 'worse',
    });
  });

  it('knows that less of some figures is better', () => {
    expect(differenceOf('backupHeatKwh', 5000, 8600).verdict).toBe('worse');
    expect(differenceOf('boilerFuelKwh', 5000, 4000).verdict).toBe('better');
    expect(differenceOf('powerAcKwh', 0, 1850).verdict).toBe('better');
  });

  it('judges a temperature neither way', () => {
    expect(differenceOf('faceMaxC', 300, 480).verdict).toBe('higher');
    expect(differenceOf('faceMaxC', 480, 300)).toMatchObject({ verdict: 'lower', ratio: null });
  });

  it('gives no share of nothing and no difference to what is missing', () => {
    expect(differenceOf('powerAcKwh', 0, 1850).ratio).toBeNull();
    expect(differenceOf('cellMaxC', null, 96)).toMatchObject({
      absolute: null,
      ratio: null,
      verdict: 'unknown',
    });
  });

  it('calls equal what a run cannot tell apart', () => {
    expect(differenceOf('heatDeliveredKwh', 10_000, 10_000.9).verdict).toBe('equal');
    expect(differenceOf('heatDeliveredKwh', 10_000, 10_001.1).verdict).toBe('better');
    expect(equalWithinRounding(0, 0.4, 'kWh')).toBe(true);
    expect(equalWithinRounding(0.62, 0.6205, '1')).toBe(false);
  });
});
