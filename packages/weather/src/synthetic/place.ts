import { z } from 'zod';

/**
 * An invented place and its climate: everything a synthetic year is made from. The files in
 * datasets/synthetic hold such descriptors. Every coefficient is invented.
 */
export const syntheticPlaceSchema = z.strictObject({
  /** The mark that must stay with the year wherever it is shown. */
  origin: z.literal('synthetic'),
  name: z.string().min(1).max(120),
  note: z.string(),
  latitudeDeg: z.number().min(-66).max(66),
  /** East positive. */
  longitudeDeg: z.number().min(-180).max(180),
  altitudeM: z.number().min(0).max(4000),
  utcOffsetHours: z.number().min(-12).max(14),
  /** Calendar year of all records; it decides the first weekday and whether there is a 29 February. */
  calendarYear: z.int().min(1990).max(2049),
  seed: z.int().min(1).max(0xffffffff),
  climate: z.strictObject({
    /** Beam of a cloudless hour over that of the clear-sky relation. */
    clearBeamFactor: z.number().min(0.5).max(1.1),
    /** Typical cover of the sky at midsummer and midwinter, 0 clear … 1 overcast. */
    coverSummer: z.number().min(0.02).max(0.98),
    coverWinter: z.number().min(0.02).max(0.98),
    /** Spread of the day's cover (standard deviation of its logit). */
    coverSpread: z.number().min(0).max(5),
    /** Correlation of one day with the next, for cover, temperature and pressure. */
    dayToDay: z.number().min(0).max(0.98),
    dryBulbMeanC: z.number().min(-30).max(40),
    /** Half the difference of midsummer and midwinter. */
    dryBulbAnnualC: z.number().min(0).max(30),
    /** Half the difference of afternoon and night on a clear day. */
    dryBulbDailyC: z.number().min(0).max(15),
    /** Standard deviation of a day about the season. */
    dryBulbSpreadC: z.number().min(0).max(10),
    /** Dew point under the day's mean temperature, on a clear day. */
    dewPointDepressionC: z.number().min(0).max(30),
    windMeanMs: z.number().min(0).max(12),
    /** Standard deviation of the logarithm of an hour's wind. */
    windSpread: z.number().min(0).max(1),
    /** Afternoon wind over the day's mean, less 1. */
    windDaily: z.number().min(0).max(0.9),
    pressureSpreadPa: z.number().min(0).max(2000),
  }),
});
export type SyntheticPlace = z.infer<typeof syntheticPlaceSchema>;
