import { parseNumber } from './draft.js';

/** Rows of cells as text, or a sentence that says why there are none. */
export type TableText =
  | { readonly ok: true; readonly rows: readonly (readonly string[])[] }
  | { readonly ok: false; readonly problem: string };

/** The cells of a spreadsheet or a line of text each, split where the whole text is split alike. */
export function cellsOf(text: string): string[][] {
  const lines = text
    .replace(/^\ufeff/, '')
    .split(/\r\n|\r|\n/)
    .filter((line) => line.trim() !== '' && !line.trimStart().startsWith('#'));
  const separator = separatorOf(lines);
  return lines.map((line) => {
    const cells = line.trim().split(separator).map(unquoted);
    // Where a comma does not separate cells it is the decimal mark.
    return separator === COMMA
      ? cells
      : cells.map((cell) => cell.replace(/^([+\u2212-]?\d*),(\d+)$/u, '$1.$2'));
  });
}

/** A first line without a number is a heading. */
export function withoutHeading(rows: readonly string[][]): readonly string[][] {
  return rows[0]?.some(isNumber) === false ? rows.slice(1) : rows;
}

/**
 * Pairs of a horizon profile out of a file: all lines but a heading need one number a column, and a last line at
 * 360° that says what the first says at 0° goes.
 * @param columns names of the columns, in order
 */
export function readHorizonTable(text: string, columns: readonly string[], mostRows: number): TableText {
  const rows = withoutClosingRow(
    withoutHeading(cellsOf(text)).map((cells) => cells.slice(0, columns.length)),
  );
  const wanted = columns.join(' and ');
  if (rows.length === 0) return { ok: false, problem: `There is no row with ${wanted} in it.` };
  if (rows.length > mostRows)
    return { ok: false, problem: `It has ${rows.length} rows; at most ${mostRows} fit. Leave some out.` };
  for (const [index, cells] of rows.entries()) {
    const bad = columns.findIndex((_, column) => !isNumber(cells[column] ?? ''));
    if (bad < 0) continue;
    const found = cells[bad] ?? '';
    return {
      ok: false,
      problem: `Row ${index + 1} of the numbers: ${columns[bad] ?? ''} ${found === '' ? 'is missing' : `is “${found}”, which is not a number`}. Each row needs ${wanted}.`,
    };
  }
  return { ok: true, rows };
}

/** 360° is 0°: the row that closes the circle goes where it says the same as the first. */
function withoutClosingRow(rows: readonly (readonly string[])[]): readonly (readonly string[])[] {
  const last = rows.at(-1);
  const north = rows.find(([azimuth]) => parseNumber(azimuth ?? '') === 0);
  const closes =
    last !== undefined &&
    north !== undefined &&
    parseNumber(last[0] ?? '') === 360 &&
    parseNumber(last[1] ?? '') === parseNumber(north[1] ?? '');
  return closes ? rows.slice(0, -1) : rows;
}

const COMMA = /\s*,\s*/;

function separatorOf(lines: readonly string[]): RegExp {
  const everywhere = (mark: RegExp) => lines.some((line) => mark.test(line));
  if (everywhere(/\t/)) return /\t/;
  if (everywhere(/;/)) return /\s*;\s*/;
  // "12,5 3,0" has commas in its numbers and a space between them; "12.5, 3" has commas between them.
  const spaced = lines.every((line) => !/,\s/.test(line) && /\d\s+[+\u2212.\d-]/u.test(line.trim()));
  if (everywhere(/,/) && !spaced) return COMMA;
  return /\s+/;
}

function unquoted(cell: string): string {
  return cell.trim().replace(/^"(.*)"$/, '$1');
}

function isNumber(cell: string): boolean {
  return typeof parseNumber(cell) === 'number';
}
