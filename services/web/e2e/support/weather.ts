import { readFileSync } from 'node:fs';
import { join } from 'node:path';
import { epwFile, syntheticYear, type EpwFileOptions } from '@noonwell/testkit';
import type { Page } from 'playwright-core';

export interface UploadFile {
  readonly name: string;
  /** Marked as made up by Noonwell itself. */
  readonly synthetic: boolean;
  readonly buffer: Buffer;
}

export function syntheticFile(name: string, options: EpwFileOptions = {}): UploadFile {
  return {
    name,
    synthetic: true,
    buffer: Buffer.from(epwFile(syntheticYear('tarn-lane'), options)),
  };
}

const folder = process.env['NOONWELL_WEATHER_DIR'] ?? '';
const DESERT_FILE = 'USA_CA_Barstow.Daggett.AP.723815_TMY3.epw';

/** The measured desert year where the folder of real files is given; null otherwise. */
export function desertFile(): UploadFile | null {
  if (folder === '') return null;
  return { name: DESERT_FILE, synthetic: false, buffer: readFileSync(join(folder, DESERT_FILE)) };
}

/** Drops a file on the weather page, as from a file manager. */
export async function dropFile(page: Page, file: UploadFile): Promise<void> {
  const transfer = await page.evaluateHandle(
    ({ name, base64 }) => {
      const data = new DataTransfer();
      const bytes = Uint8Array.from(atob(base64), (character) => character.charCodeAt(0));
      data.items.add(new File([bytes], name));
      return data;
    },
    { name: file.name, base64: file.buffer.toString('base64') },
  );
  await page.getByText('Drop a weather file here').dispatchEvent('drop', { dataTransfer: transfer });
  await transfer.dispose();
}
