import type { WeatherChannel } from '@noonwell/engine';
import type { TableDateOrder, TableStatement } from '@noonwell/schema';
import { ProblemList, type WeatherProblem } from '../problem.js';
import { completeStatement, type CompleteStatement, type MissingStatement } from './complete.js';
import { findDateOrder, findIntervalMinutes, findTimeLayout, labelsStateOffset } from './find-time.js';
import { ColumnCount, guessColumns, type ColumnGuess } from './guess.js';
import { findLayout, type TableLayout } from './layout.js';
import { labelText, readLabel, type TimeLayout } from './time.js';

/** What the file itself shows. */
export interface FoundTable {
  readonly layout: TableLayout;
  readonly time: TimeLayout;
  /** Null where day and month cannot be told apart. */
  readonly dateOrder: TableDateOrder | null;
  readonly intervalMinutes: number;
  readonly labelsStateOffset: boolean;
  /** First label as it is read. */
  readonly firstLabel: string;
  readonly guesses: Partial<Record<WeatherChannel, ColumnGuess>>;
}

/** Records an hour that make a year: every interval of whole minutes that divides the hour. */
export function isReadInterval(minutes: number): boolean {
  return Number.isInteger(minutes) && minutes >= 1 && 60 % minutes === 0;
}

export const TABLE_FORMAT = 'table';

/** Looks at the first lines for layout, time and columns; a problem where there is no table of records. */
export function findTable(bytes: Uint8Array, stated: TableStatement): FoundTable | WeatherProblem {
  const layout = findLayout(bytes, stated.layout);
  if (layout === null) {
    return problemOf({
      reason:
        'No table of records was found: lines with the same number of cells, three numbers or more in each.',
      fix: 'Give one record a line, under a line of headings; if the file is such a table, correct its delimiter.',
    });
  }
  const time = findTimeLayout(layout);
  if (time === null) {
    return problemOf({
      line: layout.firstDataLine,
      reason: 'No column holds the time of the records.',
      fix: 'Give date and time in one column or two (2018-01-31 07:00), or year, month, day and hour in columns with these headings; years with four digits.',
    });
  }
  const dateOrder = stated.layout?.dateOrder ?? findDateOrder(bytes, layout, time);
  // Which of the two does not matter for the step between labels of the first lines.
  const order = dateOrder ?? 'dayFirst';
  const intervalMinutes = findIntervalMinutes(layout, time, order);
  if (intervalMinutes !== null && !isReadInterval(intervalMinutes)) {
    return problemOf({
      line: layout.firstDataLine,
      reason: `The records are ${Number(intervalMinutes.toFixed(2))} min apart.`,
      fix: 'Give records of one hour, or of a whole number of minutes that divides it (60, 30, 20, 15, 12, 10, 6, 5, 4, 3, 2 or 1).',
    });
  }
  if (intervalMinutes === null) {
    return problemOf({
      line: layout.firstDataLine,
      reason: `The time labels cannot be read${stated.layout?.dateOrder === undefined ? '' : ` with ${stated.layout.dateOrder}`}.`,
      fix: 'Correct the order of day, month and year, or the labels.',
    });
  }
  const first = layout.sample.map((row) => readLabel(row, time, order)).find((label) => label !== null);
  return {
    layout,
    time,
    dateOrder,
    intervalMinutes,
    labelsStateOffset: labelsStateOffset(layout, time, order),
    firstLabel: first === undefined ? '' : labelText(first.ms),
    guesses: guessColumns(layout.headings, countColumns(layout)),
  };
}

export function isProblem(found: FoundTable | WeatherProblem): found is WeatherProblem {
  return 'reason' in found;
}

/** What each column of the sampled lines holds. */
export function countColumns({ headings, sample, decimalMark }: TableLayout): ColumnCount[] {
  return headings.map((_, at) => {
    const count = new ColumnCount(decimalMark);
    for (const row of sample) count.see(row[at] ?? '');
    return count;
  });
}

/** Joins what was found with what was stated. */
export function complete(
  { layout, dateOrder, guesses }: FoundTable,
  stated: TableStatement,
): { complete: CompleteStatement; missing: null } | { complete: null; missing: MissingStatement[] } {
  return completeStatement({ headings: layout.headings, dateOrder, guesses }, stated);
}

function problemOf(
  problem: Pick<WeatherProblem, 'reason' | 'fix'> & Partial<WeatherProblem>,
): WeatherProblem {
  const list = new ProblemList();
  list.add(problem);
  return list.listed[0]!;
}
