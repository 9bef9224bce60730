import Papa from 'papaparse';

/** Characters of a line that are looked at. Real lines have under 500; a hostile one must not become millions of cells. */
const LONGEST_LINE = 4096;

/** Cells of one line; quoted cells as in RFC 4180. */
export function splitCells(wholeLine: string): string[] {
  const line = wholeLine.slice(0, LONGEST_LINE);
  if (!line.includes('"')) return line.split(',');
  const parsed = Papa.parse<string[]>(line, { delimiter: ',' });
  return parsed.data[0] ?? [];
}

const NUMBER = /^[+-]?(?:\d+\.?\d*|\.\d+)(?:[eE][+-]?\d+)?$/;

/** The number a cell holds; NaN for anything else, also for words such as NaN or Infinity. */
export function parseNumber(cell: string): number {
  const text = cell.trim();
  return NUMBER.test(text) ? Number(text) : NaN;
}

/** A whole number; NaN for anything else. */
export function parseWhole(cell: string): number {
  const value = parseNumber(cell);
  return Number.isInteger(value) ? value : NaN;
}
