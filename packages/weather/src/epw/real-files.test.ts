import { existsSync, readFileSync } from 'node:fs';
import { join } from 'node:path';
import { describe, expect, it } from 'vitest';
import { readWeatherFile } from '../index.js';

/** Folder of open weather files that are no part of the product; extra cases where it exists. */
const folder = process.env['NOONWELL_WEATHER_DIR'] ?? '';
const present = folder !== '' && existsSync(folder);
if (!present) console.log('skipped: real EPW files (set NOONWELL_WEATHER_DIR to the folder that holds them)');

/** Yearly sums [kWh/m²], dry-bulb [°C]. Source: the table that came with the files, found by another program. */
const FILES = [
  {
    file: 'USA_CA_Barstow.Daggett.AP.723815_TMY3.epw',
    sums: [2724, 2090, 469],
    dryBulb: [-5.0, 46.7, 19.7],
    place: [34.85, -116.8, -8, 586],
  },
  {
    file: 'USA_WA_Quillayute.State.AP.727970_TMY3.epw',
    sums: [968, 1100, 572],
    dryBulb: [-4.4, 32.8, 9.6],
    place: [47.93, -124.57, -8, 55],
  },
  {
    file: 'USA_MN_International.Falls.Intl.AP.727470_TMY3.epw',
    sums: [1318, 1261, 581],
    dryBulb: [-35.6, 35.0, 3.4],
    place: [48.57, -93.4, -6, 359],
  },
] as const;

describe.skipIf(!present)('real EPW files', () => {
  it.each(FILES)('$file', ({ file, sums, dryBulb, place }) => {
    const result = readWeatherFile(readFileSync(join(folder, file)), file);
    if (result.kind === 'refused') throw new Error(JSON.stringify(result.problems));
    const { summary, year } = result;
    [summary.dniKwhM2, summary.ghiKwhM2, summary.dhiKwhM2].forEach((sum, at) => {
      expect(Math.abs(sum / sums[at]! - 1)).toBeLessThan(0.001);
    });
    expect([summary.dryBulbMinC, summary.dryBulbMaxC]).toEqual([dryBulb[0], dryBulb[1]]);
    expect(Math.abs(summary.dryBulbMeanC - dryBulb[2])).toBeLessThanOrEqual(0.05);
    expect([year.latitudeDeg, year.longitudeDeg, year.utcOffsetHours, year.altitudeM]).toEqual(place);
    expect(year.firstWeekday).toBe(6);
    expect(result.sunOffsetMinutes).toBe(-30);
    expect(result.warnings).toEqual([]);
  });
});
