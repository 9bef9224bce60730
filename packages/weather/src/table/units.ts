import type { WeatherChannel } from '@noonwell/engine';
import { TABLE_UNITS } from '@noonwell/schema';

export type TableUnit = (typeof TABLE_UNITS)[WeatherChannel][number];

/** How a unit becomes the channel's own: value × factor + offset; energies also ÷ the record's hours. */
interface Conversion {
  readonly factor: number;
  readonly offset?: number;
  readonly perInterval?: true;
}

/** Source: SI and its definitions of hour, bar and °C; international knot 1852 m/h, mile 1609.344 m. */
const CONVERSIONS: Readonly<Record<TableUnit, Conversion>> = {
  'W/m²': { factor: 1 },
  'kW/m²': { factor: 1000 },
  'Wh/m²': { factor: 1, perInterval: true },
  'kJ/m²': { factor: 1 / 3.6, perInterval: true },
  'MJ/m²': { factor: 1 / 0.0036, perInterval: true },
  '°C': { factor: 1 },
  K: { factor: 1, offset: -273.15 },
  '°F': { factor: 5 / 9, offset: -160 / 9 },
  'm/s': { factor: 1 },
  'km/h': { factor: 1 / 3.6 },
  kn: { factor: 1852 / 3600 },
  mph: { factor: 0.44704 },
  '%': { factor: 1 },
  '1': { factor: 100 },
  Pa: { factor: 1 },
  hPa: { factor: 100 },
  mbar: { factor: 100 },
  kPa: { factor: 1000 },
};

/** Factor and offset that take a value of a unit to the channel's own. */
export function conversionOf(unit: TableUnit, intervalMinutes: number): { factor: number; offset: number } {
  const { factor, offset = 0, perInterval } = CONVERSIONS[unit];
  return { factor: perInterval === true ? (factor * 60) / intervalMinutes : factor, offset };
}

/** Spellings met in headings, without blanks and in lower case. */
const SPELLINGS: Readonly<Record<string, TableUnit>> = {
  'w/m²': 'W/m²',
  'w/m2': 'W/m²',
  'w/m^2': 'W/m²',
  'w/m**2': 'W/m²',
  'wm-2': 'W/m²',
  'w.m-2': 'W/m²',
  'kw/m²': 'kW/m²',
  'kw/m2': 'kW/m²',
  'kw/m^2': 'kW/m²',
  'wh/m²': 'Wh/m²',
  'wh/m2': 'Wh/m²',
  'wh/m^2': 'Wh/m²',
  'kj/m²': 'kJ/m²',
  'kj/m2': 'kJ/m²',
  'kj/m^2': 'kJ/m²',
  'mj/m²': 'MJ/m²',
  'mj/m2': 'MJ/m²',
  'mj/m^2': 'MJ/m²',
  '°c': '°C',
  c: '°C',
  degc: '°C',
  celsius: '°C',
  ºc: '°C',
  k: 'K',
  kelvin: 'K',
  '°f': '°F',
  f: '°F',
  degf: '°F',
  fahrenheit: '°F',
  'm/s': 'm/s',
  'm.s-1': 'm/s',
  'ms-1': 'm/s',
  'm/sec': 'm/s',
  'km/h': 'km/h',
  kmh: 'km/h',
  kn: 'kn',
  kt: 'kn',
  knots: 'kn',
  mph: 'mph',
  '%': '%',
  percent: '%',
  pa: 'Pa',
  hpa: 'hPa',
  mbar: 'mbar',
  mb: 'mbar',
  millibar: 'mbar',
  kpa: 'kPa',
};

/** The unit that a text names; null where it names none that is known. */
export function unitOf(text: string): TableUnit | null {
  const spelling = text.replace(/\s+/g, '').toLowerCase();
  return Object.hasOwn(SPELLINGS, spelling) ? (SPELLINGS[spelling] ?? null) : null;
}

/** Whether values of a unit can be those of a channel. */
export function unitFits(channel: WeatherChannel, unit: string): unit is TableUnit {
  const units: readonly string[] = TABLE_UNITS[channel];
  return units.includes(unit);
}
