/**
 * A weather year as the engine reads it. An edge structure: angles in degrees, temperatures in °C.
 *
 * All columns have one entry a record. A record is the mean over `intervalMinutes` that *starts* at
 * `startLocalMs`: local standard time (fixed offset, no daylight saving) written as milliseconds since
 * 1970-01-01T00:00 as if it were UTC. Each record carries its own calendar year, because typical years
 * join months of different years and the sun must stand where it stood when the beam was measured.
 */
export interface WeatherYear {
  readonly latitudeDeg: number;
  /** East positive. */
  readonly longitudeDeg: number;
  readonly altitudeM: number;
  readonly utcOffsetHours: number;
  readonly intervalMinutes: number;
  /** Weekday of the first record: 0 Monday … 6 Sunday. */
  readonly firstWeekday: number;
  readonly startLocalMs: Float64Array;
  readonly dniWm2: Float64Array;
  readonly ghiWm2: Float64Array;
  readonly dhiWm2: Float64Array;
  readonly dryBulbC: Float64Array;
  readonly windMs: Float64Array;
  readonly relativeHumidityPct: Float64Array;
  readonly pressurePa: Float64Array;
  /** Bit set of `WeatherFlag`, one entry a record. */
  readonly flags: Uint16Array;
}

/** The measured channels of a weather year, in the order they are stored. */
export const WEATHER_CHANNELS = [
  'dniWm2',
  'ghiWm2',
  'dhiWm2',
  'dryBulbC',
  'windMs',
  'relativeHumidityPct',
  'pressurePa',
] as const;
export type WeatherChannel = (typeof WEATHER_CHANNELS)[number];

/**
 * Lowest and highest value of each channel that a run accepts, in the channel's unit. Readers refuse what lies
 * outside with line and column; no irradiance at the ground, averaged over minutes or longer, reaches 2000 W/m².
 */
export const WEATHER_CHANNEL_RANGE = {
  dniWm2: [0, 2000],
  ghiWm2: [0, 2000],
  dhiWm2: [0, 2000],
  dryBulbC: [-90, 70],
  windMs: [0, 120],
  relativeHumidityPct: [0, 110],
  pressurePa: [30_000, 120_000],
} as const satisfies Readonly<Record<WeatherChannel, readonly [number, number]>>;

/** What was done to a record when it was read. */
export const WEATHER_FLAG = {
  filledDryBulb: 1,
  filledWind: 2,
  filledHumidity: 4,
  pressureFromAltitude: 8,
  clippedIrradiance: 16,
  clippedHumidity: 32,
  filledIrradiance: 64,
  filledPressure: 128,
} as const;
export type WeatherFlag = keyof typeof WEATHER_FLAG;
