import type { Machine } from '../machine.js';
import type { WeatherYear } from '../weather-year.js';
import type { RunResult } from './result.js';

/** A run that goes on record by record, so that its caller can report progress and stop it. */
export interface YearRun {
  readonly records: number;
  readonly done: number;
  /** Runs up to so many more records. */
  advance(records: number): void;
  /** Checks the ledger and gives the result; throws a RunError while records are left or a part does not balance. */
  finish(): RunResult;
}

export declare function createYearRun(machine: Machine, weather: WeatherYear): YearRun;
export declare function runYear(machine: Machine, weather: WeatherYear): RunResult;
