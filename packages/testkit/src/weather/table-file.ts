import { WEATHER_CHANNELS, type WeatherChannel, type WeatherYear } from '@noonwell/engine';
import type { TableClock, TableDelimiter, TableLabel, TableStatement } from '@noonwell/schema';
import { applyRowDefect, type RowDefect } from './row-defects.js';
import { fileOfLines, type TextFileOptions } from './text.js';

/** Ways in which a time stamp is written. */
export const TABLE_TIMES = ['iso', 'isoT', 'compact', 'us', 'dayFirst', 'dateAndTime', 'parts'] as const;
export type TableTime = (typeof TABLE_TIMES)[number] | 'isoUtcOffset';

/** Units in which the writer can write a channel, first the one it takes by itself. */
export const TABLE_FILE_UNITS = {
  dniWm2: ['W/m²', 'kW/m²', 'MJ/m²'],
  ghiWm2: ['W/m²', 'kW/m²', 'MJ/m²'],
  dhiWm2: ['W/m²', 'kW/m²', 'MJ/m²'],
  dryBulbC: ['°C', 'K', '°F'],
  windMs: ['m/s', 'km/h', 'mph'],
  relativeHumidityPct: ['%', '1'],
  pressurePa: ['Pa', 'hPa', 'kPa'],
} as const satisfies Readonly<Record<WeatherChannel, readonly string[]>>;
export type TableFileUnits = { readonly [C in WeatherChannel]?: (typeof TABLE_FILE_UNITS)[C][number] };

export interface TableFileOptions extends TextFileOptions {
  readonly delimiter?: TableDelimiter;
  readonly decimalMark?: 'point' | 'comma';
  readonly time?: TableTime;
  readonly label?: TableLabel;
  readonly clock?: TableClock;
  readonly units?: TableFileUnits;
  /** Whether units stand in the headings, in a line below them, or nowhere. */
  readonly unitsIn?: 'heading' | 'line' | 'nowhere';
  readonly headings?: Partial<Record<WeatherChannel, string>>;
  readonly leaveOut?: readonly WeatherChannel[];
  readonly linesBefore?: readonly string[];
  readonly linesAfter?: readonly string[];
  readonly defects?: readonly RowDefect[];
}

const HEADINGS: Readonly<Record<WeatherChannel, string>> = {
  dniWm2: 'DNI',
  ghiWm2: 'GHI',
  dhiWm2: 'DHI',
  dryBulbC: 'Air temperature',
  windMs: 'Wind speed',
  relativeHumidityPct: 'Relative humidity',
  pressurePa: 'Station pressure',
};
const TIME_HEADINGS: Readonly<Record<TableTime, readonly string[]>> = {
  iso: ['Time'],
  isoT: ['Time'],
  isoUtcOffset: ['Time'],
  compact: ['Time'],
  us: ['Time'],
  dayFirst: ['Time'],
  dateAndTime: ['Date', 'Time'],
  parts: ['Year', 'Month', 'Day', 'Hour', 'Minute'],
};
const DELIMITERS: Readonly<Record<TableDelimiter, string>> = {
  ',': ',',
  ';': ';',
  tab: '\t',
  '|': '|',
  space: ' ',
};
/** Digits that keep a value to about a millionth of its channel's range, in any unit. */
const DIGITS = 7;

/** Column of a channel, from 1, where none is left out. */
export function tableColumn(channel: WeatherChannel, time: TableTime = 'iso'): number {
  return TIME_HEADINGS[time].length + 1 + WEATHER_CHANNELS.indexOf(channel);
}

