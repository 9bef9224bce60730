import { expect, describe, it } from 'vitest';
import { cellsOf, readHorizonTable, withoutHeading } from './table-text.js';

const PAIRS = ['Azimuth', 'Elevation'];
const read = (text: string) => readHorizonTable(text, PAIRS, 360);

describe('rows of pairs out of a file or a spreadsheet', () => {
  it.each([
    ['cells of a spreadsheet', '0\t5\r\n90\t12.5\r\n'],
    ['commas', '0,5\n90,12.5'],
    ['commas and spaces', '0, 5\n90, 12.5'],
    ['semicolons', '0;5\n90;12.5\n'],
    ['semicolons and decimal commas', '0;5\n90;12,5\n'],
    ['spaces', '0 5\n 90   12.5'],
    ['spaces and decimal commas', '0,0 5,0\n90,0 12,5'],
    ['a heading, a comment and an empty line', 'azimuth,elevation\n# hill\n0,5\n\n90,12.5'],
    ['quotes and a byte order mark', '\ufeff"azimuth";"elevation"\n"0";"5"\n"90";"12,5"'],
    ['a third column that nobody asked for', '0,5,oak\n90,12.5,barn'],
  ])('%s', (_, text) => {
    const table = read(text);
    expect(table.ok && table.rows.map((row) => row.map(Number))).toEqual([
      [0, 5],
      [90, 12.5],
    ]);
  });

  it('keeps negative numbers for the schema to judge', () => {
    expect(read('0 -1.5')).toEqual({ ok: true, rows: [['0', '-1.5']] });
  });

  it.each([
    ['nothing', '', /no row with Azimuth and Elevation/],
    ['a heading alone', 'azimuth,elevation', /no row/],
    ['one column', '1\n2', /Row 1 of the numbers: Elevation is missing/],
    [
      'text in a later row',
      '0,5\n90,high',
      /Row 2 of the numbers: Elevation is “high”, which is not a number/,
    ],
    [
      'too many rows',
      Array.from({ length: 361 }, (_, at) => `${at},${at}`).join('\n'),
      /361 rows; at most 360/,
    ],
  ])('refuses %s in a sentence', (_, text, sentence) => {
    const table = read(text);
    expect(table.ok ? '' : table.problem).toMatch(sentence);
  });
});

it('splits pasted cells as they stand, dates too', () => {
  expect(cellsOf('03-01\t03-14\n12-20\t01-06')).toEqual([
    ['03-01', '03-14'],
    ['12-20', '01-06'],
  ]);
});

it('takes a first row without a number for a heading', () => {
  expect(withoutHeading(cellsOf('azimuth elevation\n0 5'))).toEqual([['0', '5']]);
  expect(withoutHeading(cellsOf('0 5\n90 high'))).toHaveLength(2);
  expect(withoutHeading([])).toEqual([]);
});

it('leaves out the row that closes the circle, where it says what the first says', () => {
  const rowsOf = (text: string) => {
    const table = read(text);
    return table.ok ? table.rows.length : table.problem;
  };
  expect(rowsOf('0 5\n180 7\n360 5.0')).toBe(2);
  expect(rowsOf('0 5\n180 7\n360 6')).toBe(3);
  expect(rowsOf('10 5\n180 7\n360 5')).toBe(3);
  expect(rowsOf(Array.from({ length: 361 }, (_, at) => `${at} 1`).join('\n'))).toBe(360);
});
