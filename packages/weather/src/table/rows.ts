import { WEATHER_CHANNEL_RANGE, WEATHER_FLAG, type WeatherChannel } from '@noonwell/engine';
import type { ProblemList } from '../problem.js';
import { visitRows } from './blocks.js';
import { isIrradiance } from './channels.js';
import { isMissingNumber, isMissingWord, parseCell } from './numbers.js';
import type { PlannedColumn, ReadPlan } from './plan.js';
import { readLabel, timeColumns } from './time.js';
import { conversionOf } from './units.js';

/** A year of minutes has 527 040 rows; doubles leave some room. */
const MOST_ROWS = 600_000;
/** Night readings of an instrument lie down to this; lower is refused. Source: Long & Shi 2008, physically possible limit. */
const LOWEST_NIGHT_READING_WM2 = -4;
/** Lines without a time stamp after the last record that are passed over as a legend; more are a damaged table (own choice). */
const MOST_LEGEND_LINES = 100;
/** A ruined file is not read to its end: so many faults say enough. */
const MOST_PROBLEMS = 10_000;

/** Rows of a table in the file's order; NaN is "missing". Arrays are longer than `count`. */
export interface TableRows {
  count: number;
  /** Label of each row in its own clock, as if that were UTC. */
  labelMs: Float64Array;
  lines: Int32Array;
  flags: Uint16Array;
  readonly values: Record<WeatherChannel, Float64Array>;
  /** Lines after the last record that are no rows. */
  legendLines: number;
}

interface Setter extends PlannedColumn {
  readonly factor: number;
  readonly offset: number;
}

/** Reads the lines of a table; what is wrong with them is added to `problems`. */
export function readRows(
  bytes: Uint8Array,
  plan: ReadPlan,
  problems: ProblemList,
  onProgress?: (fraction: number) => void,
): TableRows {
  const rows = emptyRows();
  const setters = plan.columns.map((column) => ({
    ...column,
    ...conversionOf(column.unit, plan.intervalMinutes),
  }));
  const timeAt = timeColumns(plan.time);
  const cellsNeeded = 1 + Math.max(...timeAt, ...setters.map(({ at }) => at));
  /** Lines without a time stamp that may be the legend after the table. */
  let unread: { line: number; text: string }[] = [];

  visitRows(
    { bytes, ...plan },
    (cells, line) => {
      if (problems.count >= MOST_PROBLEMS) return false;
      if (line < plan.firstDataLine || cells.every((cell) => cell.trim() === '')) return true;
      const label = readLabel(cells, plan.time, plan.dateOrder);
      if (label === null) {
        unread.push({ line, text: timeAt.map((at) => cells[at] ?? '').join(' ') });
        return unread.length <= MOST_LEGEND_LINES;
      }
      for (const { line: before, text } of unread) refuseLabel(before, text, timeAt, problems);
      unread = [];
      if (label.statesOffset && plan.clock !== 'utc') {
        problems.add({
          line,
          value: timeAt.map((at) => cells[at] ?? '').join(' '),
          reason: 'The time label carries an offset from UTC, but the clock is stated to be local.',
          fix: 'State the clock as utc: labels with an offset are read as the moment they name.',
        });
        return false;
      }
      if (rows.count >= MOST_ROWS) {
        problems.add({
          line,
          reason: `The table has more than ${MOST_ROWS} rows.`,
          fix: 'Give one year, of minutes or longer intervals.',
        });
        return false;
      }
      if (cells.length < cellsNeeded) {
        problems.add({
          line,
          column: cells.length,
          value: cells.at(-1) ?? '',
          reason: `The line is cut off: it has ${cells.length} cells, and cell ${cellsNeeded} is read.`,
          fix: 'The file is probably incomplete: download or export it again.',
        });
        return true;
      }
      grow(rows);
      const row = rows.count;
      rows.labelMs[row] = label.ms;
      rows.lines[row] = line;
      for (const setter of setters)
        readValue(cells[setter.at] ?? '', setter, row, line, rows, plan, problems);
      rows.count += 1;
      return true;
    },
    onProgress,
  );
  if (unread.length > MOST_LEGEND_LINES) {
    for (const { line, text } of unread) refuseLabel(line, text, timeAt, problems);
  } else {
    rows.legendLines = unread.length;
  }
  return rows;
}

