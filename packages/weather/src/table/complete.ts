import { WEATHER_CHANNELS, type WeatherChannel } from '@noonwell/engine';
import {
  TABLE_CLOCKS,
  TABLE_LABELS,
  TABLE_UNITS,
  type TableClock,
  type TableDateOrder,
  type TableLabel,
  type TableStatement,
} from '@noonwell/schema';
import { CHANNEL_NAMES } from './channels.js';
import type { ColumnGuess } from './guess.js';
import { channelOf, type Heading } from './headings.js';
import { unitFits, type TableUnit } from './units.js';

/** A part of the statement that must still be made, and how. */
export interface MissingStatement {
  /** "place.latitudeDeg": path into the statement. */
  readonly path: string;
  readonly reason: string;
  readonly fix: string;
}

/** A column as it is read. */
export interface MatchedColumn {
  readonly channel: WeatherChannel;
  /** From 1. */
  readonly column: number;
  readonly unit: TableUnit;
}

/** Everything that reading needs: stated, or written in the table itself. */
export interface CompleteStatement {
  readonly label: TableLabel;
  readonly clock: TableClock;
  readonly dateOrder: TableDateOrder;
  readonly placeName: string;
  readonly latitudeDeg: number;
  readonly longitudeDeg: number;
  readonly altitudeM: number;
  readonly utcOffsetHours: number;
  readonly columns: readonly MatchedColumn[];
  /** Channels whose column was taken from the headings, without a statement. */
  readonly fromHeadings: readonly WeatherChannel[];
}

const PLACE = {
  latitudeDeg: 'latitude [°, north positive]',
  longitudeDeg: 'longitude [°, east positive]',
  altitudeM: 'altitude [m]',
  utcOffsetHours: 'offset of local standard time from UTC [h]',
} as const;

interface Found {
  readonly headings: readonly Heading[];
  readonly dateOrder: TableDateOrder | null;
  /** Only for the advice in the sentences; none is applied. */
  readonly guesses?: Partial<Record<WeatherChannel, ColumnGuess>>;
}

/**
 * Joins what was stated with what the table says in so many words (a heading with name and unit). What
 * neither says comes back as missing: nothing is assumed.
 */
export function completeStatement(
  found: Found,
  stated: TableStatement,
): { complete: CompleteStatement; missing: null } | { complete: null; missing: MissingStatement[] } {
  const missing: MissingStatement[] = [];
  const { label, clock, place = {} } = stated;
  if (label === undefined) {
    missing.push({
      path: 'label',
      reason: 'It is not stated what a time label names: the start, the middle or the end of its interval.',
      fix: `State one of ${TABLE_LABELS.join(', ')}. It is checked against the sun.`,
    });
  }
  if (clock === undefined) {
    missing.push({
      path: 'clock',
      reason: 'It is not stated which clock the time labels follow.',
      fix: `State one of ${TABLE_CLOCKS.join(', ')}; tables with daylight saving time are not read.`,
    });
  }
  for (const key of ['latitudeDeg', 'longitudeDeg', 'altitudeM', 'utcOffsetHours'] as const) {
    if (place[key] === undefined) {
      missing.push({
        path: `place.${key}`,
        reason: `The ${PLACE[key]} is not stated.`,
        fix: 'A plain table does not say where it was measured: state it.',
      });
    }
  }
  if (found.dateOrder === null) {
    missing.push({
      path: 'layout.dateOrder',
      reason: 'The dates do not show whether the day or the month comes first.',
      fix: 'State dayFirst or monthFirst.',
    });
  }
  const { columns, fromHeadings } = matchColumns(found, stated, missing);
  const { latitudeDeg, longitudeDeg, altitudeM, utcOffsetHours } = place;
  const { dateOrder } = found;
  if (
    missing.length > 0 ||
    label === undefined ||
    clock === undefined ||
    dateOrder === null ||
    latitudeDeg === undefined ||
    longitudeDeg === undefined ||
    altitudeM === undefined ||
    utcOffsetHours === undefined
  ) {
    return { complete: null, missing };
  }
  return {
    complete: {
      label,
      clock,
      dateOrder,
      placeName: place.name ?? '',
      latitudeDeg,
      longitudeDeg,
      altitudeM,
      utcOffsetHours,
      columns,
      fromHeadings,
    },
    missing: null,
  };
}

function matchColumns(
  { headings, guesses = {} }: Found,
  stated: TableStatement,
  missing: MissingStatement[],
): { columns: MatchedColumn[]; fromHeadings: WeatherChannel[] } {
  const columns: MatchedColumn[] = [];
  const fromHeadings: WeatherChannel[] = [];
  for (const channel of WEATHER_CHANNELS) {
    const match = stated.columns?.[channel];
    const path = `columns.${channel}`;
    if (match === null) continue;
    const column = match?.column ?? headings.findIndex((heading) => channelOf(heading) === channel) + 1;
    const heading = headings[column - 1];
    if (column === 0) {
      // Pressure alone can follow from the altitude; that is noted with the year.
      if (channel === 'pressurePa') continue;
      missing.push({
        path: `${path}.column`,
        reason: `No heading names the ${CHANNEL_NAMES[channel]}.`,
        fix: `State the number of its column, from 1 to ${headings.length}, and its unit.`,
      });
      continue;
    }
    if (heading === undefined) {
      missing.push({
        path: `${path}.column`,
        reason: `There is no column ${column}: the table has ${headings.length}.`,
        fix: `State a number from 1 to ${headings.length}.`,
      });
      continue;
    }
    const taken = columns.find((other) => other.column === column);
    if (taken !== undefined) {
      missing.push({
        path: `${path}.column`,
        reason: `Column ${column} ("${heading.text}") is already the ${CHANNEL_NAMES[taken.channel]}.`,
        fix: 'State another column for one of them.',
      });
      continue;
    }
    const unit =
      match?.unit ?? (heading.unit !== null && unitFits(channel, heading.unit) ? heading.unit : null);
    if (unit === null) {
      const guess = guesses[channel];
      const advice = guess?.column === column ? ` Its values look like ${guess.unit}.` : '';
      missing.push({
        path: `${path}.unit`,
        reason: `The heading of column ${column} ("${heading.text}") names no unit for the ${CHANNEL_NAMES[channel]}.`,
        fix: `State one of ${TABLE_UNITS[channel].join(', ')}, with the column.${advice}`,
      });
      continue;
    }
    if (match === undefined) fromHeadings.push(channel);
    columns.push({ channel, column, unit });
  }
  return { columns, fromHeadings };
}
