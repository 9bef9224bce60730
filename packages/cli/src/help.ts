import {
  RECEIVER_KINDS,
  scenarioFields,
  STEP_MINUTES,
  summaryFigures,
  type ScenarioField,
} from '@noonwell/schema';
import { WEATHER_READERS } from '@noonwell/weather';

export const MAIN_HELP = `Noonwell: heat and power from one dish, hour by hour.

  noonwell run SCENARIO.json --weather FILE [--step MINUTES] [--hourly OUT.csv]
      Runs a scenario through a weather year; prints the summary as JSON.
  noonwell scenario new [--receiver ${RECEIVER_KINDS.join('|')}]
      Prints a complete default scenario as JSON.

  noonwell COMMAND --help    what a command reads and prints
  noonwell --version

Results go to standard output, errors to standard error.
Exit code: 0 done, 1 the run failed, 2 the input cannot be used.
`;

export function runHelp(): string {
  return `noonwell run SCENARIO.json --weather FILE [--step MINUTES] [--hourly OUT.csv]

  SCENARIO.json      a scenario as "noonwell scenario new" prints it or as the app exports it
  --weather FILE     a weather year: ${WEATHER_READERS.map(({ label }) => label).join(', ')}
  --step MINUTES     time step instead of the scenario's: ${STEP_MINUTES.join(', ')}
  --hourly OUT.csv   also writes one row for each weather record: mean powers in W, temperatures in °C;
                     times are the record's start in local standard time

Doubts about the weather file go to standard error and do not stop the run.

Keys of the summary on standard output:
${table(summaryFigures().map(({ path, unit, description }) => [path, unitText(unit), description]))}`;
}

export function scenarioHelp(): string {
  return `noonwell scenario new [--receiver ${RECEIVER_KINDS.join('|')}]

  --receiver KIND    what stands at the focus; ${RECEIVER_KINDS[0]} without it

Fields of a scenario (a field of one variant is read only where that variant is chosen):
${table(
  scenarioFields()
    .flatMap((field) => [field, ...(field.columns ?? [])])
    .map((field) => [field.path, unitText(field.unit), rangeText(field), field.label]),
)}`;
}

function rangeText(field: ScenarioField): string {
  if (field.choices !== undefined) return Object.keys(field.choices).join(' | ');
  if (field.mostRows !== undefined) return `0 to ${field.mostRows} rows`;
  if (field.min !== undefined && field.max !== undefined) return `${field.min} to ${field.max}`;
  return '';
}

function unitText(unit: string): string {
  return unit === '1' ? '-' : unit;
}

/** Columns padded to their widest cell, the last one free. */
function table(rows: readonly (readonly string[])[]): string {
  const widths = (rows[0] ?? []).map((_, at) => Math.max(...rows.map((row) => (row[at] ?? '').length)));
  const line = (row: readonly string[]) =>
    `  ${row.map((cell, at) => (at === row.length - 1 ? cell : cell.padEnd(widths[at] ?? 0))).join('  ')}\n`;
  return rows.map(line).join('');
}
