import { WEATHER_CHANNEL_RANGE, WEATHER_CHANNELS } from '@noonwell/engine';
import { TABLE_CLOCKS, TABLE_DELIMITERS, TABLE_LABELS } from '@noonwell/schema';
import {
  syntheticYear,
  TABLE_FILE_UNITS,
  TABLE_TIMES,
  tableColumn,
  tableFile,
  tableStatement,
  type TableFileOptions,
} from '@noonwell/testkit';
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { inspectTable, readTable, type WeatherAccepted } from '../index.js';
import { labelToMiddleMinutes } from '../label.js';

const year = syntheticYear();
/** NOONWELL_TEST_COUNT raises the number of cases, NOONWELL_TEST_SEED repeats a failure. */
const numRuns = Number(process.env['NOONWELL_TEST_COUNT'] ?? 40);
const seed = Number(process.env['NOONWELL_TEST_SEED'] ?? 20411);

function accepted(options: TableFileOptions, statement = tableStatement(year, options)): WeatherAccepted {
  const result = readTable(tableFile(year, options), statement);
  if (result.kind === 'refused') throw new Error(JSON.stringify(result.problems));
  return result;
}

function expectSameYear(result: WeatherAccepted): void {
  expect(result.year.startLocalMs).toEqual(year.startLocalMs);
  expect(result.year.firstWeekday).toBe(year.firstWeekday);
  for (const channel of WEATHER_CHANNELS) {
    const [low, high] = WEATHER_CHANNEL_RANGE[channel];
    // The writer keeps seven digits after the point; kW and MJ make at most 1e-4 W/m² of it.
    const tolerance = (high - low) * 1e-6;
    const worst = year[channel].reduce(
      (miss, value, at) => Math.max(miss, Math.abs(value - result.year[channel][at]!)),
      0,
    );
    expect(worst, channel).toBeLessThanOrEqual(tolerance);
  }
  expect(result.year.flags.every((flags) => flags === 0)).toBe(true);
}

const unitChoice = fc.record({
  dniWm2: fc.constantFrom(...TABLE_FILE_UNITS.dniWm2),
  ghiWm2: fc.constantFrom(...TABLE_FILE_UNITS.ghiWm2),
  dhiWm2: fc.constantFrom(...TABLE_FILE_UNITS.dhiWm2),
  dryBulbC: fc.constantFrom(...TABLE_FILE_UNITS.dryBulbC),
  windMs: fc.constantFrom(...TABLE_FILE_UNITS.windMs),
  relativeHumidityPct: fc.constantFrom('%' as const),
  pressurePa: fc.constantFrom(...TABLE_FILE_UNITS.pressurePa),
});

const layouts = fc
  .record({
    delimiter: fc.constantFrom(...TABLE_DELIMITERS),
    decimalMark: fc.constantFrom('point' as const, 'comma' as const),
    time: fc.constantFrom(...TABLE_TIMES),
    label: fc.constantFrom(...TABLE_LABELS),
    clock: fc.constantFrom(...TABLE_CLOCKS),
    units: unitChoice,
    unitsIn: fc.constantFrom('heading' as const, 'line' as const),
    lineEnd: fc.constantFrom('lf' as const, 'crlf' as const, 'cr' as const),
    encoding: fc.constantFrom('utf8' as const, 'utf8-bom' as const, 'latin1' as const),
    linesBefore: fc.constantFrom([], ['A station', 'somewhere, high up']),
    linesAfter: fc.constantFrom([], ['', 'Legend', 'DNI: of the sun itself']),
  })
  // A comma cannot part cells and decimals at once, nor a blank stand within a cell and between them.
  .filter(({ delimiter, decimalMark }) => delimiter !== ',' || decimalMark === 'point')
  .map((options): TableFileOptions =>
    options.delimiter === 'space' ? { ...options, time: 'isoT', unitsIn: 'heading' } : options,
  );

