import { WEATHER_CHANNEL_RANGE, WEATHER_FLAG, type WeatherChannel } from '@noonwell/engine';
import { isLeapYear, LEAP_YEAR_HOURS, longestMonthDays, MONTHS, slotOf } from '../calendar.js';
import { linesOf } from '../content.js';
import type { ProblemList } from '../problem.js';
import { parseNumber, parseWhole, splitCells } from './cells.js';
import {
  EPW_COLUMNS,
  EPW_LAST_CELL_READ,
  EPW_TIME_CELLS,
  IRRADIANCE_NOISE_WM2,
  type EpwColumn,
} from './columns.js';
import type { EpwHeader } from './header.js';

const FIRST_YEAR = 1850;
const LAST_YEAR = 2150;
/** Reading stops here: a year has 8784 lines at most, blank ones and doubles leave room enough. */
const MOST_LINES = 50_000;

/** The data lines of a file, each in the slot of its hour; NaN is "missing". */
export interface EpwRows {
  readonly columns: Record<WeatherChannel, Float64Array>;
  /** Calendar year of each slot. */
  readonly years: Int32Array;
  /** Line of the file that filled each slot; 0 where none did. */
  readonly lines: Int32Array;
  /** Data lines of the file, readable or not. */
  readonly rowCount: number;
  /** Bit set of `WEATHER_FLAG` of each slot: what was clipped. */
  readonly flags: Uint16Array;
}

/** Reads the lines after DATA PERIODS; what is wrong with them is added to `problems`. */
export function readRows(
  text: string,
  header: EpwHeader,
  problems: ProblemList,
  onProgress: ((fraction: number) => void) | undefined,
): EpwRows {
  const slots = () => new Float64Array(LEAP_YEAR_HOURS).fill(NaN);
  const rows = {
    columns: {
      dniWm2: slots(),
      ghiWm2: slots(),
      dhiWm2: slots(),
      dryBulbC: slots(),
      windMs: slots(),
      relativeHumidityPct: slots(),
      pressurePa: slots(),
    },
    years: new Int32Array(LEAP_YEAR_HOURS),
    lines: new Int32Array(LEAP_YEAR_HOURS),
    rowCount: 0,
    flags: new Uint16Array(LEAP_YEAR_HOURS),
  };
  let previousSlot = -1;
  let cellsExpected = 0;
  let reportAt = 0;

  for (const { content, number, next } of linesOf(text.slice(header.dataStart))) {
    if (next >= reportAt) {
      onProgress?.((header.dataStart + next) / text.length);
      reportAt = next + text.length / 20;
    }
    const line = header.dataLine + number - 1;
    if (number > MOST_LINES) {
      problems.add({
        line,
        reason: `More than ${MOST_LINES} lines follow DATA PERIODS; a year has ${LEAP_YEAR_HOURS} at most.`,
        fix: 'Give one year of hours.',
      });
      break;
    }
    if (content.trim() === '') continue;
    const cells = splitCells(content);
    rows.rowCount += 1;
    cellsExpected ||= Math.max(cells.length, EPW_LAST_CELL_READ);
    const slot = readTime(cells, line, problems);
    if (slot !== null) {
      const seenAt = rows.lines[slot]!;
      if (seenAt !== 0) {
        problems.add({
          line,
          value: timeText(cells),
          reason: `This hour stands already in line ${seenAt}.`,
          fix: 'Keep one line for each hour.',
        });
        continue;
      }
      rows.lines[slot] = line;
      rows.years[slot] = parseWhole(cells[EPW_TIME_CELLS.year - 1]!);
      if (slot < previousSlot) {
        problems.add({
          line,
          value: timeText(cells),
          reason: 'This hour is earlier than the one in the line before.',
          fix: 'Put the lines in order from 1 January, hour 1, to 31 December, hour 24.',
        });
      }
      previousSlot = slot;
    }
    if (cells.length < cellsExpected) {
      problems.add({
        line,
        column: cells.length,
        value: cells.at(-1) ?? '',
        reason: `The line is cut off: it has ${cells.length} cells of ${cellsExpected}.`,
        fix: 'The file is probably incomplete: download or export it again.',
      });
      continue;
    }
    for (const column of EPW_COLUMNS) readValue(cells, column, line, slot, rows, problems);
  }
  return rows;
}

