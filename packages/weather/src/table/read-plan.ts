import { WEATHER_CHANNELS, type WeatherChannel, type WeatherYear } from '@noonwell/engine';
import type { TableStatement } from '@noonwell/schema';
import { MONTHS, WEEKDAYS } from '../calendar.js';
import { doubts } from '../doubts.js';
import { ProblemList } from '../problem.js';
import type { WeatherHeader, WeatherReadOptions, WeatherReadResult, WeatherRefused } from '../result.js';
import { findSunOffset } from '../sun-offset.js';
import { summariseWeather } from '../summary.js';
import { TooLongLineError } from './blocks.js';
import { orderByCalendar, type CalendarOrder } from './calendar-order.js';
import type { ReadPlan } from './plan.js';
import { repairGaps } from './repair.js';
import { readRows, type TableRows } from './rows.js';

export interface PlanContext {
  readonly header: WeatherHeader;
  /** Sentences that stand before those of the reading. */
  readonly notes: readonly string[];
  readonly statement: TableStatement | null;
}

/** Reads a table whose layout is known. Never throws on bad content: it comes back refused, with places and reasons. */
export function readByPlan(
  bytes: Uint8Array,
  plan: ReadPlan,
  { header, notes: before, statement }: PlanContext,
  options: WeatherReadOptions,
): WeatherReadResult {
  const problems = new ProblemList();
  const notes = [...before];
  const rows = readSafely(bytes, plan, problems, options.onProgress);
  if (rows === null || problems.count > 0) return refused(plan.format, problems);
  if (rows.legendLines > 0) {
    notes.push(`${rows.legendLines} lines after the last record have no time label and were not read.`);
  }
  const order = orderByCalendar(rows, plan, notes, problems);
  if (order === null || problems.count > 0) return refused(plan.format, problems);
  const year = toYear(rows, order, plan);
  const first = new Date(year.startLocalMs[0]!);
  notes.push(
    `The year begins on a ${WEEKDAYS[year.firstWeekday]!}, as ${first.getUTCDate()} ${MONTHS[first.getUTCMonth()]!} ${first.getUTCFullYear()} did.`,
  );
  repairGaps(year, placeOfRecord(rows, order, plan), notes, problems);
  if (problems.count > 0) return refused(plan.format, problems);
  const clock = findSunOffset(year, plan.label);
  options.onProgress?.(1);
  return {
    kind: 'accepted',
    format: plan.format,
    year,
    header,
    summary: summariseWeather(year),
    statement,
    sunOffsetMinutes: clock.bestMinutes,
    warnings: [...notes, ...doubts(year, clock, plan.label)],
  };
}

export function refused(format: string, problems: ProblemList): WeatherRefused {
  return { kind: 'refused', format, problems: problems.listed, problemCount: problems.count };
}

function readSafely(
  bytes: Uint8Array,
  plan: ReadPlan,
  problems: ProblemList,
  onProgress: WeatherReadOptions['onProgress'],
): TableRows | null {
  try {
    return readRows(bytes, plan, problems, onProgress);
  } catch (error) {
    if (!(error instanceof TooLongLineError)) throw error;
    addTooLong(error, problems);
    return null;
  }
}

export function addTooLong({ line, message }: TooLongLineError, problems: ProblemList): void {
  problems.add({
    line,
    reason: `The content is no table of records: ${message}.`,
    fix: 'Check that the file is a text table with one record a line.',
  });
}

function toYear(rows: TableRows, { rows: rowOf, startLocalMs }: CalendarOrder, plan: ReadPlan): WeatherYear {
  const planned = new Set(plan.columns.map(({ channel }) => channel));
  const column = (channel: WeatherChannel) =>
    Float64Array.from(rowOf, (row) => (row < 0 || !planned.has(channel) ? NaN : rows.values[channel][row]!));
  const { latitudeDeg, longitudeDeg, altitudeM, utcOffsetHours, intervalMinutes } = plan;
  return {
    latitudeDeg,
    longitudeDeg,
    altitudeM,
    utcOffsetHours,
    intervalMinutes,
    firstWeekday: (new Date(startLocalMs[0]!).getUTCDay() + 6) % 7,
    startLocalMs,
    dniWm2: column('dniWm2'),
    ghiWm2: column('ghiWm2'),
    dhiWm2: column('dhiWm2'),
    dryBulbC: column('dryBulbC'),
    windMs: column('windMs'),
    relativeHumidityPct: column('relativeHumidityPct'),
    pressurePa: column('pressurePa'),
    flags: Uint16Array.from(rowOf, (row) => (row < 0 ? 0 : rows.flags[row]!)),
  };
}

function placeOfRecord(rows: TableRows, { rows: rowOf }: CalendarOrder, plan: ReadPlan) {
  return (record: number, channel: WeatherChannel) => {
    const row = rowOf[record]!;
    const planned = plan.columns.find((column) => column.channel === channel);
    return {
      line: row < 0 ? null : rows.lines[row]!,
      column: planned === undefined ? null : planned.at + 1,
      columnName: planned?.heading ?? WEATHER_CHANNELS.find((name) => name === channel) ?? '',
    };
  };
}
