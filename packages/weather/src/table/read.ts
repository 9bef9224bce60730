import { tableStatementSchema, type TableStatement } from '@noonwell/schema';
import { problemOfContent } from '../content.js';
import { ProblemList, type WeatherProblem } from '../problem.js';
import type { WeatherReadOptions, WeatherReadResult } from '../result.js';
import { TooLongLineError } from './blocks.js';
import { CHANNEL_NAMES } from './channels.js';
import type { CompleteStatement, MissingStatement } from './complete.js';
import { complete, findTable, isProblem, TABLE_FORMAT, type FoundTable } from './find-plan.js';
import { LISTED_PROBLEMS } from '../limits.js';
import { addTooLong, readByPlan, refused } from './read-plan.js';

/**
 * Reads a plain table as stated. What neither the statement nor the table says is listed and nothing is read.
 * Never throws on bad content: it comes back refused, with places and reasons.
 *
 * @param statement parts that the table itself says may be left out (a heading with name and unit)
 */
export function readTable(
  bytes: Uint8Array,
  statement: TableStatement,
  options: WeatherReadOptions = {},
): WeatherReadResult {
  const problem = problemOfContent(bytes);
  if (problem !== null) return refuseOne(problem, null);
  let found: FoundTable | WeatherProblem;
  try {
    found = findTable(bytes, statement);
  } catch (error) {
    if (!(error instanceof TooLongLineError)) throw error;
    const problems = new ProblemList();
    addTooLong(error, problems);
    return refused(TABLE_FORMAT, problems);
  }
  if (isProblem(found)) return refuseOne(found, TABLE_FORMAT);
  const joined = complete(found, statement);
  if (joined.complete === null) return refuseMissing(joined.missing);
  return readAsStated(bytes, found, joined.complete, options);
}

function refuseOne(problem: WeatherProblem, format: string | null): WeatherReadResult {
  return { kind: 'refused', format, problems: [problem], problemCount: 1 };
}

function refuseMissing(missing: readonly MissingStatement[]): WeatherReadResult {
  return {
    kind: 'refused',
    format: TABLE_FORMAT,
    problems: missing.slice(0, LISTED_PROBLEMS).map(({ path, reason, fix }) => ({
      line: null,
      column: null,
      columnName: `statement.${path}`,
      value: null,
      reason,
      fix,
    })),
    problemCount: missing.length,
    missing,
  };
}

function readAsStated(
  bytes: Uint8Array,
  { layout, time, intervalMinutes }: FoundTable,
  stated: CompleteStatement,
  options: WeatherReadOptions,
): WeatherReadResult {
  const { label, clock, dateOrder, latitudeDeg, longitudeDeg, altitudeM, utcOffsetHours, columns } = stated;
  const place = { latitudeDeg, longitudeDeg, altitudeM, utcOffsetHours };
  const planned = columns.map(({ channel, column, unit }) => ({
    channel,
    at: column - 1,
    heading: layout.headings[column - 1]?.text ?? '',
    unit,
  }));
  const notes = [
    `Read as stated, from ${planned
      .map(
        ({ channel, at, heading, unit }) =>
          `${CHANNEL_NAMES[channel]}: column ${at + 1} "${heading}" in ${unit}`,
      )
      .join('; ')}.`,
  ];
  if (stated.fromHeadings.length > 0) {
    const names = stated.fromHeadings.map((channel) => CHANNEL_NAMES[channel]).join(', ');
    notes.push(`Not stated but named by the headings, with unit: ${names}.`);
  }
  const { encoding, delimiter, decimalMark, firstDataLine } = layout;
  return readByPlan(
    bytes,
    {
      format: TABLE_FORMAT,
      encoding,
      delimiter,
      decimalMark,
      firstDataLine,
      time,
      dateOrder,
      label,
      clock,
      intervalMinutes,
      ...place,
      columns: planned,
    },
    {
      header: {
        placeName: stated.placeName,
        city: stated.placeName,
        region: '',
        country: '',
        source: '',
        wmo: '',
      },
      notes,
      statement: asApplied(stated, { encoding, delimiter, decimalMark, dateOrder }),
    },
    options,
  );
}

/** The statement in full, with what the table itself said filled in. */
function asApplied(stated: CompleteStatement, layout: TableStatement['layout']): TableStatement {
  const { label, clock, placeName, latitudeDeg, longitudeDeg, altitudeM, utcOffsetHours } = stated;
  const matches: Record<string, { column: number; unit: string } | null> = { pressurePa: null };
  for (const { channel, column, unit } of stated.columns) matches[channel] = { column, unit };
  return tableStatementSchema.parse({
    label,
    clock,
    place: {
      ...(placeName === '' ? {} : { name: placeName }),
      latitudeDeg,
      longitudeDeg,
      altitudeM,
      utcOffsetHours,
    },
    columns: matches,
    layout,
  });
}
