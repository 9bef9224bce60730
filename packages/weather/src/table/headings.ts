import { WEATHER_CHANNELS, type WeatherChannel } from '@noonwell/engine';
import { unitFits, unitOf, type TableUnit } from './units.js';

/** A heading taken apart: "Dry-bulb (C)" is the name "Dry-bulb" and the unit °C. */
export interface Heading {
  readonly text: string;
  readonly name: string;
  readonly unit: TableUnit | null;
}

/** @param unitText the cell of a line of units below the headings, where there is one */
export function readHeading(text: string, unitText = ''): Heading {
  const clean = text.replace(/\s+/g, ' ').trim().slice(0, 80);
  const below = unitOf(unitText.replace(/^[[(]\s*|\s*[\])]$/g, ''));
  if (below !== null) return { text: `${clean} [${unitText.trim().slice(0, 20)}]`, name: clean, unit: below };
  const bracketed = /^(.*\S)\s*[[(]([^\][()]*)[\])]$/.exec(clean);
  const inBrackets = bracketed === null ? null : unitOf(bracketed[2] ?? '');
  if (bracketed !== null && inBrackets !== null) {
    return { text: clean, name: bracketed[1] ?? '', unit: inBrackets };
  }
  const trailing = /^(.*\S)[\s,_](?:in )?(\S+)$/.exec(clean);
  // One letter at the end is part of a name more often than a unit.
  const last = trailing === null || (trailing[2] ?? '').length < 2 ? null : unitOf(trailing[2] ?? '');
  if (trailing !== null && last !== null) return { text: clean, name: trailing[1] ?? '', unit: last };
  return { text: clean, name: clean, unit: null };
}

/** Names under which the channels stand in tables, in lower case with single blanks (common practice, no source). */
const NAMES: Readonly<Record<WeatherChannel, readonly string[]>> = {
  dniWm2: [
    'dni',
    'gb(n)',
    'bni',
    'direct normal',
    'direct normal irradiance',
    'direct normal irradiation',
    'direct normal radiation',
    'beam normal irradiance',
  ],
  ghiWm2: [
    'ghi',
    'g(h)',
    'global horizontal',
    'global horizontal irradiance',
    'global horizontal irradiation',
    'global horizontal radiation',
    'global irradiance',
  ],
  dhiWm2: [
    'dhi',
    'gd(h)',
    'dif',
    'diffuse',
    'diffuse horizontal',
    'diffuse horizontal irradiance',
    'diffuse horizontal irradiation',
    'diffuse horizontal radiation',
  ],
  dryBulbC: [
    'dry bulb',
    'dry bulb temperature',
    't2m',
    'temperature',
    'air temperature',
    'ambient temperature',
    'temp',
    'temp air',
    'tamb',
    'tair',
    't',
  ],
  windMs: ['wind speed', 'wspd', 'ws10m', 'ws', 'windspeed', 'wind'],
  relativeHumidityPct: ['relative humidity', 'rh', 'rhum', 'humidity', 'relhum'],
  pressurePa: ['pressure', 'station pressure', 'surface pressure', 'air pressure', 'sp', 'press'],
};

function plainName(name: string): string {
  return name
    .toLowerCase()
    .replace(/[-_\s]+/g, ' ')
    .trim();
}

/** The channel that a heading names; null where it names none, or its unit cannot be that channel's. */
export function channelOf({ name, unit }: Heading): WeatherChannel | null {
  const plain = plainName(name);
  const channel = WEATHER_CHANNELS.find((candidate) => NAMES[candidate].includes(plain)) ?? null;
  if (channel === null || (unit !== null && !unitFits(channel, unit))) return null;
  return channel;
}

/** Parts of a time stamp that stand in columns of their own, by heading. */
const TIME_PARTS = {
  year: ['year', 'yyyy', 'yr'],
  month: ['month', 'mm', 'mo'],
  day: ['day', 'dd', 'day of month'],
  hour: ['hour', 'hh', 'hr'],
  minute: ['minute', 'min', 'minutes'],
} as const;
export type TimePart = keyof typeof TIME_PARTS;

/** Index of the column whose heading names a part of the time stamp; −1 where none does. */
export function findTimePart(headings: readonly Heading[], part: TimePart): number {
  const names: readonly string[] = TIME_PARTS[part];
  return headings.findIndex(({ text }) => names.includes(plainName(text)));
}
