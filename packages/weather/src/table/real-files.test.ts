import { existsSync, readFileSync } from 'node:fs';
import { join } from 'node:path';
import type { TableStatement } from '@noonwell/schema';
import { describe, expect, it } from 'vitest';
import { inspectTable, readTable, readWeatherFile, type WeatherReadResult } from '../index.js';

/** Folder of open weather files that are no part of the product; extra cases where it exists. */
const folder = process.env['NOONWELL_WEATHER_DIR'] ?? '';
const present = folder !== '' && existsSync(folder);
if (!present) console.log('skipped: real tables (set NOONWELL_WEATHER_DIR to the folder that holds them)');
const bytesOf = (file: string) => readFileSync(join(folder, file));

/** Yearly sums [kWh/m²], dry-bulb [°C]. Source: the table that came with the files, found by another program. */
function expectFigures(result: WeatherReadResult, sums: readonly number[], dryBulb: readonly number[]): void {
  if (result.kind === 'refused') throw new Error(JSON.stringify(result.problems));
  const { summary } = result;
  [summary.dniKwhM2, summary.ghiKwhM2, summary.dhiKwhM2].forEach((sum, at) => {
    expect(Math.abs(sum / sums[at]! - 1)).toBeLessThan(0.001);
  });
  [summary.dryBulbMinC, summary.dryBulbMaxC, summary.dryBulbMeanC].forEach((value, at) => {
    expect(Math.abs(value - dryBulb[at]!)).toBeLessThanOrEqual(0.0501);
  });
}

const ITALY: TableStatement = {
  label: 'middle',
  clock: 'utc',
  place: { latitudeDeg: 45, longitudeDeg: 8, altitudeM: 250, utcOffsetHours: 1 },
};

describe.skipIf(!present)('real tables', () => {
  it('723170TYA.CSV', () => {
    const result = readWeatherFile(bytesOf('723170TYA.CSV'), '723170TYA.CSV');
    expectFigures(result, [1476, 1566, 682], [-16.7, 35.6, 14.4]);
    expect(result).toMatchObject({
      format: 'tmy3',
      sunOffsetMinutes: -30,
      summary: { flaggedRecords: 0 },
      year: { latitudeDeg: 36.1, longitudeDeg: -79.95, altitudeM: 273, utcOffsetHours: -5 },
    });
  });

  it('the same with missing, duplicated and −9900 rows: mended, each told, sums unchanged', () => {
    const name = 'defects/723170TYA_missing_dup_sentinel';
    const truth = bytesOf(`${name}.truth.txt`).toString();
    const listed = (key: string) => {
      const list = new RegExp(`^${key}.*\\[(.*)\\]$`, 'm').exec(truth)?.[1] ?? '';
      return list.split(',').map(Number);
    };
    const [removed, sentinels, doubles] = ['removed', 'sentinel', 'duplicated'].map(listed);
    const result = readWeatherFile(bytesOf(`${name}.CSV`), 'x.csv');
    expectFigures(result, [1476, 1566, 682], [-16.7, 35.6, 14.4]);
    if (result.kind === 'refused') return;
    const flagged = Array.from(result.year.flags.entries()).flatMap(([record, flags]) =>
      flags === 0 ? [] : [record],
    );
    expect(flagged).toEqual([...removed!, ...sentinels!].sort((a, b) => a - b));
    expect(result.warnings).toContainEqual(expect.stringMatching(`^${doubles!.length} lines stand twice`));
    expect(result.warnings).toContainEqual(expect.stringMatching(`^${removed!.length} records are missing`));
  });

  it('decimal comma, semicolons, byte order mark, CRLF; units from the size of the values', () => {
    const bytes = bytesOf('defects/pvgis_decimalcomma_semicolon_bom_crlf.csv');
    const inspection = inspectTable(bytes, ITALY);
    if (inspection.kind === 'noTable') throw new Error(inspection.problem.reason);
    expect(inspection.layout).toMatchObject({ byteOrderMark: true, delimiter: ';', decimalMark: 'comma' });
    expect(inspection.missing.map(({ path }) => path)).toEqual(
      ['dniWm2', 'ghiWm2', 'dhiWm2', 'dryBulbC', 'windMs', 'relativeHumidityPct', 'pressurePa'].map(
        (channel) => `columns.${channel}.unit`,
      ),
    );
    const result = readTable(bytes, inspection.draft);
    expectFigures(result, [1592, 1436, 571], [-2.3, 34.3, 13.6]);
    expect(result).toMatchObject({ sunOffsetMinutes: 10 });
  });

  it('Latin-1 with degree signs: the headings say columns and units', () => {
    const bytes = bytesOf('defects/pvgis_latin1_degree_units.csv');
    const result = readTable(bytes, ITALY);
    expectFigures(result, [1592, 1436, 571], [-2.3, 34.3, 13.6]);
    expect(result).toMatchObject({ statement: { layout: { encoding: 'latin-1' } } });
  });

  it.each([
    ['tmy_45.000_8.000_2005_2023.csv', ITALY, [1592, 1436, 571], [-2.3, 34.3, 13.6], 10],
    [
      'test_read_psm3.csv',
      {
        label: 'middle',
        clock: 'localStandard',
        place: { latitudeDeg: 40.53, longitudeDeg: -108.54, altitudeM: 2168, utcOffsetHours: -7 },
      } satisfies TableStatement,
      [2173, 1749, 528],
      [-27.7, 35, 8.1],
      0,
    ],
  ] as const)(
    '%s as a plain table, lines before and after it passed over',
    (file, statement, sums, dryBulb, offset) => {
      const bytes = bytesOf(file);
      const inspection = inspectTable(bytes, statement);
      if (inspection.kind === 'noTable') throw new Error(inspection.problem.reason);
      const result = readTable(bytes, inspection.draft);
      expectFigures(result, sums, dryBulb);
      expect(result).toMatchObject({ sunOffsetMinutes: offset });
    },
  );
});
