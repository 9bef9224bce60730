import { WEEKDAYS } from '../calendar.js';
import { linesOf } from '../content.js';
import type { ProblemList } from '../problem.js';
import type { WeatherHeader } from '../result.js';
import { parseNumber, splitCells } from './cells.js';

export interface EpwPlace {
  readonly latitudeDeg: number;
  readonly longitudeDeg: number;
  readonly utcOffsetHours: number;
  readonly altitudeM: number;
}

export interface EpwHeader {
  readonly header: WeatherHeader;
  readonly place: EpwPlace;
  /** Null where DATA PERIODS names none. */
  readonly firstWeekday: number | null;
  /** Index of the first character and number of the first data line. */
  readonly dataStart: number;
  readonly dataLine: number;
}

/** The four numbers of the LOCATION line, in their order; cell 7 is the first of them in a well-formed line. */
const PLACE_FIELDS = [
  { key: 'latitudeDeg', name: 'latitude', unit: '°, north positive', low: -90, high: 90 },
  { key: 'longitudeDeg', name: 'longitude', unit: '°, east positive', low: -180, high: 180 },
  { key: 'utcOffsetHours', name: 'time zone', unit: 'h from UTC', low: -12, high: 14 },
  { key: 'altitudeM', name: 'elevation', unit: 'm', low: -500, high: 9000 },
] as const;
const FIRST_PLACE_CELL = 7;

/** Lines searched for DATA PERIODS: real headers have about eight. */
const LONGEST_HEADER = 1000;

/** Finds LOCATION and DATA PERIODS by name, never by count. Null (with problems added) where the file cannot be read on. */
export function readHeader(text: string, problems: ProblemList): EpwHeader | null {
  let location: { cells: string[]; line: number } | undefined;
  let periods: { cells: string[]; line: number; next: number } | undefined;
  for (const { content, number, next } of linesOf(text)) {
    const keyword = /^\s*"?(LOCATION|DATA PERIODS)\b/i.exec(content)?.[1]?.toUpperCase();
    if (keyword === 'LOCATION') location ??= { cells: splitCells(content), line: number };
    if (keyword === 'DATA PERIODS') periods = { cells: splitCells(content), line: number, next };
    if (periods !== undefined || number >= LONGEST_HEADER) break;
  }

  if (location === undefined) {
    problems.add({
      reason: 'There is no LOCATION line, so the place is unknown.',
      fix: 'Add it as the first line: LOCATION,city,region,country,source,WMO,latitude,longitude,UTC offset,elevation.',
    });
  }
  if (periods === undefined) {
    problems.add({
      reason: 'There is no DATA PERIODS line, after which the hours begin.',
      fix: 'Check that the file is a whole EPW file; download it again.',
    });
    return null;
  }
  const perHour = periods.cells[2]?.trim() ?? '';
  if (perHour !== '' && parseNumber(perHour) !== 1) {
    problems.add({
      line: periods.line,
      column: 3,
      columnName: 'records per hour',
      value: perHour,
      reason: `DATA PERIODS states "${perHour}" records an hour; EPW files are read with 1.`,
      fix: 'Give the file with hourly records.',
    });
    return null;
  }
  const place = location === undefined ? null : readPlace(location.cells, location.line, problems);
  if (location === undefined || place === null) return null;
  return {
    header: readNames(place.names),
    place: place.numbers,
    firstWeekday: weekdayOf(periods.cells[4]),
    dataStart: periods.next,
    dataLine: periods.line + 1,
  };
}

function readPlace(
  cells: string[],
  line: number,
  problems: ProblemList,
): { names: string[]; numbers: EpwPlace } | null {
  const filled = trimmedEnd(cells);
  // A comma inside an unquoted name moves the numbers to the right: they are then the last four cells.
  const starts = [FIRST_PLACE_CELL, filled.length - PLACE_FIELDS.length + 1].filter((cell) => cell >= 2);
  for (const start of starts) {
    const values = PLACE_FIELDS.map((_, at) => parseNumber(cells[start - 1 + at] ?? ''));
    if (PLACE_FIELDS.every(({ low, high }, at) => values[at]! >= low && values[at]! <= high)) {
      const [latitudeDeg, longitudeDeg, utcOffsetHours, altitudeM] = values as [
        number,
        number,
        number,
        number,
      ];
      return {
        names: cells.slice(0, start - 1),
        numbers: { latitudeDeg, longitudeDeg, utcOffsetHours, altitudeM },
      };
    }
  }
  PLACE_FIELDS.forEach(({ name, unit, low, high }, at) => {
    const value = cells[FIRST_PLACE_CELL - 1 + at]?.trim() ?? '';
    const number = parseNumber(value);
    if (number >= low && number <= high) return;
    const shown =
      value === ''
        ? 'is missing'
        : Number.isNaN(number)
          ? `"${value}" is not a number`
          : `${value} is out of range`;
    problems.add({
      line,
      column: FIRST_PLACE_CELL + at,
      columnName: name,
      value,
      reason: `The ${name} of the LOCATION line ${shown}.`,
      fix: `Write the ${name} from ${low} to ${high} (${unit}).`,
    });
  });
  return null;
}

function trimmedEnd(cells: readonly string[]): string[] {
  const filled = [...cells];
  while (filled.length > 0 && filled.at(-1)?.trim() === '') filled.pop();
  return filled;
}

/** Names before the numbers: source and station number are the last two, country and region the two before, the rest is the city. */
function readNames(cells: readonly string[]): WeatherHeader {
  const names = cells.slice(1).map(cleanName);
  const [region = '', country = '', source = '', wmo = ''] = names.slice(-4);
  const city = names
    .slice(0, Math.max(0, names.length - 4))
    .filter((name) => name !== '')
    .join(', ');
  const placeName = [city, region, country].filter((name) => name !== '').join(', ');
  return { placeName, city, region, country, source, wmo };
}

/** One line without control characters; the marks for "not stated" become empty. */
function cleanName(cell: string): string {
  const name = cell
    .replace(/\p{Cc}+/gu, ' ')
    .replace(/\s+/g, ' ')
    .trim();
  return /^(na|n\/a|-)$/i.test(name) ? '' : name.slice(0, 120);
}

function weekdayOf(cell: string | undefined): number | null {
  const text = cell?.trim().toLowerCase() ?? '';
  const weekday = WEEKDAYS.findIndex((name) => name.toLowerCase() === text);
  return weekday === -1 ? null : weekday;
}
