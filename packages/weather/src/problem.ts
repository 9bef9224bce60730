import { LISTED_PROBLEMS } from './limits.js';

/** Why a weather file is refused: where, what stands there, why it cannot stay, what to do. */
export interface WeatherProblem {
  /** Line of the file, counted from 1; null where the problem is the whole file's. */
  readonly line: number | null;
  /** Cell of that line, counted from 1. */
  readonly column: number | null;
  readonly columnName: string | null;
  /** The offending text as it stands in the file, shortened to 60 characters. */
  readonly value: string | null;
  readonly reason: string;
  readonly fix: string;
}

const LONGEST_VALUE = 60;

/** Collects problems: keeps the first `LISTED_PROBLEMS` and counts the rest, so that a ruined file cannot flood memory or screen. */
export class ProblemList {
  readonly listed: WeatherProblem[] = [];
  count = 0;

  add(problem: Pick<WeatherProblem, 'reason' | 'fix'> & Partial<WeatherProblem>): void {
    this.count += 1;
    if (this.listed.length >= LISTED_PROBLEMS) return;
    const { line = null, column = null, columnName = null, value = null, reason, fix } = problem;
    this.listed.push({
      line,
      column,
      columnName,
      value: value === null ? null : shorten(value),
      reason,
      fix,
    });
  }
}

function shorten(value: string): string {
  return value.length > LONGEST_VALUE ? `${value.slice(0, LONGEST_VALUE)}…` : value;
}

/** One plain sentence or two: "Line 12, column 14 (global horizontal radiation): -3 is negative. …". */
export function describeProblem(problem: WeatherProblem): string {
  const sentence = `${problem.reason} ${problem.fix}`.trim();
  // A part of what is stated beside the file has a name but no line.
  if (problem.line === null && problem.column === null) {
    return problem.columnName === null ? sentence : `${problem.columnName}: ${sentence}`;
  }
  const place: string[] = [];
  if (problem.line !== null) place.push(`line ${problem.line}`);
  if (problem.column !== null) place.push(`column ${problem.column}`);
  const where = place.join(', ') + (problem.columnName === null ? '' : ` (${problem.columnName})`);
  return `${where.charAt(0).toUpperCase()}${where.slice(1)}: ${sentence}`.trim();
}