function refuseLabel(line: number, text: string, timeAt: readonly number[], problems: ProblemList): void {
  problems.add({
    line,
    column: (timeAt[0] ?? 0) + 1,
    columnName: 'time',
    value: text,
    reason: 'This is no time label like those of the lines before.',
    fix: 'Write date and time in one way throughout, the year with four digits; leave out comments between the rows.',
  });
}

function readValue(
  cell: string,
  { channel, at, heading, unit, factor, offset }: Setter,
  row: number,
  line: number,
  rows: TableRows,
  plan: ReadPlan,
  problems: ProblemList,
): void {
  const column = rows.values[channel];
  column[row] = NaN;
  const text = cell.trim();
  if (isMissingWord(text)) return;
  const [low, high] = WEATHER_CHANNEL_RANGE[channel];
  const place = { line, column: at + 1, columnName: heading, value: text };
  const raw = parseCell(text, plan.decimalMark);
  if (Number.isNaN(raw)) {
    const mark = plan.decimalMark === 'comma' ? 'comma' : 'point';
    problems.add({
      ...place,
      reason: `"${text.slice(0, 60)}" is not a number.`,
      fix: `Write numbers with a decimal ${mark}, and leave the cell empty where a value is missing.`,
    });
    return;
  }
  let value = raw * factor + offset;
  if (isIrradiance(channel) && value < 0 && value >= LOWEST_NIGHT_READING_WM2) {
    value = 0;
    rows.flags[row]! |= WEATHER_FLAG.clippedIrradiance;
  }
  if (value < low || value > high) {
    if (isMissingNumber(raw)) return;
    const inUnit = (bound: number) => Number(((bound - offset) / factor).toPrecision(4));
    problems.add({
      ...place,
      reason: `${text} ${unit} is ${value < 0 && low === 0 ? 'negative' : 'out of range'}.`,
      fix: `Allowed: ${inUnit(low)} to ${inUnit(high)} ${unit}. Correct the value, or the unit if all are like this.`,
    });
    return;
  }
  if (channel === 'relativeHumidityPct' && value > 100) {
    value = 100;
    rows.flags[row]! |= WEATHER_FLAG.clippedHumidity;
  }
  // Adding 0 turns −0 into 0, so that equal years have equal bytes.
  column[row] = value + 0;
}

const FIRST_CAPACITY = 8800;

function emptyRows(): TableRows {
  const column = () => new Float64Array(FIRST_CAPACITY);
  return {
    count: 0,
    labelMs: column(),
    lines: new Int32Array(FIRST_CAPACITY),
    flags: new Uint16Array(FIRST_CAPACITY),
    values: {
      dniWm2: column(),
      ghiWm2: column(),
      dhiWm2: column(),
      dryBulbC: column(),
      windMs: column(),
      relativeHumidityPct: column(),
      pressurePa: column(),
    },
    legendLines: 0,
  };
}

function grow(rows: TableRows): void {
  if (rows.count < rows.labelMs.length) return;
  const capacity = rows.labelMs.length * 2;
  const larger = (column: Float64Array) => {
    const grown = new Float64Array(capacity);
    grown.set(column);
    return grown;
  };
  rows.labelMs = larger(rows.labelMs);
  const lines = new Int32Array(capacity);
  lines.set(rows.lines);
  rows.lines = lines;
  const flags = new Uint16Array(capacity);
  flags.set(rows.flags);
  rows.flags = flags;
  const { values } = rows;
  values.dniWm2 = larger(values.dniWm2);
  values.ghiWm2 = larger(values.ghiWm2);
  values.dhiWm2 = larger(values.dhiWm2);
  values.dryBulbC = larger(values.dryBulbC);
  values.windMs = larger(values.windMs);
  values.relativeHumidityPct = larger(values.relativeHumidityPct);
  values.pressurePa = larger(values.pressurePa);
}
