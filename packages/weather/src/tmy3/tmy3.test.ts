import { WEATHER_FLAG } from '@noonwell/engine';
import { syntheticYear, tmy3Column, tmy3File, tmy3LineOfRow, type RowDefect } from '@noonwell/testkit';
import { describe, expect, it } from 'vitest';
import { readWeatherFile, type WeatherAccepted, type WeatherReadResult } from '../index.js';

const year = syntheticYear();

function accepted(result: WeatherReadResult): WeatherAccepted {
  if (result.kind === 'refused') throw new Error(JSON.stringify(result.problems));
  return result;
}
const read = (...defects: RowDefect[]) => readWeatherFile(tmy3File(year, { defects }), 'station.csv');

describe('a sound TMY3 table', () => {
  it.each([68, 71] as const)('of %d columns is read by their names', (columns) => {
    const result = accepted(
      readWeatherFile(tmy3File(year, { columns, name: 'A field, by the sea' }), 'x.csv'),
    );
    expect(result.format).toBe('tmy3');
    expect(result.header).toMatchObject({ placeName: 'A field, by the sea, TF', wmo: '000000' });
    expect(result.year.startLocalMs).toEqual(year.startLocalMs);
    expect(result.year.dniWm2).toEqual(year.dniWm2);
    expect(result.year.dryBulbC).toEqual(year.dryBulbC);
    expect(result.year.pressurePa[5000]).toBeCloseTo(100 * Math.round(year.pressurePa[5000]! / 100), 6);
    expect(result.sunOffsetMinutes).toBe(-30);
    expect(result.statement).toBeNull();
    expect(result.warnings).toEqual(['The year begins on a Monday, as 1 January 2018 did.']);
  });

  it('keeps the calendar year of each month, the last hour of each included, with 28 February of a leap year', () => {
    const yearOfMonth = [1988, 1980, 2001, 1999, 1980, 1995, 2004, 2000, 1987, 2003, 1976, 1992];
    const { startLocalMs } = accepted(readWeatherFile(tmy3File(year, { yearOfMonth }), 'x.csv')).year;
    expect(startLocalMs).toHaveLength(8760);
    const start = (record: number) => new Date(startLocalMs[record]!).toISOString().slice(0, 13);
    expect([start(0), start(743), start(744)]).toEqual(['1988-01-01T00', '1988-01-31T23', '1980-02-01T00']);
    expect([start(59 * 24 - 1), start(59 * 24)]).toEqual(['1980-02-28T23', '2001-03-01T00']);
    expect(start(8759)).toBe('1992-12-31T23');
  });

  it('is read with CRLF and in Latin-1', () => {
    const bytes = tmy3File(year, { lineEnd: 'crlf', encoding: 'latin1', name: 'Zürich' });
    expect(accepted(readWeatherFile(bytes, 'x.csv')).header.city).toBe('Zürich');
  });
});

describe('a damaged TMY3 table', () => {
  const row = 4000;
  it('has missing marks and absent rows filled, and doubles read once, each said with its line', () => {
    const { year: mended, warnings } = accepted(
      read(
        { kind: 'cell', row, column: tmy3Column('GHI (W/m^2)'), text: '-9900' },
        { kind: 'cell', row, column: tmy3Column('Dry-bulb (C)'), text: '-9900' },
        { kind: 'rowDuplicated', row: 5000 },
        { kind: 'rowMissing', row: 100 },
      ),
    );
    expect(mended.flags[row]).toBe(WEATHER_FLAG.filledDryBulb | WEATHER_FLAG.filledIrradiance);
    expect(mended.startLocalMs).toEqual(year.startLocalMs);
    expect(warnings).toContainEqual(
      expect.stringMatching(/1 record is missing and was filled, after line 102\./),
    );
    // The double stands one line higher, because a row before it is absent.
    expect(warnings).toContainEqual(expect.stringMatching(`read once: line ${tmy3LineOfRow(5000)}\\.`));
  });

  it.each<[string, RowDefect, number, RegExp]>([
    ['4 absent rows', { kind: 'rowMissing', row, count: 4 }, tmy3LineOfRow(row), /4 records are missing/],
    [
      'missing for 4 h',
      { kind: 'cell', row, count: 4, column: tmy3Column('DNI (W/m^2)'), text: '-9900' },
      tmy3LineOfRow(row),
      /missing for 4 hours/,
    ],
    ['cut off', { kind: 'truncated', row, characters: 60 }, tmy3LineOfRow(row), /cut off/],
    [
      'a word',
      { kind: 'cell', row, column: tmy3Column('DNI (W/m^2)'), text: 'sunny' },
      tmy3LineOfRow(row),
      /"sunny" is not a number/,
    ],
  ])('is refused with its line: %s', (_, defect, line, reason) => {
    const result = read(defect);
    if (result.kind === 'accepted') throw new Error('accepted');
    expect(result.format).toBe('tmy3');
    expect(result.problems[0]!.line).toBe(line);
    expect(result.problems[0]!.reason).toMatch(reason);
  });

  it('is refused where the station cannot be read, each number by name', () => {
    const result = readWeatherFile(tmy3File(year, { stationLine: '1,Field,TF,-5.0,north,,273' }), 'x.csv');
    expect(result).toMatchObject({
      kind: 'refused',
      problems: [
        { line: 1, column: 5, columnName: 'latitude', value: 'north' },
        { line: 1, column: 6, columnName: 'longitude' },
      ],
    });
  });

  it('is refused where a heading is gone', () => {
    const text = new TextDecoder().decode(tmy3File(year)).replace('DNI (W/m^2)', 'Beam');
    expect(readWeatherFile(new TextEncoder().encode(text), 'x.csv')).toMatchObject({
      kind: 'refused',
      problems: [{ line: 2, reason: 'No heading names DNI with its unit.' }],
    });
  });
});
