/** Damage done to the rows of a sound table. Rows count from 0, columns from 1. */
export type RowDefect =
  /** The file ends within this row, after so many characters of it. */
  | { readonly kind: 'truncated'; readonly row: number; readonly characters: number }
  /** So many rows are absent, 1 unless stated. */
  | { readonly kind: 'rowMissing'; readonly row: number; readonly count?: number }
  /** The row stands twice. */
  | { readonly kind: 'rowDuplicated'; readonly row: number }
  /** The row changes places with the next one. */
  | { readonly kind: 'rowsSwapped'; readonly row: number }
  /** Any text in one cell, of so many rows, 1 unless stated. */
  | {
      readonly kind: 'cell';
      readonly row: number;
      readonly column: number;
      readonly text: string;
      readonly count?: number;
    }
  /** A line of its own before the row. */
  | { readonly kind: 'lineInserted'; readonly row: number; readonly line: string };

/** New lines of rows with one defect. @throws RangeError when there is no such row */
export function applyRowDefect(lines: readonly string[], defect: RowDefect, delimiter: string): string[] {
  const { row } = defect;
  const line = lines[row];
  if (line === undefined) throw new RangeError(`the table has no row ${row}`);
  switch (defect.kind) {
    case 'truncated':
      return [...lines.slice(0, row), line.slice(0, defect.characters)];
    case 'rowMissing':
      return lines.toSpliced(row, defect.count ?? 1);
    case 'rowDuplicated':
      return lines.toSpliced(row, 0, line);
    case 'rowsSwapped':
      return lines.toSpliced(row, 2, lines[row + 1] ?? line, line);
    case 'lineInserted':
      return lines.toSpliced(row, 0, defect.line);
    case 'cell':
      return lines.map((content, at) => {
        if (at < row || at >= row + (defect.count ?? 1)) return content;
        return content
          .split(delimiter)
          .with(defect.column - 1, defect.text)
          .join(delimiter);
      });
  }
}
