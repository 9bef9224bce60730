import { WEATHER_CHANNELS, type WeatherChannel } from '@noonwell/engine';
import type { TableDecimalMark } from '@noonwell/schema';
import { channelOf, type Heading } from './headings.js';
import { isMissingNumber, isMissingWord, parseCell } from './numbers.js';
import type { TableUnit } from './units.js';

/** What the cells of a column hold. */
export interface ColumnValues {
  readonly numbers: number;
  readonly missing: number;
  /** Neither numbers nor missing. */
  readonly others: number;
  /** NaN without numbers. */
  readonly lowest: number;
  readonly highest: number;
}

/** Counts what a column holds, row by row; marks for "missing" do not stretch the range. */
export class ColumnCount implements ColumnValues {
  numbers = 0;
  missing = 0;
  others = 0;
  lowest = NaN;
  highest = NaN;

  constructor(private readonly decimalMark: TableDecimalMark) {}

  see(cell: string): void {
    const value = parseCell(cell, this.decimalMark);
    if (Number.isNaN(value)) {
      if (isMissingWord(cell)) this.missing += 1;
      else this.others += 1;
    } else if (value < -90 && isMissingNumber(value)) {
      this.missing += 1;
    } else {
      this.numbers += 1;
      // A comparison with NaN is false, so the first value replaces it.
      if (!(value >= this.lowest)) this.lowest = value;
      if (!(value <= this.highest)) this.highest = value;
    }
  }
}

export interface ColumnGuess {
  /** From 1. */
  readonly column: number;
  readonly unit: TableUnit;
  /** Whether the heading names the unit, or the size of the values suggests it. */
  readonly unitFrom: 'heading' | 'values';
}

/** The column that each channel's heading names, with its unit. Channels without one are left out. */
export function guessColumns(
  headings: readonly Heading[],
  values: readonly ColumnValues[],
): Partial<Record<WeatherChannel, ColumnGuess>> {
  const guesses: Partial<Record<WeatherChannel, ColumnGuess>> = {};
  for (const channel of WEATHER_CHANNELS) {
    const at = headings.findIndex(
      (heading, column) => channelOf(heading) === channel && (values[column]?.numbers ?? 0) > 0,
    );
    const heading = headings[at];
    const count = values[at];
    if (heading === undefined || count === undefined) continue;
    guesses[channel] =
      heading.unit === null
        ? { column: at + 1, unit: unitOfValues(channel, count), unitFrom: 'values' }
        : { column: at + 1, unit: heading.unit, unitFrom: 'heading' };
  }
  return guesses;
}

/** The unit in which the values of a channel have an everyday size (own choice of limits). */
export function unitOfValues(channel: WeatherChannel, { lowest, highest }: ColumnValues): TableUnit {
  switch (channel) {
    case 'dniWm2':
    case 'ghiWm2':
    case 'dhiWm2':
      return highest <= 2 ? 'kW/m²' : highest <= 6 ? 'MJ/m²' : highest > 2000 ? 'kJ/m²' : 'W/m²';
    case 'dryBulbC':
      return lowest > 170 ? 'K' : highest > 60 ? '°F' : '°C';
    case 'windMs':
      return 'm/s';
    case 'relativeHumidityPct':
      return highest <= 1.1 ? '1' : '%';
    case 'pressurePa':
      return highest > 30_000 ? 'Pa' : highest > 200 ? 'hPa' : 'kPa';
  }
}
