import { parseNumber, splitCells } from '../epw/cells.js';
import type { ProblemList } from '../problem.js';
import type { WeatherHeader } from '../result.js';

export interface Tmy3Place {
  readonly header: WeatherHeader;
  readonly latitudeDeg: number;
  readonly longitudeDeg: number;
  readonly altitudeM: number;
  readonly utcOffsetHours: number;
}

/** Cells of the first line after number, name and state. Source: NREL/TP-581-43156, table of the header. */
const FIELDS = [
  { key: 'utcOffsetHours', cell: 4, name: 'time zone', unit: 'h from UTC', low: -12, high: 14 },
  { key: 'latitudeDeg', cell: 5, name: 'latitude', unit: '°, north positive', low: -90, high: 90 },
  { key: 'longitudeDeg', cell: 6, name: 'longitude', unit: '°, east positive', low: -180, high: 180 },
  { key: 'altitudeM', cell: 7, name: 'elevation', unit: 'm', low: -500, high: 9000 },
] as const;

/** The station of line 1; null (with problems added) where its numbers cannot be read. */
export function readStation(line: string, problems: ProblemList): Tmy3Place | null {
  const cells = splitCells(line).map((cell) => cell.replace(/\p{Cc}+/gu, ' ').trim());
  const place = { utcOffsetHours: 0, latitudeDeg: 0, longitudeDeg: 0, altitudeM: 0 };
  let sound = true;
  for (const { key, cell, name, unit, low, high } of FIELDS) {
    const text = cells[cell - 1] ?? '';
    const value = parseNumber(text);
    if (value >= low && value <= high) {
      place[key] = value;
      continue;
    }
    sound = false;
    problems.add({
      line: 1,
      column: cell,
      columnName: name,
      value: text,
      reason: `The ${name} of the station ${text === '' ? 'is missing' : `is "${text.slice(0, 60)}"`}.`,
      fix: `Line 1 holds number, name, state, time zone, latitude, longitude, elevation: write the ${name} from ${low} to ${high} (${unit}).`,
    });
  }
  if (!sound) return null;
  const [wmo = '', city = '', region = ''] = cells.map((cell) => cell.slice(0, 120));
  return {
    ...place,
    header: {
      placeName: [city, region].filter((part) => part !== '').join(', '),
      city,
      region,
      country: '',
      source: '',
      wmo,
    },
  };
}
