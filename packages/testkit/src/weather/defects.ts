/**
 * Damage done to the lines of a sound EPW file. Rows count from 0 (1 January, hour 1); cells from 1 as in the
 * format's data dictionary.
 */
export type EpwDefect =
  /** The file ends within this row, after so many characters of it. */
  | { readonly kind: 'truncated'; readonly row: number; readonly characters: number }
  | { readonly kind: 'rowMissing'; readonly row: number }
  /** The row stands twice. */
  | { readonly kind: 'rowDuplicated'; readonly row: number }
  /** The row changes places with the next one. */
  | { readonly kind: 'rowsSwapped'; readonly row: number }
  /** Any text in one cell: a word, a missing mark, a negative number. */
  | { readonly kind: 'cell'; readonly row: number; readonly cell: number; readonly text: string }
  /** The same text in one cell of every row: no pressure, say. */
  | { readonly kind: 'column'; readonly cell: number; readonly text: string }
  | { readonly kind: 'utcOffset'; readonly hours: number }
  /** Values of all rows, or of some, move to later time stamps (negative: earlier), wrapping round. */
  | { readonly kind: 'shifted'; readonly hours: number; readonly fromRow?: number; readonly toRow?: number }
  /** Another line in place of one of the header, or none. Give it last: rows are counted after a whole header. */
  | { readonly kind: 'headerLine'; readonly startsWith: string; readonly line: string | null };

/** Header lines of the files that `writeEpw` makes. */
export const EPW_HEADER_LINES = 8;
const TIME_CELLS = 5;
const UTC_OFFSET_CELL = 9;

/** Line of the file, from 1, on which a row of a sound file stands. */
export function lineOfRow(row: number): number {
  return EPW_HEADER_LINES + row + 1;
}

/** New lines with one defect. @throws RangeError when there is no such row */
export function applyDefect(lines: readonly string[], defect: EpwDefect): string[] {
  const damaged = [...lines];
  const index = 'row' in defect ? EPW_HEADER_LINES + defect.row : EPW_HEADER_LINES;
  const row = damaged[index];
  if (row === undefined) throw new RangeError(`the file has no line ${index + 1}`);
  switch (defect.kind) {
    case 'truncated':
      return [...damaged.slice(0, index), row.slice(0, defect.characters)];
    case 'rowMissing':
      damaged.splice(index, 1);
      return damaged;
    case 'rowDuplicated':
      damaged.splice(index, 0, row);
      return damaged;
    case 'rowsSwapped':
      damaged.splice(index, 2, damaged[index + 1] ?? row, row);
      return damaged;
    case 'cell':
      damaged[index] = withCell(row, defect.cell, defect.text);
      return damaged;
    case 'column':
      return damaged.map((line, at) =>
        at < EPW_HEADER_LINES ? line : withCell(line, defect.cell, defect.text),
      );
    case 'utcOffset':
      damaged[0] = withCell(damaged[0] ?? '', UTC_OFFSET_CELL, String(defect.hours));
      return damaged;
    case 'shifted':
      return shift(
        damaged,
        defect.hours,
        defect.fromRow ?? 0,
        defect.toRow ?? lines.length - EPW_HEADER_LINES,
      );
    case 'headerLine':
      return damaged.flatMap((line, at) => {
        if (at >= EPW_HEADER_LINES || !line.startsWith(defect.startsWith)) return [line];
        return defect.line === null ? [] : [defect.line];
      });
  }
}

function withCell(line: string, cell: number, text: string): string {
  const cells = line.split(',');
  cells[cell - 1] = text;
  return cells.join(',');
}

function shift(lines: string[], hours: number, fromRow: number, toRow: number): string[] {
  const rows = lines
    .slice(EPW_HEADER_LINES + fromRow, EPW_HEADER_LINES + toRow)
    .map((line) => line.split(','));
  const shifted = rows.map((cells, at) => {
    const donor = rows[(((at - hours) % rows.length) + rows.length) % rows.length] ?? cells;
    return [...cells.slice(0, TIME_CELLS), ...donor.slice(TIME_CELLS)].join(',');
  });
  return lines.toSpliced(EPW_HEADER_LINES + fromRow, rows.length, ...shifted);
}
