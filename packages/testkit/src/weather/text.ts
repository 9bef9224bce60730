/** How a text becomes the bytes of a file. */
export interface TextFileOptions {
  readonly lineEnd?: 'lf' | 'crlf' | 'cr';
  readonly encoding?: 'utf8' | 'utf8-bom' | 'latin1';
}

const LINE_ENDS = { lf: '\n', crlf: '\r\n', cr: '\r' } as const;

/** Lines as the bytes of a file. @param isCut the last line has no end, as in a file that stops within it */
export function fileOfLines(
  lines: readonly string[],
  { lineEnd = 'lf', encoding = 'utf8' }: TextFileOptions,
  isCut = false,
): Uint8Array<ArrayBuffer> {
  const end = LINE_ENDS[lineEnd];
  const text = lines.join(end) + (isCut ? '' : end);
  if (encoding === 'latin1') return Uint8Array.from(text, (character) => character.charCodeAt(0));
  return new TextEncoder().encode(encoding === 'utf8-bom' ? `\uFEFF${text}` : text);
}
