import { WEATHER_FILE_LIMIT_BYTES } from './limits.js';
import type { WeatherProblem } from './problem.js';

const SIGNATURES: readonly { readonly bytes: readonly number[]; readonly what: string }[] = [
  { bytes: [0x25, 0x50, 0x44, 0x46], what: 'a PDF document' },
  { bytes: [0x50, 0x4b, 0x03, 0x04], what: 'a ZIP archive or an office document' },
  { bytes: [0x1f, 0x8b], what: 'a gzip archive' },
  { bytes: [0xff, 0xfe], what: 'text in UTF-16' },
  { bytes: [0xfe, 0xff], what: 'text in UTF-16' },
  { bytes: [0x89, 0x50, 0x4e, 0x47], what: 'a picture' },
  { bytes: [0xff, 0xd8, 0xff], what: 'a picture' },
];

/** Looks at the size and the first bytes only: null when the content may be a text table, else why not. */
export function problemOfContent(bytes: Uint8Array): WeatherProblem | null {
  if (bytes.length > WEATHER_FILE_LIMIT_BYTES) return problemOfSize(bytes.length);
  const whole = { line: null, column: null, columnName: null, value: null };
  if (bytes.length === 0) {
    return { ...whole, reason: 'The file is empty.', fix: 'Download or export it again.' };
  }
  const signature = SIGNATURES.find(({ bytes: start }) => start.every((byte, at) => bytes[at] === byte));
  if (signature !== undefined) {
    return {
      ...whole,
      reason: `The content is ${signature.what}, whatever the file's name says.`,
      fix: 'Choose the weather table itself, unpacked, as plain text in UTF-8 or Latin-1.',
    };
  }
  if (bytes.includes(0)) {
    return {
      ...whole,
      reason: 'The content is binary, not text.',
      fix: 'Choose the weather table as plain text in UTF-8 or Latin-1.',
    };
  }
  return null;
}

/** For those who know a file's size before they read it: null when it is within the limit. */
export function problemOfSize(sizeBytes: number): WeatherProblem | null {
  if (sizeBytes <= WEATHER_FILE_LIMIT_BYTES) return null;
  return {
    line: null,
    column: null,
    columnName: null,
    value: null,
    reason: `The file has ${(sizeBytes / 1024 / 1024).toFixed(1)} MiB; at most ${WEATHER_FILE_LIMIT_BYTES / 1024 / 1024} MiB are read.`,
    fix: 'Cut it to one year.',
  };
}

/** Text of a file in UTF-8 (with or without byte order mark), else in Latin-1, which cannot fail. */
export function decodeText(bytes: Uint8Array): string {
  try {
    return new TextDecoder('utf-8', { fatal: true }).decode(bytes);
  } catch {
    return new TextDecoder('windows-1252').decode(bytes);
  }
}

/** A line of a text. */
export interface TextLine {
  readonly content: string;
  /** From 1. */
  readonly number: number;
  /** Index of the first character after the line and its end. */
  readonly next: number;
}

/** The lines of a text one after another; CRLF, LF and CR end a line. */
export function* linesOf(text: string): Generator<TextLine> {
  const ending = /\r\n|\n|\r/g;
  let start = 0;
  for (let number = 1; start < text.length; number += 1) {
    const match = ending.exec(text);
    const end = match === null ? text.length : match.index;
    const next = match === null ? text.length : ending.lastIndex;
    yield { content: text.slice(start, end), number, next };
    start = next;
  }
}
