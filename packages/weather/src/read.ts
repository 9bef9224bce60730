import { decodeText, problemOfContent } from './content.js';
import { epwReader } from './epw/reader.js';
import { tmy3Reader } from './tmy3/reader.js';
import type { WeatherReadOptions, WeatherReadResult } from './result.js';

/** A format: recognised by its content. */
export interface WeatherReader {
  readonly format: string;
  readonly label: string;
  /** Usual file name endings, for the file chooser only. */
  readonly extensions: readonly string[];
  /** Looks at the beginning of the text; a cut character at its end may make it Latin-1, so names are sought in ASCII. */
  readonly recognises: (head: string, bytes: Uint8Array) => boolean;
  readonly read: (bytes: Uint8Array, options: WeatherReadOptions) => WeatherReadResult;
}

/** Every format that is read, the most particular first. A new format is a new file and one line here. */
export const WEATHER_READERS: readonly WeatherReader[] = [epwReader, tmy3Reader];

const HEAD_BYTES = 16_384;

/**
 * Reads a weather file of any known format, chosen by its content; the name serves messages only.
 * Never throws on bad content: it comes back refused, with places and reasons.
 */
export function readWeatherFile(
  bytes: Uint8Array,
  fileName: string,
  options: WeatherReadOptions = {},
): WeatherReadResult {
  const problem = problemOfContent(bytes);
  if (problem !== null) return { kind: 'refused', format: null, problems: [problem], problemCount: 1 };
  const head = decodeText(bytes.subarray(0, HEAD_BYTES));
  const reader = WEATHER_READERS.find(({ recognises }) => recognises(head, bytes));
  if (reader !== undefined) return reader.read(bytes, options);
  const known = WEATHER_READERS.map(({ label }) => label).join(', ');
  return {
    kind: 'refused',
    format: null,
    problems: [
      {
        line: 1,
        column: null,
        columnName: null,
        value: firstLine(head),
        reason: `${fileName === '' ? 'The file' : `"${fileName}"`} is text, but not of a format that is read here.`,
        fix: `Formats read: ${known}.`,
      },
    ],
    problemCount: 1,
  };
}

function firstLine(head: string): string {
  const line = head.split(/\r\n|\n|\r/, 1)[0] ?? '';
  return line.length > 60 ? `${line.slice(0, 60)}…` : line;
}