/** A plain table as bytes, sound or with the damage asked for. */
export function tableFile(year: WeatherYear, options: TableFileOptions = {}): Uint8Array<ArrayBuffer> {
  const { time = 'iso', label = 'end', clock = 'localStandard', unitsIn = 'heading' } = options;
  const channels = WEATHER_CHANNELS.filter((channel) => options.leaveOut?.includes(channel) !== true);
  const delimiter = DELIMITERS[options.delimiter ?? ','];
  const unitOf = (channel: WeatherChannel) => options.units?.[channel] ?? TABLE_FILE_UNITS[channel][0];
  const heading = (channel: WeatherChannel) => {
    const name = options.headings?.[channel] ?? HEADINGS[channel];
    return unitsIn === 'heading' ? `${name} [${unitOf(channel)}]` : name;
  };
  // Between blanks a heading may hold none.
  const asCell = (text: string) => (delimiter === ' ' ? text.replaceAll(' ', '_') : text);
  const head = [[...TIME_HEADINGS[time], ...channels.map(heading)].map(asCell).join(delimiter)];
  if (unitsIn === 'line') {
    head.push([...TIME_HEADINGS[time].map(() => ''), ...channels.map(unitOf)].join(delimiter));
  }
  const share = { start: 0, middle: 0.5, end: 1 }[label];
  const shiftMs =
    share * year.intervalMinutes * 60_000 - (clock === 'utc' ? year.utcOffsetHours * 3_600_000 : 0);
  let rows = Array.from(year.startLocalMs, (startMs, at) => {
    const numbers = channels.map((channel) => {
      const text = toUnit(year[channel][at]!, unitOf(channel), year.intervalMinutes);
      return options.decimalMark === 'comma' ? text.replace('.', ',') : text;
    });
    return [...timeCells(startMs + shiftMs, time, year.utcOffsetHours), ...numbers].join(delimiter);
  });
  for (const defect of options.defects ?? []) rows = applyRowDefect(rows, defect, delimiter);
  const isCut = options.defects?.some(({ kind }) => kind === 'truncated') ?? false;
  return fileOfLines(
    [...(options.linesBefore ?? []), ...head, ...rows, ...(options.linesAfter ?? [])],
    options,
    isCut,
  );
}

/** What must be stated about a table that `tableFile` wrote with these options, beside its headings. */
export function tableStatement(year: WeatherYear, options: TableFileOptions = {}): TableStatement {
  const { latitudeDeg, longitudeDeg, altitudeM, utcOffsetHours } = year;
  return {
    label: options.label ?? 'end',
    clock: options.clock ?? 'localStandard',
    place: { name: 'Test Field', latitudeDeg, longitudeDeg, altitudeM, utcOffsetHours },
  };
}

function timeCells(ms: number, time: TableTime, utcOffsetHours: number): string[] {
  const iso = new Date(ms).toISOString();
  const date = iso.slice(0, 10);
  const clock = iso.slice(11, 16);
  const [year = '', month = '', day = ''] = date.split('-');
  switch (time) {
    case 'iso':
      return [`${date} ${clock}`];
    case 'isoT':
      return [`${date}T${clock}:00`];
    case 'isoUtcOffset': {
      const sign = utcOffsetHours < 0 ? '-' : '+';
      const offset = new Date(Math.abs(utcOffsetHours) * 3_600_000).toISOString().slice(11, 16);
      return [`${date}T${clock}${sign}${offset}`];
    }
    case 'compact':
      return [`${year}${month}${day}:${clock.replace(':', '')}`];
    case 'us':
      return [`${Number(month)}/${Number(day)}/${year} ${clock}`];
    case 'dayFirst':
      return [`${day}.${month}.${year} ${clock}`];
    case 'dateAndTime':
      return [date, clock];
    case 'parts':
      return [year, month, day, clock.slice(0, 2), clock.slice(3)].map((part) => String(Number(part)));
  }
}

/** The value in another unit; written from the definitions, apart from the reader's own factors. */
function toUnit(value: number, unit: string, intervalMinutes: number): string {
  const converted: Readonly<Record<string, number>> = {
    'kW/m²': value / 1000,
    'MJ/m²': (value * intervalMinutes * 60) / 1e6,
    K: value + 273.15,
    '°F': 32 + 1.8 * value,
    'km/h': value * 3.6,
    mph: (value * 3600) / 1609.344,
    '1': value / 100,
    hPa: value / 100,
    kPa: value / 1000,
  };
  return String(Number((converted[unit] ?? value).toFixed(DIGITS)));
}
