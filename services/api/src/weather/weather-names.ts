import { nameSchema } from '@noonwell/schema';

const LONGEST_FILE_NAME = 200;
const LONGEST_NAME = 120;

/** The last part of what the browser called the file, readable: a label, never a path. */
export function fileLabel(sent: string): string {
  // multer reads the header's bytes as Latin-1; browsers send UTF-8.
  const text = Buffer.from(sent, 'latin1').toString('utf8');
  const last = text.split(/[/\\]/).at(-1) ?? '';
  const label = last.replace(/\p{Cc}/gu, '').trim();
  return label === '' ? 'weather file' : cut(label, LONGEST_FILE_NAME);
}

/** The first of the given names that can be one; the last resort stands at the end. */
export function firstUsableName(...candidates: readonly (string | undefined)[]): string {
  for (const candidate of candidates) {
    const name = nameSchema.safeParse(candidate === undefined ? undefined : cut(candidate, LONGEST_NAME));
    if (name.success) return name.data;
  }
  return 'Weather year';
}

/** The first characters, none cut in half. */
function cut(text: string, most: number): string {
  const part = text.slice(0, most);
  // A lone first half of a surrogate pair is not a character.
  return /[\uD800-\uDBFF]$/.test(part) ? part.slice(0, -1) : part;
}
