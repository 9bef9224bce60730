import { describe, expect, it } from 'vitest';
import { epwFile, lineOfRow, paddedEpwFile, pdfFile, syntheticYear, type EpwDefect } from '@noonwell/testkit';
import { describeProblem, readEpw, readWeatherFile, type WeatherRefused } from '../index.js';
import { LISTED_PROBLEMS } from '../limits.js';

const year = syntheticYear();
/** 17 June, hour 14. */
const ROW = (31 + 28 + 31 + 30 + 31 + 16) * 24 + 13;
const LINE = lineOfRow(ROW);

function refuse(...defects: EpwDefect[]): WeatherRefused {
  return refuseBytes(epwFile(year, { defects }));
}

function refuseBytes(bytes: Uint8Array): WeatherRefused {
  const result = readWeatherFile(bytes, 'test.epw');
  if (result.kind === 'accepted') throw new Error('accepted');
  return result;
}

describe('content that is no weather table', () => {
  it.each([
    ['an empty file', new Uint8Array(0), /empty/],
    ['a PDF renamed .epw', pdfFile(), /PDF document/],
    ['a ZIP archive', new Uint8Array([0x50, 0x4b, 3, 4, 0, 0]), /ZIP/],
    ['UTF-16', new Uint8Array([0xff, 0xfe, 0x4c, 0]), /UTF-16/],
    ['binary', new Uint8Array([0x4c, 0x4f, 0, 1]), /binary/],
    ['65 MiB', paddedEpwFile(year, 65 * 1024 * 1024), /65\.0 MiB; at most 64 MiB/],
    ['another text', new TextEncoder().encode('dear reader,\nhello'), /not of a format/],
  ])('refuses %s', (_, bytes, reason) => {
    expect(readEpw(bytes).kind).toBe('refused');
    const { problems } = refuseBytes(bytes);
    expect(problems).toHaveLength(1);
    expect(problems[0]!.reason).toMatch(reason);
    expect(problems[0]!.fix).not.toBe('');
  });

  it('reads a file of exactly the largest size', () => {
    expect(readEpw(paddedEpwFile(year, 64 * 1024 * 1024)).kind).toBe('accepted');
  });
});

describe('headers', () => {
  it('asks for LOCATION and for DATA PERIODS', () => {
    expect(refuse({ kind: 'headerLine', startsWith: 'LOCATION', line: null }).problems[0]!.reason).toMatch(
      /no LOCATION/,
    );
    expect(refuse({ kind: 'headerLine', startsWith: 'DATA', line: null }).problems[0]!.reason).toMatch(
      /no DATA PERIODS/,
    );
  });

  it('lists each number of LOCATION that is wrong, at its cell', () => {
    const line = 'LOCATION,A,B,C,D,1,97.2,east,,900';
    const { problems, problemCount } = refuse({ kind: 'headerLine', startsWith: 'LOCATION', line });
    expect(problems).toMatchObject([
      {
        line: 1,
        column: 7,
        columnName: 'latitude',
        value: '97.2',
        reason: expect.stringMatching(/out of range/) as string,
      },
      {
        line: 1,
        column: 8,
        columnName: 'longitude',
        value: 'east',
        reason: expect.stringMatching(/not a number/) as string,
      },
      {
        line: 1,
        column: 9,
        columnName: 'time zone',
        value: '',
        reason: expect.stringMatching(/missing/) as string,
      },
    ]);
    expect(problemCount).toBe(3);
  });

  it('refuses records that are not hourly', () => {
    const line = 'DATA PERIODS,1,4,Data,Sunday, 1/ 1,12/31';
    expect(refuse({ kind: 'headerLine', startsWith: 'DATA', line }).problems).toMatchObject([
      { line: 8, column: 3, value: '4' },
    ]);
  });
});

