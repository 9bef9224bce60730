import {
  TABLE_DELIMITERS,
  type TableDecimalMark,
  type TableDelimiter,
  type TableEncoding,
  type TableStatement,
} from '@noonwell/schema';
import { cellsOfLine, findEncoding, headLines, MOST_COLUMNS } from './blocks.js';
import { readHeading, type Heading } from './headings.js';
import { isMissingWord, parseCell } from './numbers.js';
import { looksLikeStamp } from './time.js';
import { unitOf } from './units.js';

/** Lines in which the layout is sought. */
const HEAD_LINES = 500;
/** Data lines with equally many cells that make a table (own choice). */
const FEWEST_LINES = 8;
const FEWEST_COLUMNS = 3;
/** Numbers that a data line needs at least (own choice): a time stamp may stand beside them. */
const FEWEST_NUMBERS = 3;

/** How the text of a table is built. */
export interface TableLayout {
  readonly encoding: TableEncoding;
  readonly byteOrderMark: boolean;
  readonly delimiter: TableDelimiter;
  readonly decimalMark: TableDecimalMark;
  /** Line of the headings, from 1; null where there is none. */
  readonly headingLine: number | null;
  /** From 1. */
  readonly firstDataLine: number;
  readonly headings: readonly Heading[];
  /** Cells of the first data lines, to look at. */
  readonly sample: readonly (readonly string[])[];
}

/** The layout of a table, corrected where the statement says so; null where the content is no table. */
export function findLayout(bytes: Uint8Array, stated: TableStatement['layout'] = {}): TableLayout | null {
  const found = findEncoding(bytes);
  const encoding = stated.encoding ?? found.encoding;
  const lines = headLines(bytes, encoding, HEAD_LINES);
  const delimiters = stated.delimiter === undefined ? TABLE_DELIMITERS : [stated.delimiter];
  const best = delimiters
    .map((delimiter) => findRun(lines, delimiter))
    .reduce<Run | null>(
      (longest, run) => (run !== null && (longest === null || run.rows > longest.rows) ? run : longest),
      null,
    );
  if (best === null) return null;
  const sample = best.cells.slice(best.from);
  const decimalMark = stated.decimalMark ?? findDecimalMark(sample, best.delimiter);
  const { headingLine, headings } = findHeadings(best);
  return {
    encoding,
    byteOrderMark: found.byteOrderMark,
    delimiter: best.delimiter,
    decimalMark,
    headingLine,
    firstDataLine: best.from + 1,
    headings,
    sample,
  };
}

interface Run {
  readonly delimiter: TableDelimiter;
  readonly cells: readonly (readonly string[])[];
  /** Index of the first data line. */
  readonly from: number;
  readonly rows: number;
  readonly width: number;
}

/** The longest run of data lines with equally many cells. */
function findRun(lines: readonly string[], delimiter: TableDelimiter): Run | null {
  const cells = lines.map((line) => cellsOfLine(line, delimiter));
  let best: Omit<Run, 'delimiter' | 'cells'> | null = null;
  let from = 0;
  let rows = 0;
  cells.forEach((row, at) => {
    const isData = row.length >= FEWEST_COLUMNS && row.length < MOST_COLUMNS && looksLikeData(row);
    if (!isData) {
      rows = 0;
      return;
    }
    if (rows === 0 || row.length !== cells[at - 1]?.length) {
      from = at;
      rows = 0;
    }
    rows += 1;
    if (best === null || rows > best.rows) best = { from, rows, width: row.length };
  });
  // The narrowing of a variable set inside the callback is lost here.
  const run = best as Omit<Run, 'delimiter' | 'cells'> | null;
  if (run === null || run.rows < FEWEST_LINES) return null;
  // A damaged line early on must not hide the lines before it.
  const first = cells.findIndex((row) => row.length === run.width && looksLikeData(row));
  return { delimiter, cells, ...run, from: first };
}

function isNumberOfAnyMark(cell: string): boolean {
  return !Number.isNaN(parseCell(cell, 'point')) || !Number.isNaN(parseCell(cell, 'comma'));
}

function looksLikeData(row: readonly string[]): boolean {
  let numbers = 0;
  let others = 0;
  for (const cell of row) {
    if (isNumberOfAnyMark(cell)) numbers += 1;
    else if (!isMissingWord(cell) && looksLikeStamp(cell) === 'no') others += 1;
  }
  return numbers >= FEWEST_NUMBERS && others <= numbers;
}

/** Comma where numbers carry one and none carries a point; with commas between the cells it can only be the point. */
function findDecimalMark(
  sample: readonly (readonly string[])[],
  delimiter: TableDelimiter,
): TableDecimalMark {
  if (delimiter === ',' && !sample.some((row) => row.some((cell) => /^\s*[+-]?\d+,\d+\s*$/.test(cell))))
    return 'point';
  let points = 0;
  let commas = 0;
  for (const cell of sample.flat()) {
    if (/^\s*[+-]?\d*\.\d+\s*$/.test(cell)) points += 1;
    if (/^\s*[+-]?\d*,\d+\s*$/.test(cell)) commas += 1;
  }
  return commas > points ? 'comma' : 'point';
}

/** The line before the data holds the headings, or units below them. */
function findHeadings({ cells, from, width }: Run): { headingLine: number | null; headings: Heading[] } {
  const without = (at: number) => `Column ${at + 1}`;
  const above = cells[from - 1];
  const numbered = {
    headingLine: null,
    headings: Array.from({ length: width }, (_, at) => readHeading(without(at))),
  };
  if (above === undefined || !isHeadingRow(above)) return numbered;
  const named = above.filter((cell) => cell.trim() !== '');
  const units = named.filter((cell) => unitOf(cell.replace(/^[[(]\s*|\s*[\])]$/g, '')) !== null).length;
  const higher = cells[from - 2];
  const hasUnitLine = units >= 2 && units * 2 >= named.length && higher !== undefined && isHeadingRow(higher);
  const names = hasUnitLine ? higher : above;
  return {
    headingLine: hasUnitLine ? from - 1 : from,
    headings: Array.from({ length: width }, (_, at) => {
      const name = names[at]?.trim() ?? '';
      return readHeading(name === '' ? without(at) : name, hasUnitLine ? above[at] : '');
    }),
  };
}

function isHeadingRow(row: readonly string[]): boolean {
  const filled = row.filter((cell) => cell.trim() !== '');
  const words = filled.filter((cell) => !isNumberOfAnyMark(cell)).length;
  return words >= 2 && words * 2 > filled.length;
}
