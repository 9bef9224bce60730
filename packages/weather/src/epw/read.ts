import { WEATHER_FLAG, type WeatherYear } from '@noonwell/engine';
import { standardPressurePa } from '../atmosphere.js';
import { slotStartLocalMs, slotText, WEEKDAYS } from '../calendar.js';
import { decodeText, problemOfContent } from '../content.js';
import { fillGap, findGaps, LONGEST_FILLED_GAP_HOURS } from '../gaps.js';
import { doubts } from '../doubts.js';
import { ProblemList } from '../problem.js';
import type { WeatherReadOptions, WeatherReadResult } from '../result.js';
import { findSunOffset } from '../sun-offset.js';
import { summariseWeather } from '../summary.js';
import { EPW_COLUMNS, type EpwColumn } from './columns.js';
import { readHeader, type EpwHeader } from './header.js';
import { readRows, type EpwRows } from './rows.js';
import { findMissingHours, slotsOfYear } from './year.js';

export const EPW_FORMAT = 'epw';
export type EpwResult = WeatherReadResult;

/** Records are means over the hour that ends at the label. */
const LABEL = 'end';

/** Reads an EPW file given as text. Never throws on bad content: it comes back refused, with places and reasons. */
export function readEpwText(text: string, options: WeatherReadOptions = {}): EpwResult {
  const problems = new ProblemList();
  const header = readHeader(text, problems);
  if (header === null) return refused(problems);
  const rows = readRows(text, header, problems, options.onProgress);
  const slots = slotsOfYear(rows);
  findMissingHours(rows, slots, header, problems);
  if (problems.count > 0) return refused(problems);

  const notes: string[] = [];
  const year = buildYear(header, rows, slots, notes, problems);
  if (problems.count > 0) return refused(problems);
  const clock = findSunOffset(year, LABEL);
  options.onProgress?.(1);
  return {
    kind: 'accepted',
    format: EPW_FORMAT,
    year,
    header: header.header,
    summary: summariseWeather(year),
    statement: null,
    sunOffsetMinutes: clock.bestMinutes,
    warnings: [...notes, ...doubts(year, clock, LABEL)],
  };
}

/** Reads an EPW file given as bytes; empty, binary and oversized content is refused before it is decoded. */
export function readEpw(bytes: Uint8Array, options: WeatherReadOptions = {}): EpwResult {
  const problem = problemOfContent(bytes);
  if (problem !== null) return { kind: 'refused', format: null, problems: [problem], problemCount: 1 };
  return readEpwText(decodeText(bytes), options);
}

function refused(problems: ProblemList): EpwResult {
  return { kind: 'refused', format: EPW_FORMAT, problems: problems.listed, problemCount: problems.count };
}

/** Joins header and rows to a weather year, repairs short gaps (flagged and noted) and refuses long ones. */
function buildYear(
  header: EpwHeader,
  rows: EpwRows,
  slots: Int32Array,
  notes: string[],
  problems: ProblemList,
): WeatherYear {
  const inOrder = (column: Float64Array) => Float64Array.from(slots, (slot) => column[slot]!);
  const year: WeatherYear = {
    ...header.place,
    intervalMinutes: 60,
    firstWeekday: header.firstWeekday ?? 0,
    startLocalMs: Float64Array.from(slots, (slot) => slotStartLocalMs(rows.years[slot]!, slot)),
    dniWm2: inOrder(rows.columns.dniWm2),
    ghiWm2: inOrder(rows.columns.ghiWm2),
    dhiWm2: inOrder(rows.columns.dhiWm2),
    dryBulbC: inOrder(rows.columns.dryBulbC),
    windMs: inOrder(rows.columns.windMs),
    relativeHumidityPct: inOrder(rows.columns.relativeHumidityPct),
    pressurePa: inOrder(rows.columns.pressurePa),
    flags: Uint16Array.from(slots, (slot) => rows.flags[slot]!),
  };
  if (header.firstWeekday === null) {
    notes.push(
      `The file names no first weekday: the year is taken to begin on a ${WEEKDAYS[year.firstWeekday]!}.`,
    );
  }
  noteFlagged(
    year,
    WEATHER_FLAG.clippedIrradiance,
    notes,
    (count) => `${count} hours with irradiance just under 0 were set to 0.`,
  );
  noteFlagged(
    year,
    WEATHER_FLAG.clippedHumidity,
    notes,
    (count) => `${count} hours with a humidity over 100 % were taken as 100 %.`,
  );
  for (const column of EPW_COLUMNS) {
    if (column.whenMissing === 'takeFromAltitude') fillPressure(year, notes);
    if (column.whenMissing === 'fillShortGaps') fillShortGaps(year, rows, slots, column, notes, problems);
  }
  return year;
}

function fillPressure(year: WeatherYear, notes: string[]): void {
  const pressurePa = standardPressurePa(year.altitudeM);
  year.pressurePa.forEach((value, at) => {
    if (!Number.isNaN(value)) return;
    year.pressurePa[at] = pressurePa;
    year.flags[at]! |= WEATHER_FLAG.pressureFromAltitude;
  });
  noteFlagged(
    year,
    WEATHER_FLAG.pressureFromAltitude,
    notes,
    (count) =>
      `${count} hours without pressure got the standard atmosphere's at the site's altitude (ISO 2533).`,
  );
}

function fillShortGaps(
  year: WeatherYear,
  rows: EpwRows,
  slots: Int32Array,
  column: EpwColumn & { whenMissing: 'fillShortGaps' },
  notes: string[],
  problems: ProblemList,
): void {
  const flag = WEATHER_FLAG[column.filledFlag];
  const values = year[column.channel];
  for (const gap of findGaps(values)) {
    const hours = gap.to - gap.from;
    if (hours > LONGEST_FILLED_GAP_HOURS) {
      problems.add({
        line: rows.lines[slots[gap.from]!]!,
        column: column.cell,
        columnName: column.name,
        value: column.missingText,
        reason: `The ${column.name} is missing for ${hours} hours, from ${slotText(slots[gap.from]!)} to ${slotText(slots[gap.to - 1]!)}.`,
        fix: `Gaps of at most ${LONGEST_FILLED_GAP_HOURS} hours are filled: give values for longer ones.`,
      });
      continue;
    }
    fillGap(values, gap);
    for (let at = gap.from; at < gap.to; at += 1) year.flags[at]! |= flag;
  }
  noteFlagged(
    year,
    flag,
    notes,
    (count) =>
      `${count} hours without ${column.name} were filled by a straight line between their neighbours.`,
  );
}

function noteFlagged(
  year: WeatherYear,
  flag: number,
  notes: string[],
  sentence: (count: number) => string,
): void {
  const count = year.flags.reduce((total, flags) => total + ((flags & flag) === 0 ? 0 : 1), 0);
  if (count > 0) notes.push(sentence(count));
}