describe('hours', () => {
  it('names the one that is missing of 8759', () => {
    const { problems, problemCount } = refuse({ kind: 'rowMissing', row: ROW });
    expect(problemCount).toBe(1);
    expect(problems[0]).toMatchObject({ line: LINE });
    expect(problems[0]!.reason).toBe(
      'The hour 17 June, hour 14 is missing (8759 lines of hours, 8760 needed).',
    );
  });

  it('names where a truncated file stops, and its cut line', () => {
    const { problems } = refuse({ kind: 'truncated', row: ROW, characters: 60 });
    expect(problems).toMatchObject([
      { line: LINE, reason: expect.stringMatching(/cut off/) as string },
      {
        line: LINE + 1,
        reason: expect.stringMatching(
          /stops before 17 June, hour 15: 4738 hours to 31 December, hour 24/,
        ) as string,
      },
    ]);
  });

  it('notices that only the last line is cut', () => {
    const { problems, problemCount } = refuse({ kind: 'truncated', row: 8759, characters: 40 });
    expect(problemCount).toBe(1);
    expect(problems[0]).toMatchObject({
      line: lineOfRow(8759),
      reason: expect.stringMatching(/cut off/) as string,
    });
  });

  it('names the first line of a duplicate', () => {
    expect(refuse({ kind: 'rowDuplicated', row: ROW }).problems).toMatchObject([
      { line: LINE + 1, value: '2018,6,17,14', reason: `This hour stands already in line ${LINE}.` },
    ]);
  });

  it('refuses wrong order', () => {
    expect(refuse({ kind: 'rowsSwapped', row: ROW }).problems).toMatchObject([
      { line: LINE + 1, reason: expect.stringMatching(/earlier than the one in the line before/) as string },
    ]);
  });

  it('refuses a file without a single hour, and hours 0 to 23', () => {
    const { problems } = refuse({ kind: 'truncated', row: 0, characters: 0 });
    expect(problems[0]).toMatchObject({ line: 9, reason: 'No hours follow the DATA PERIODS line.' });
    expect(refuse({ kind: 'cell', row: ROW, cell: 4, text: '0' }).problems[0]).toMatchObject({
      line: LINE,
      column: 4,
      columnName: 'hour',
      value: '0',
    });
  });

  it('stops early in a file of endless lines, and on an endless line', () => {
    const header = new TextDecoder().decode(epwFile(year)).split('\n').slice(0, 8).join('\n');
    const lines = refuseBytes(new TextEncoder().encode(`${header}\n${'\n'.repeat(1_000_000)}`));
    expect(lines.problems[0]!.reason).toMatch(/More than 50000 lines/);
    const cells = refuseBytes(new TextEncoder().encode(`${header}\n2018,1,1,1,${','.repeat(20_000_000)}`));
    expect(cells.problems[0]!.line).toBe(9);
  });

  it('refuses 29 February of a year that has none', () => {
    const { problems } = refuse(
      { kind: 'cell', row: 59 * 24, cell: 2, text: '2' },
      { kind: 'cell', row: 59 * 24, cell: 3, text: '29' },
    );
    expect(problems[0]!.reason).toBe('2018 has no 29 February: it is not a leap year.');
  });
});

describe('values', () => {
  it.each([
    [7, 'mild', 'dry-bulb temperature', /"mild" is not a number/],
    [7, 'NaN', 'dry-bulb temperature', /not a number/],
    [7, '12,5'.replace(',', ';'), 'dry-bulb temperature', /not a number/],
    [7, '88', 'dry-bulb temperature', /out of range/],
    [9, '250', 'relative humidity', /out of range/],
    [10, '1013', 'station pressure', /out of range/],
    [14, '-3', 'global horizontal irradiation', /-3 is negative/],
    [15, '-999', 'direct normal irradiation', /-999 is negative/],
    [15, '9999', 'direct normal irradiation', /missing \(9999\)/],
    [16, '', 'diffuse horizontal irradiation', /missing \(empty cell\)/],
    [16, '2500', 'diffuse horizontal irradiation', /out of range/],
    [22, '-1', 'wind speed', /negative/],
    [2, 'June', 'month', /month is "June"/],
  ])('refuses "%s" = "%s" with line and column', (cell, text, columnName, reason) => {
    const [problem] = refuse({ kind: 'cell', row: ROW, cell, text }).problems;
    expect(problem).toMatchObject({ line: LINE, column: cell, columnName, value: text });
    expect(problem!.reason).toMatch(reason);
    expect(describeProblem(problem!)).toMatch(
      new RegExp(`^Line ${LINE}, column ${cell} \\(${columnName}\\): `),
    );
  });

  it('says so when pressure looks like hectopascal', () => {
    expect(refuse({ kind: 'cell', row: ROW, cell: 10, text: '1013' }).problems[0]!.fix).toMatch(
      /hectopascal/,
    );
  });

  it('refuses a gap of 4 hours where 3 are filled', () => {
    const gap = (hours: number): EpwDefect[] =>
      Array.from({ length: hours }, (_, at) => ({ kind: 'cell', row: ROW + at, cell: 22, text: '999' }));
    expect(readEpw(epwFile(year, { defects: gap(3) })).kind).toBe('accepted');
    expect(refuse(...gap(4)).problems).toMatchObject([
      {
        line: LINE,
        column: 22,
        reason: expect.stringMatching(/4 hours, from 17 June, hour 14 to 17 June, hour 17/) as string,
      },
    ]);
  });

  it('lists several problems at once, and counts those beyond the first twenty', () => {
    const { problems, problemCount } = refuse(
      { kind: 'column', cell: 15, text: '9999' },
      { kind: 'rowMissing', row: ROW },
    );
    expect(problems).toHaveLength(LISTED_PROBLEMS);
    expect(problems[0]).toMatchObject({ line: 9, column: 15 });
    expect(problemCount).toBe(8760);
  });

  it('shortens an endless cell in its message', () => {
    const [problem] = refuse({ kind: 'cell', row: ROW, cell: 7, text: 'x'.repeat(3000) }).problems;
    expect(problem!.value!.length).toBeLessThan(70);
    expect(problem!.reason.length).toBeLessThan(100);
  });
});
