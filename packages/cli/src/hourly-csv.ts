import { randomUUID } from 'node:crypto';
import { createWriteStream } from 'node:fs';
import { rename, rm } from 'node:fs/promises';
import { Readable } from 'node:stream';
import { pipeline } from 'node:stream/promises';
import { ACCOUNTS, STATE_CHANNELS, type HourlyColumns } from '@noonwell/engine';

interface CsvColumn {
  readonly heading: string;
  readonly values: Float64Array;
}

/** Digits kept: sums over a year stay within 1e-9 of the summary. */
const DIGITS = 10;

/**
 * Rows of the hourly table: a heading with units, then one row for each weather record that begins with the
 * record's start in local standard time.
 */
export function* hourlyCsvRows(hourly: HourlyColumns, utcOffsetHours: number): Generator<string> {
  const columns: CsvColumn[] = [
    ...ACCOUNTS.map((account) => ({ heading: `${account} [W]`, values: hourly.powersW[account] })),
    ...STATE_CHANNELS.map(({ key, unit }) => ({ heading: `${key} [${unit}]`, values: hourly.states[key] })),
    ...hourly.tankLayersC.map((values, layer) => ({ heading: `tankLayer${layer} [°C]`, values })),
  ];
  yield `start [local standard time ${offsetText(utcOffsetHours)}],${columns.map(({ heading }) => heading).join(',')}\n`;
  for (let record = 0; record < hourly.startLocalMs.length; record++) {
    const start = new Date(hourly.startLocalMs[record]!).toISOString().slice(0, 16);
    yield `${start},${columns.map(({ values }) => cell(values[record]!)).join(',')}\n`;
  }
}

function cell(value: number): string {
  return String(Number(value.toPrecision(DIGITS)));
}

/** "UTC-08:00" */
function offsetText(hours: number): string {
  const minutes = Math.round(Math.abs(hours) * 60);
  const two = (number: number) => String(number).padStart(2, '0');
  return `UTC${hours < 0 ? '-' : '+'}${two(Math.floor(minutes / 60))}:${two(minutes % 60)}`;
}

/** Writes the table beside its place first, so that a failure leaves neither half a table nor a lost old one. */
export async function writeHourlyCsv(path: string, rows: Iterable<string>): Promise<void> {
  const unfinished = `${path}.${randomUUID()}.part`;
  try {
    await pipeline(Readable.from(rows), createWriteStream(unfinished, { flags: 'wx' }));
    await rename(unfinished, path);
  } catch (error) {
    await rm(unfinished, { force: true });
    throw error;
  }
}
