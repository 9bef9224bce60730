import { WEATHER_CHANNELS } from '@noonwell/engine';
import { splitCells } from '../epw/cells.js';
import { ProblemList } from '../problem.js';
import type { WeatherReadOptions, WeatherReadResult } from '../result.js';
import { findEncoding, headLines } from '../table/blocks.js';
import { readHeading, type Heading } from '../table/headings.js';
import type { PlannedColumn } from '../table/plan.js';
import { readByPlan, refused } from '../table/read-plan.js';
import { unitFits } from '../table/units.js';
import { TMY3_DATE, TMY3_NAMES, TMY3_TIME } from './columns.js';
import { readStation } from './header.js';

export const TMY3_FORMAT = 'tmy3';
const HEADING_LINE = 2;

/**
 * Reads a TMY3 table: columns by name (files have 68 or 71), local standard time, each record the hour that
 * ends at its label, 24:00 of the same date, months from different years, −9900 for "missing".
 * Source: NREL/TP-581-43156 (Wilcox & Marion 2008).
 */
export function readTmy3(bytes: Uint8Array, options: WeatherReadOptions = {}): WeatherReadResult {
  const problems = new ProblemList();
  const { encoding } = findEncoding(bytes);
  const [stationLine = '', headingLine = ''] = headLines(bytes, encoding, HEADING_LINE);
  const station = readStation(stationLine, problems);
  const headings = splitCells(headingLine).map((cell) => readHeading(cell));
  const columns = findColumns(headings, problems);
  const date = findTimeColumn(headings, TMY3_DATE, problems);
  const time = findTimeColumn(headings, TMY3_TIME, problems);
  if (station === null || problems.count > 0) return refused(TMY3_FORMAT, problems);
  const { header, ...place } = station;
  return readByPlan(
    bytes,
    {
      format: TMY3_FORMAT,
      encoding,
      delimiter: ',',
      decimalMark: 'point',
      firstDataLine: HEADING_LINE + 1,
      time: { kind: 'dateAndTime', date, time },
      dateOrder: 'monthFirst',
      label: 'end',
      clock: 'localStandard',
      intervalMinutes: 60,
      ...place,
      columns,
    },
    { header, notes: [], statement: null },
    options,
  );
}

function findTimeColumn(headings: readonly Heading[], name: string, problems: ProblemList): number {
  const at = headings.findIndex(({ text }) => text.toLowerCase() === name.toLowerCase());
  if (at < 0) refuseHeading(name, problems);
  return at;
}

function findColumns(headings: readonly Heading[], problems: ProblemList): PlannedColumn[] {
  return WEATHER_CHANNELS.flatMap((channel) => {
    const wanted = TMY3_NAMES[channel].toLowerCase();
    const at = headings.findIndex(
      ({ name, unit }) => name.toLowerCase() === wanted && unit !== null && unitFits(channel, unit),
    );
    const heading = headings[at];
    if (heading?.unit != null) return [{ channel, at, heading: heading.text, unit: heading.unit }];
    // Pressure follows from the altitude where a file has none.
    if (channel !== 'pressurePa') refuseHeading(`${TMY3_NAMES[channel]} with its unit`, problems);
    return [];
  });
}

function refuseHeading(name: string, problems: ProblemList): void {
  problems.add({
    line: HEADING_LINE,
    columnName: name,
    reason: `No heading names ${name}.`,
    fix: 'Give the file with its line of headings as it was published.',
  });
}
