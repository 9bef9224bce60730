import type { WeatherChannel } from '@noonwell/engine';
import { TABLE_UNITS, tableStatementSchema, type TableStatement } from '@noonwell/schema';
import { problemOfContent } from '../content.js';
import type { WeatherProblem } from '../problem.js';
import { TooLongLineError } from './blocks.js';
import type { MissingStatement } from './complete.js';
import { complete, countColumns, findTable, isProblem, type FoundTable } from './find-plan.js';
import type { ColumnGuess, ColumnValues } from './guess.js';
import type { TableLayout } from './layout.js';
import { timeColumns, type TimeLayout } from './time.js';
import { addTooLong } from './read-plan.js';
import { ProblemList } from '../problem.js';
import type { TableUnit } from './units.js';

const SHOWN_CELLS = 3;

/** A column as it is shown to the person who matches it. */
export interface FoundColumn {
  /** From 1. */
  readonly column: number;
  readonly heading: string;
  /** Of the heading. */
  readonly unit: TableUnit | null;
  readonly isTime: boolean;
  /** Of the first lines. */
  readonly values: ColumnValues;
  /** The first cells as they stand in the file. */
  readonly cells: readonly string[];
}

/** What was found in a plain table, what is guessed from it and what must still be stated. */
export interface TableInspection {
  readonly kind: 'table';
  readonly layout: Omit<TableLayout, 'headings' | 'sample'>;
  readonly time: {
    readonly kind: TimeLayout['kind'];
    /** From 1. */
    readonly columns: readonly number[];
    /** Null where day and month cannot be told apart. */
    readonly dateOrder: FoundTable['dateOrder'];
    readonly intervalMinutes: number;
    /** The labels carry "Z" or an offset, so their clock is UTC. */
    readonly labelsStateOffset: boolean;
    /** As it is read: "2018-01-01 00:00". */
    readonly firstLabel: string;
  };
  readonly columns: readonly FoundColumn[];
  readonly guesses: Partial<Record<WeatherChannel, ColumnGuess>>;
  /** The statement given, with the guesses filled in where it says nothing: a draft for the person to check, never applied by itself. */
  readonly draft: TableStatement;
  /** What the statement given leaves open. */
  readonly missing: readonly MissingStatement[];
}

/**
 * Looks at a table without reading it whole.
 *
 * @param statement corrections made so far
 * @returns what was found; a problem where the content is no table of records
 */
export function inspectTable(
  bytes: Uint8Array,
  statement: TableStatement = {},
): TableInspection | { readonly kind: 'noTable'; readonly problem: WeatherProblem } {
  const problem = problemOfContent(bytes);
  if (problem !== null) return { kind: 'noTable', problem };
  let found: ReturnType<typeof findTable>;
  try {
    found = findTable(bytes, statement);
  } catch (error) {
    if (!(error instanceof TooLongLineError)) throw error;
    const problems = new ProblemList();
    addTooLong(error, problems);
    return { kind: 'noTable', problem: problems.listed[0]! };
  }
  if (isProblem(found)) return { kind: 'noTable', problem: found };
  const { layout, time, dateOrder, intervalMinutes, labelsStateOffset, firstLabel, guesses } = found;
  const { headings, sample, ...shown } = layout;
  const counts = countColumns(layout);
  const timeAt = timeColumns(time);
  return {
    kind: 'table',
    layout: shown,
    time: {
      kind: time.kind,
      columns: timeAt.map((at) => at + 1),
      dateOrder,
      intervalMinutes,
      labelsStateOffset,
      firstLabel,
    },
    columns: headings.map(({ text, unit }, at) => {
      const { numbers, missing, others, lowest, highest } = counts[at]!;
      return {
        column: at + 1,
        heading: text,
        unit,
        isTime: timeAt.includes(at),
        values: { numbers, missing, others, lowest, highest },
        cells: sample.slice(0, SHOWN_CELLS).map((row) => row[at] ?? ''),
      };
    }),
    guesses,
    draft: draftOf(statement, found),
    missing: complete(found, statement).missing ?? [],
  };
}

function draftOf(stated: TableStatement, { guesses, layout, dateOrder }: FoundTable): TableStatement {
  const columns = Object.fromEntries(
    Object.keys(TABLE_UNITS).flatMap((channel) => {
      const guess = guesses[channel as WeatherChannel];
      return guess === undefined ? [] : [[channel, { column: guess.column, unit: guess.unit }]];
    }),
  );
  const { encoding, delimiter, decimalMark } = layout;
  return tableStatementSchema.parse({
    ...stated,
    columns: { ...columns, ...stated.columns },
    layout: {
      encoding,
      delimiter,
      decimalMark,
      ...(dateOrder === null ? {} : { dateOrder }),
      ...stated.layout,
    },
  });
}
