import type { WeatherChannel, WeatherFlag } from '@noonwell/engine';

/** Cells of a whole data line. Source: the format's public data dictionary. */
export const EPW_CELLS = 35;

/** Place of each part of the time stamp, counted from 1. The minute (5) has no reliable meaning and is not read. */
export const EPW_TIME_CELLS = { year: 1, month: 2, day: 3, hour: 4, minute: 5 } as const;

interface ColumnBase {
  readonly channel: WeatherChannel;
  /** Cell of the data line, counted from 1. */
  readonly cell: number;
  readonly name: string;
  readonly unit: string;
  /** Values from here on mean "missing"; an empty cell does too. */
  readonly missingFrom: number;
  /** How "missing" is written. */
  readonly missingText: string;
  /** Digits after the point when written. */
  readonly digits: number;
}

/** What is done with a missing value: gaps of a few hours filled and flagged, pressure from the altitude, irradiance never. */
type WhenMissing =
  | { readonly whenMissing: 'fillShortGaps'; readonly filledFlag: WeatherFlag }
  | { readonly whenMissing: 'takeFromAltitude' }
  | { readonly whenMissing: 'refuse' };

export type EpwColumn = ColumnBase & WhenMissing;

/**
 * Columns that make a weather year, with their missing marks. Source: the format's public data dictionary.
 * What a value may be is the engine's WEATHER_CHANNEL_RANGE; humidity over 100 % is taken as 100 %.
 */
export const EPW_COLUMNS: readonly EpwColumn[] = [
  {
    channel: 'dryBulbC',
    cell: 7,
    name: 'dry-bulb temperature',
    unit: '°C',
    missingFrom: 99.9,
    missingText: '99.9',
    whenMissing: 'fillShortGaps',
    filledFlag: 'filledDryBulb',
    digits: 1,
  },
  {
    channel: 'relativeHumidityPct',
    cell: 9,
    name: 'relative humidity',
    unit: '%',
    missingFrom: 999,
    missingText: '999',
    whenMissing: 'fillShortGaps',
    filledFlag: 'filledHumidity',
    digits: 0,
  },
  {
    channel: 'pressurePa',
    cell: 10,
    name: 'station pressure',
    unit: 'Pa',
    missingFrom: 999999,
    missingText: '999999',
    whenMissing: 'takeFromAltitude',
    digits: 0,
  },
  {
    channel: 'ghiWm2',
    cell: 14,
    name: 'global horizontal irradiation',
    unit: 'Wh/m²',
    missingFrom: 9999,
    missingText: '9999',
    whenMissing: 'refuse',
    digits: 0,
  },
  {
    channel: 'dniWm2',
    cell: 15,
    name: 'direct normal irradiation',
    unit: 'Wh/m²',
    missingFrom: 9999,
    missingText: '9999',
    whenMissing: 'refuse',
    digits: 0,
  },
  {
    channel: 'dhiWm2',
    cell: 16,
    name: 'diffuse horizontal irradiation',
    unit: 'Wh/m²',
    missingFrom: 9999,
    missingText: '9999',
    whenMissing: 'refuse',
    digits: 0,
  },
  {
    channel: 'windMs',
    cell: 22,
    name: 'wind speed',
    unit: 'm/s',
    missingFrom: 999,
    missingText: '999',
    whenMissing: 'fillShortGaps',
    filledFlag: 'filledWind',
    digits: 1,
  },
];

/** The last cell that is read: a line must reach it. */
export const EPW_LAST_CELL_READ = Math.max(...EPW_COLUMNS.map((column) => column.cell));

/**
 * Irradiance from this up to 0 is the zero noise of an instrument: it is set to 0 and the record flagged.
 * Anything lower is refused. Half a unit of the format's printed precision.
 */
export const IRRADIANCE_NOISE_WM2 = -0.5;
