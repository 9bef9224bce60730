import type { WeatherChannel } from '@noonwell/engine';
import type {
  TableClock,
  TableDateOrder,
  TableDecimalMark,
  TableDelimiter,
  TableEncoding,
  TableLabel,
} from '@noonwell/schema';
import type { TimeLayout } from './time.js';
import type { TableUnit } from './units.js';

export interface PlannedColumn {
  readonly channel: WeatherChannel;
  /** Index of the cell, from 0. */
  readonly at: number;
  /** As messages call it: the file's own heading. */
  readonly heading: string;
  readonly unit: TableUnit;
}

/** How a table is read, whether a person stated it or the format fixes it. */
export interface ReadPlan {
  readonly format: string;
  readonly encoding: TableEncoding;
  readonly delimiter: TableDelimiter;
  readonly decimalMark: TableDecimalMark;
  /** From 1. */
  readonly firstDataLine: number;
  readonly time: TimeLayout;
  readonly dateOrder: TableDateOrder;
  readonly label: TableLabel;
  readonly clock: TableClock;
  readonly intervalMinutes: number;
  readonly latitudeDeg: number;
  readonly longitudeDeg: number;
  readonly altitudeM: number;
  readonly utcOffsetHours: number;
  readonly columns: readonly PlannedColumn[];
}
