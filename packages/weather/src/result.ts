import type { WeatherYear } from '@noonwell/engine';
import type { TableStatement, WeatherSummary } from '@noonwell/schema';
import type { WeatherProblem } from './problem.js';
import type { MissingStatement } from './table/complete.js';

/** What a weather file says about itself; empty where it says nothing. */
export interface WeatherHeader {
  /** "City, region, country" as far as stated. */
  readonly placeName: string;
  readonly city: string;
  readonly region: string;
  readonly country: string;
  /** Origin of the data as the file names it. */
  readonly source: string;
  /** Number of the station with the World Meteorological Organization, as text. */
  readonly wmo: string;
}

export interface WeatherAccepted {
  readonly kind: 'accepted';
  /** Name of the reader: "epw" … */
  readonly format: string;
  readonly year: WeatherYear;
  readonly header: WeatherHeader;
  readonly summary: WeatherSummary;
  /** For a plain table everything that was stated or found, as it was applied: the same statement reads the same year. Null for other formats. */
  readonly statement: TableStatement | null;
  /** Minutes added to the label of a record that make GHI = DHI + DNI cos z close best; null where too few sunny records exist. */
  readonly sunOffsetMinutes: number | null;
  /** Plain sentences: what was repaired and what looks doubtful. */
  readonly warnings: readonly string[];
}

export interface WeatherRefused {
  readonly kind: 'refused';
  /** Null where no reader recognised the content. */
  readonly format: string | null;
  /** The first problems in the file's order. */
  readonly problems: readonly WeatherProblem[];
  /** All problems found, listed or not. */
  readonly problemCount: number;
  /** What must still be stated before a plain table can be read; its problems say the same. Absent otherwise. */
  readonly missing?: readonly MissingStatement[];
}

export type WeatherReadResult = WeatherAccepted | WeatherRefused;

export interface WeatherReadOptions {
  /** Called with the fraction read, 0 … 1, about twenty times. */
  readonly onProgress?: (fraction: number) => void;
  /** What a person states about a plain table; other formats say it themselves. */
  readonly statement?: TableStatement;
}