describe('a table in any layout', () => {
  it('is found, and read back as the year it was written from, at the place of the sun that was stated', () => {
    fc.assert(
      fc.property(layouts, (options) => {
        const result = accepted(options);
        expectSameYear(result);
        expect(result.sunOffsetMinutes).toBe(labelToMiddleMinutes(options.label ?? 'end', 60));
        expect(result.warnings.filter((warning) => /fits the sun/.test(warning))).toEqual([]);
      }),
      { numRuns, seed },
    );
  }, 600_000);

  it('says what it found, from the file alone', () => {
    const inspection = inspectTable(
      tableFile(year, {
        delimiter: ';',
        decimalMark: 'comma',
        time: 'dayFirst',
        encoding: 'utf8-bom',
        lineEnd: 'crlf',
        units: { pressurePa: 'hPa', dryBulbC: 'K' },
        linesBefore: ['Field station'],
      }),
    );
    expect(inspection).toMatchObject({
      kind: 'table',
      layout: {
        encoding: 'utf-8',
        byteOrderMark: true,
        delimiter: ';',
        decimalMark: 'comma',
        headingLine: 2,
        firstDataLine: 3,
      },
      time: {
        kind: 'stamp',
        columns: [1],
        dateOrder: 'dayFirst',
        intervalMinutes: 60,
        firstLabel: '2018-01-01 01:00',
      },
      guesses: {
        dniWm2: { column: tableColumn('dniWm2'), unit: 'W/m²', unitFrom: 'heading' },
        dryBulbC: { column: tableColumn('dryBulbC'), unit: 'K', unitFrom: 'heading' },
        pressurePa: { column: tableColumn('pressurePa'), unit: 'hPa', unitFrom: 'heading' },
      },
    });
  });

  it('guesses units from the size of the values, and only proposes them', () => {
    const options: TableFileOptions = {
      unitsIn: 'nowhere',
      units: { dryBulbC: 'K', relativeHumidityPct: '1', pressurePa: 'hPa', ghiWm2: 'kW/m²' },
    };
    const bytes = tableFile(year, options);
    const inspection = inspectTable(bytes);
    if (inspection.kind === 'noTable') throw new Error(inspection.problem.reason);
    expect(inspection.draft.columns).toMatchObject({
      dniWm2: { unit: 'W/m²' },
      ghiWm2: { unit: 'kW/m²' },
      dryBulbC: { unit: 'K' },
      relativeHumidityPct: { unit: '1' },
      pressurePa: { unit: 'hPa' },
    });
    expect(readTable(bytes, tableStatement(year))).toMatchObject({ kind: 'refused', problemCount: 7 });
    const result = readTable(bytes, { ...inspection.draft, ...tableStatement(year) });
    if (result.kind === 'refused') throw new Error(JSON.stringify(result.problems));
    expectSameYear(result);
  });

  it('takes labels with an offset from UTC as the moments they name, and only with the clock stated as UTC', () => {
    const bytes = tableFile(year, { time: 'isoUtcOffset' });
    const result = readTable(bytes, { ...tableStatement(year), clock: 'utc' });
    if (result.kind === 'refused') throw new Error(JSON.stringify(result.problems));
    expectSameYear(result);
    expect(readTable(bytes, tableStatement(year))).toMatchObject({
      kind: 'refused',
      problems: [{ line: 2, reason: expect.stringContaining('offset from UTC') as string }],
    });
  });

  it('gives back the statement as it was applied, which reads the same year again', () => {
    const options: TableFileOptions = { time: 'us', delimiter: 'tab' };
    const bytes = tableFile(year, options);
    const { statement, year: first } = accepted(options);
    expect(statement?.layout).toEqual({
      encoding: 'utf-8',
      delimiter: 'tab',
      decimalMark: 'point',
      dateOrder: 'monthFirst',
    });
    const again = readTable(bytes, statement ?? {});
    expect(again.kind === 'accepted' && again.year).toEqual(first);
  });

  it('reads columns by number where the headings say nothing', () => {
    const headings = {
      dniWm2: 'a',
      ghiWm2: 'b',
      dhiWm2: 'c',
      dryBulbC: 'd',
      windMs: 'e',
      relativeHumidityPct: 'f',
      pressurePa: 'g',
    };
    const options: TableFileOptions = { headings, unitsIn: 'nowhere' };
    const columns = {
      dniWm2: { column: tableColumn('dniWm2'), unit: 'W/m²' },
      ghiWm2: { column: tableColumn('ghiWm2'), unit: 'W/m²' },
      dhiWm2: { column: tableColumn('dhiWm2'), unit: 'W/m²' },
      dryBulbC: { column: tableColumn('dryBulbC'), unit: '°C' },
      windMs: { column: tableColumn('windMs'), unit: 'm/s' },
      relativeHumidityPct: { column: tableColumn('relativeHumidityPct'), unit: '%' },
      pressurePa: { column: tableColumn('pressurePa'), unit: 'Pa' },
    } as const;
    expectSameYear(accepted(options, { ...tableStatement(year), columns }));
  });
});

describe('other intervals', () => {
  const halfHours = {
    ...year,
    intervalMinutes: 30,
    startLocalMs: Float64Array.from({ length: 17520 }, (_, at) => year.startLocalMs[0]! + at * 1_800_000),
    ...Object.fromEntries(
      WEATHER_CHANNELS.map((channel) => [
        channel,
        Float64Array.from({ length: 17520 }, (_, at) => year[channel][Math.floor(at / 2)]!),
      ]),
    ),
    flags: new Uint16Array(17520),
  };

  it('reads half hours, with energies of half an hour', () => {
    const options: TableFileOptions = { units: { dniWm2: 'MJ/m²' }, label: 'start' };
    const result = readTable(tableFile(halfHours, options), tableStatement(halfHours, options));
    if (result.kind === 'refused') throw new Error(JSON.stringify(result.problems));
    expect(result.summary.records).toBe(17520);
    expect(result.summary.intervalMinutes).toBe(30);
    expect(result.year.dniWm2[8761]).toBeCloseTo(halfHours.dniWm2[8761]!, 3);
  });

  it('refuses intervals that do not divide the hour', () => {
    const odd = {
      ...year,
      startLocalMs: year.startLocalMs.map((_, at) => year.startLocalMs[0]! + at * 45 * 60_000),
    };
    expect(readTable(tableFile(odd), tableStatement(odd))).toMatchObject({
      kind: 'refused',
      problems: [{ reason: 'The records are 45 min apart.' }],
    });
  });
});