/** Slot of a line's time stamp; null (with a problem added) where it names no hour of a year. */
function readTime(cells: readonly string[], line: number, problems: ProblemList): number | null {
  const part = (name: 'year' | 'month' | 'day' | 'hour', low: number, high: number): number => {
    const cell = EPW_TIME_CELLS[name];
    const value = cells[cell - 1] ?? '';
    const number = parseWhole(value);
    if (number >= low && number <= high) return number;
    problems.add({
      line,
      column: cell,
      columnName: name,
      value,
      reason: `The ${name} is "${value.trim().slice(0, 60)}".`,
      fix: `Write a whole number from ${low} to ${high}.`,
    });
    return NaN;
  };
  const year = part('year', FIRST_YEAR, LAST_YEAR);
  const month = part('month', 1, 12);
  const hour = part('hour', 1, 24);
  const day = part('day', 1, Number.isNaN(month) ? 31 : longestMonthDays(month));
  if ([year, month, day, hour].some(Number.isNaN)) return null;
  if (month === 2 && day === 29 && !isLeapYear(year)) {
    problems.add({
      line,
      column: EPW_TIME_CELLS.day,
      columnName: 'day',
      value: timeText(cells),
      reason: `${year} has no 29 ${MONTHS[1]}: it is not a leap year.`,
      fix: 'Correct the year, or leave the day out.',
    });
    return null;
  }
  return slotOf(month, day, hour);
}

function timeText(cells: readonly string[]): string {
  return cells.slice(0, EPW_TIME_CELLS.hour).join(',');
}

function readValue(
  cells: readonly string[],
  column: EpwColumn,
  line: number,
  slot: number | null,
  rows: EpwRows,
  problems: ProblemList,
): void {
  const text = (cells[column.cell - 1] ?? '').trim();
  const refuse = (reason: string, fix: string) => {
    problems.add({ line, column: column.cell, columnName: column.name, value: text, reason, fix });
  };
  const [low, high] = WEATHER_CHANNEL_RANGE[column.channel];
  const range = `${low} to ${high} ${column.unit}`;

  let value = parseNumber(text);
  if (text === '' || value >= column.missingFrom) {
    if (column.whenMissing === 'refuse') {
      refuse(
        `The ${column.name} is missing (${text === '' ? 'empty cell' : text}).`,
        'Missing irradiance is not invented: give the file with a measured or modelled value in every hour.',
      );
    }
    return;
  }
  if (Number.isNaN(value)) {
    refuse(`"${text.slice(0, 60)}" is not a number.`, `Write a number from ${range}, with a decimal point.`);
    return;
  }
  const isIrradiance = column.whenMissing === 'refuse';
  if (isIrradiance && value < 0 && value >= IRRADIANCE_NOISE_WM2) {
    value = 0;
    if (slot !== null) rows.flags[slot]! |= WEATHER_FLAG.clippedIrradiance;
  }
  if (value < low || value > high) {
    refuse(
      `${text} is ${value < 0 && low === 0 ? 'negative' : 'out of range'}.`,
      fixOfRange(column, value, range),
    );
    return;
  }
  if (column.channel === 'relativeHumidityPct' && value > 100) {
    value = 100;
    if (slot !== null) rows.flags[slot]! |= WEATHER_FLAG.clippedHumidity;
  }
  // Adding 0 turns −0 into 0, so that equal years have equal bytes.
  if (slot !== null) rows.columns[column.channel][slot] = value + 0;
}

function fixOfRange(column: EpwColumn, value: number, range: string): string {
  if (column.channel === 'pressurePa' && value > 310 && value < 1200) {
    return `Allowed: ${range}. The value looks like hectopascal: multiply by 100.`;
  }
  return `Allowed: ${range}; "missing" is written ${column.missingText}.`;
}
