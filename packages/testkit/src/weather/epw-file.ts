import type { WeatherYear } from '@noonwell/engine';
import { writeEpw } from '@noonwell/weather';
import { applyDefect, type EpwDefect } from './defects.js';
import { fileOfLines, type TextFileOptions } from './text.js';

export interface EpwFileOptions extends TextFileOptions {
  readonly city?: string;
  readonly region?: string;
  readonly country?: string;
  readonly source?: string;
  readonly wmo?: string;
  readonly comment?: string;
  /** Applied in this order. */
  readonly defects?: readonly EpwDefect[];
}

/** An EPW file as bytes, sound or with the damage asked for. */
export function epwFile(year: WeatherYear, options: EpwFileOptions = {}): Uint8Array<ArrayBuffer> {
  const {
    city = 'Test Field',
    region = 'TF',
    country = 'Nowhere',
    source = 'synthetic',
    wmo = '000000',
  } = options;
  const comment = options.comment ?? 'synthetic';
  const text = writeEpw(year, { header: { city, region, country, source, wmo }, comment });
  let lines = text.trimEnd().split('\n');
  for (const defect of options.defects ?? []) lines = applyDefect(lines, defect);
  const isCut = options.defects?.some(({ kind }) => kind === 'truncated') ?? false;
  return fileOfLines(lines, options, isCut);
}

/** A file of a given size whose beginning is a sound EPW file: 65 MiB of it are too many. */
export function paddedEpwFile(year: WeatherYear, bytes: number): Uint8Array<ArrayBuffer> {
  const padded = new Uint8Array(bytes).fill(0x20);
  padded.set(epwFile(year).subarray(0, bytes));
  return padded;
}

/** A PDF document's beginning, to be named anything. */
export function pdfFile(): Uint8Array<ArrayBuffer> {
  return new TextEncoder().encode(
    '%PDF-1.7\n1 0 obj\n<< /Type /Catalog >>\nendobj\ntrailer\n<< /Root 1 0 R >>\n%%EOF\n',
  );
}
