import type { TableDelimiter, TableEncoding } from '@noonwell/schema';
import Papa from 'papaparse';

/** Bytes decoded at a time: memory holds one block of text, however long the file is. */
const BLOCK_BYTES = 1 << 18;
/** A line without end must not grow into memory; real lines have a few hundred characters. */
export const LONGEST_TABLE_LINE = 1 << 16;
/** Cells of a line that are looked at. */
export const MOST_COLUMNS = 500;

const DELIMITER_TEXT: Readonly<Record<TableDelimiter, string>> = {
  ',': ',',
  ';': ';',
  tab: '\t',
  '|': '|',
  space: ' ',
};
const DECODER_LABEL: Readonly<Record<TableEncoding, string>> = {
  'utf-8': 'utf-8',
  'latin-1': 'windows-1252',
};

/** A line is longer than any table's: the content is no table. */
export class TooLongLineError extends Error {
  override readonly name = 'TooLongLineError';
  constructor(readonly line: number) {
    super(`line ${line} is longer than ${LONGEST_TABLE_LINE} characters`);
  }
}

export interface FoundEncoding {
  readonly encoding: TableEncoding;
  readonly byteOrderMark: boolean;
}

/** UTF-8 where every byte fits it, else Latin-1, which cannot fail. Decoded text is not kept. */
export function findEncoding(bytes: Uint8Array): FoundEncoding {
  const byteOrderMark = bytes[0] === 0xef && bytes[1] === 0xbb && bytes[2] === 0xbf;
  const decoder = new TextDecoder('utf-8', { fatal: true });
  try {
    for (let at = 0; at < bytes.length; at += BLOCK_BYTES) {
      decoder.decode(bytes.subarray(at, at + BLOCK_BYTES), { stream: true });
    }
    decoder.decode();
    return { encoding: 'utf-8', byteOrderMark };
  } catch {
    return { encoding: 'latin-1', byteOrderMark: false };
  }
}

/** Whole lines of a file in blocks, each ended by LF whatever the file has; `fraction` of the bytes is done after it. */
function* blocksOf(
  bytes: Uint8Array,
  encoding: TableEncoding,
): Generator<{ text: string; firstLine: number; fraction: number }> {
  const decoder = new TextDecoder(DECODER_LABEL[encoding]);
  let carried = '';
  let firstLine = 1;
  for (let at = 0; at < bytes.length; at += BLOCK_BYTES) {
    const isLast = at + BLOCK_BYTES >= bytes.length;
    const decoded = decoder.decode(bytes.subarray(at, at + BLOCK_BYTES), { stream: !isLast });
    let text = carried + decoded;
    // The LF of a final CR may come with the next block.
    const end = isLast ? text.length : lastLineEnd(text);
    carried = text.slice(end);
    if (carried.length > LONGEST_TABLE_LINE) throw new TooLongLineError(firstLine + countLines(text, end));
    text = text.slice(0, end).replace(/\r\n?/g, '\n');
    if (text === '') continue;
    if (!text.endsWith('\n')) text += '\n';
    yield { text, firstLine, fraction: Math.min(1, (at + BLOCK_BYTES) / bytes.length) };
    firstLine += countLines(text, text.length);
  }
}

function lastLineEnd(text: string): number {
  const searched = text.endsWith('\r') ? text.length - 2 : text.length - 1;
  return Math.max(text.lastIndexOf('\n', searched), text.lastIndexOf('\r', searched)) + 1;
}

function countLines(text: string, end: number): number {
  let count = 0;
  for (let at = text.indexOf('\n'); at !== -1 && at < end; at = text.indexOf('\n', at + 1)) count += 1;
  return count;
}

/** The cells of one line. A cell cannot span lines: an open quote harms its own line only. */
export function cellsOfLine(line: string, delimiter: TableDelimiter): string[] {
  return tidy(
    Papa.parse<string[]>(line, { delimiter: DELIMITER_TEXT[delimiter], newline: '\n' }).data[0] ?? [],
    delimiter,
  );
}

function tidy(cells: string[], delimiter: TableDelimiter): string[] {
  const kept = delimiter === 'space' ? cells.filter((cell) => cell !== '') : cells;
  return kept.length > MOST_COLUMNS ? kept.slice(0, MOST_COLUMNS) : kept;
}

export interface RowSource {
  readonly bytes: Uint8Array;
  readonly encoding: TableEncoding;
  readonly delimiter: TableDelimiter;
}

/**
 * Visits the lines of a file one after another as cells, block by block.
 *
 * @param visit gets cells and line number (from 1); returning false ends the reading
 * @throws TooLongLineError
 */
export function visitRows(
  { bytes, encoding, delimiter }: RowSource,
  visit: (cells: string[], line: number) => boolean,
  onProgress?: (fraction: number) => void,
): void {
  for (const { text, firstLine, fraction } of blocksOf(bytes, encoding)) {
    let line = firstLine;
    if (text.includes('"')) {
      for (const content of text.slice(0, -1).split('\n')) {
        if (content.length > LONGEST_TABLE_LINE) throw new TooLongLineError(line);
        if (!visit(cellsOfLine(content, delimiter), line)) return;
        line += 1;
      }
    } else {
      const { data } = Papa.parse<string[]>(text.slice(0, -1), {
        delimiter: DELIMITER_TEXT[delimiter],
        newline: '\n',
        fastMode: true,
      });
      // The parser drops nothing but an empty text, which is one empty line.
      for (const cells of data.length === 0 ? [['']] : data) {
        if (!visit(tidy(cells, delimiter), line)) return;
        line += 1;
      }
    }
    onProgress?.(fraction);
  }
}

/** The first lines of a file. */
export function headLines(bytes: Uint8Array, encoding: TableEncoding, most: number): string[] {
  const head = bytes.length > BLOCK_BYTES ? bytes.subarray(0, BLOCK_BYTES) : bytes;
  const text = new TextDecoder(DECODER_LABEL[encoding]).decode(head).replace(/\r\n?/g, '\n');
  const lines = text.split('\n', most + 1);
  // The last one may be cut by the block, or is the nothing after the last line's end.
  if (lines.length > 1) lines.pop();
  return lines.map((line) => line.slice(0, LONGEST_TABLE_LINE));
}
