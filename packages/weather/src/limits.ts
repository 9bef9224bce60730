/**
 * Largest weather file that is read [bytes]: 64 MiB. The upload route, the browser's drop zone and the
 * command line all take it from here. An hourly year is 1.7 MB, a year of minutes about 50 MB.
 */
export const WEATHER_FILE_LIMIT_BYTES = 64 * 1024 * 1024;

/** Problems listed in full when a file is refused; the rest are counted. */
export const LISTED_PROBLEMS = 20;
