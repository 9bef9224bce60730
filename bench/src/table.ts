/** A table for the terminal: the first column left, numbers right. */
export function formatTable(header: readonly string[], rows: readonly (readonly string[])[]): string {
  const widths = header.map((title, column) =>
    Math.max(title.length, ...rows.map((cells) => cells[column]?.length ?? 0)),
  );
  const line = (cells: readonly string[]): string =>
    cells
      .map((cell, column) => (column === 0 ? cell.padEnd(widths[0]!) : cell.padStart(widths[column]!)))
      .join('  ');
  return [line(header), line(widths.map((width) => '─'.repeat(width))), ...rows.map(line)].join('\n');
}
