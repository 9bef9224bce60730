import type { WeatherChannel } from '@noonwell/engine';
import { z } from 'zod';
import { idSchema, instantSchema, nameSchema } from './common.js';

/**
 * Units in which each channel of a plain table may stand. Energies (Wh, kJ, MJ) are those of one record's
 * interval. "1" is a fraction.
 */
export const TABLE_UNITS = {
  dniWm2: ['W/m²', 'kW/m²', 'Wh/m²', 'kJ/m²', 'MJ/m²'],
  ghiWm2: ['W/m²', 'kW/m²', 'Wh/m²', 'kJ/m²', 'MJ/m²'],
  dhiWm2: ['W/m²', 'kW/m²', 'Wh/m²', 'kJ/m²', 'MJ/m²'],
  dryBulbC: ['°C', 'K', '°F'],
  windMs: ['m/s', 'km/h', 'kn', 'mph'],
  relativeHumidityPct: ['%', '1'],
  pressurePa: ['Pa', 'hPa', 'mbar', 'kPa'],
} as const satisfies Readonly<Record<WeatherChannel, readonly string[]>>;

/** A column of a plain table and the unit of its values. */
function columnMatchSchema<const Units extends readonly [string, ...string[]]>(units: Units) {
  return z.strictObject({
    /** Counted from 1. */
    column: z.int().min(1).max(500),
    /** May be left out only where the table's heading names it. */
    unit: z.enum(units).optional(),
  });
}

/** What each time label of a table names: the start, the middle or the end of the record's interval. */
export const TABLE_LABELS = ['start', 'middle', 'end'] as const;
/** The clock of the labels; daylight saving time is none of them. */
export const TABLE_CLOCKS = ['localStandard', 'utc'] as const;
export const TABLE_ENCODINGS = ['utf-8', 'latin-1'] as const;
export const TABLE_DELIMITERS = [',', ';', 'tab', '|', 'space'] as const;
export const TABLE_DECIMAL_MARKS = ['point', 'comma'] as const;
/** Year first (ISO), day first, or month first (US). */
export const TABLE_DATE_ORDERS = ['yearFirst', 'dayFirst', 'monthFirst'] as const;

/** Place of a plain table, with the ranges that hold for every weather file. */
export const tablePlaceSchema = z.strictObject({
  name: nameSchema.optional(),
  /** North positive. */
  latitudeDeg: z.number().min(-90).max(90).optional(),
  /** East positive. */
  longitudeDeg: z.number().min(-180).max(180).optional(),
  altitudeM: z.number().min(-500).max(9000).optional(),
  /** Of local standard time. */
  utcOffsetHours: z.number().min(-12).max(14).optional(),
});

/**
 * What a person states about a plain table because the table does not say it. Every part may be left out
 * while it is being filled in: reading refuses with a list of what is still missing. `layout` corrects what
 * was found in the file; without it the file is read as found.
 */
export const tableStatementSchema = z.strictObject({
  label: z.enum(TABLE_LABELS).optional(),
  clock: z.enum(TABLE_CLOCKS).optional(),
  place: tablePlaceSchema.optional(),
  columns: z
    .strictObject({
      dniWm2: columnMatchSchema(TABLE_UNITS.dniWm2),
      ghiWm2: columnMatchSchema(TABLE_UNITS.ghiWm2),
      dhiWm2: columnMatchSchema(TABLE_UNITS.dhiWm2),
      dryBulbC: columnMatchSchema(TABLE_UNITS.dryBulbC),
      windMs: columnMatchSchema(TABLE_UNITS.windMs),
      relativeHumidityPct: columnMatchSchema(TABLE_UNITS.relativeHumidityPct),
      /** Null: the table has none, it follows from the altitude. */
      pressurePa: columnMatchSchema(TABLE_UNITS.pressurePa).nullable(),
    })
    .partial()
    .optional(),
  layout: z
    .strictObject({
      encoding: z.enum(TABLE_ENCODINGS),
      delimiter: z.enum(TABLE_DELIMITERS),
      decimalMark: z.enum(TABLE_DECIMAL_MARKS),
      dateOrder: z.enum(TABLE_DATE_ORDERS),
    })
    .partial()
    .optional(),
});
export type TableStatement = z.infer<typeof tableStatementSchema>;
export type TableLabel = (typeof TABLE_LABELS)[number];
export type TableClock = (typeof TABLE_CLOCKS)[number];
export type TableEncoding = (typeof TABLE_ENCODINGS)[number];
export type TableDelimiter = (typeof TABLE_DELIMITERS)[number];
export type TableDecimalMark = (typeof TABLE_DECIMAL_MARKS)[number];
export type TableDateOrder = (typeof TABLE_DATE_ORDERS)[number];

export const weatherSummarySchema = z.object({
  records: z.int(),
  intervalMinutes: z.int(),
  dniKwhM2: z.number(),
  ghiKwhM2: z.number(),
  dhiKwhM2: z.number(),
  dryBulbMinC: z.number(),
  dryBulbMaxC: z.number(),
  dryBulbMeanC: z.number(),
  windMeanMs: z.number(),
  monthlyDniKwhM2: z.array(z.number()).length(12),
  monthlyGhiKwhM2: z.array(z.number()).length(12),
  monthlyDryBulbMeanC: z.array(z.number()).length(12),
  /** Records with a value that was filled or clipped when the file was read. */
  flaggedRecords: z.int(),
});
export type WeatherSummary = z.infer<typeof weatherSummarySchema>;

export const weatherYearSchema = z.object({
  id: idSchema,
  name: z.string(),
  /** "epw" …: the reader that read it. */
  format: z.string(),
  /** True for years that Noonwell made itself; shown wherever the year is. */
  synthetic: z.boolean(),
  latitudeDeg: z.number(),
  longitudeDeg: z.number(),
  altitudeM: z.number(),
  utcOffsetHours: z.number(),
  originalFileName: z.string(),
  originalBytes: z.int(),
  /** SHA-256 of the original file, hexadecimal. */
  originalSha256: z.string(),
  warnings: z.array(z.string()),
  summary: weatherSummarySchema,
  createdAt: instantSchema,
  createdByName: z.string(),
});
export type WeatherYearView = z.infer<typeof weatherYearSchema>;
