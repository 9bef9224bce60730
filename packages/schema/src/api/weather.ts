import { z } from 'zod';
import { idSchema, instantSchema } from './common.js';

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
