import type { WeatherReader } from '../read.js';
import { decodeText } from '../content.js';
import { EPW_FORMAT, readEpwText } from './read.js';

/** EPW in the registry of readers: known by either of the two header lines that it needs. */
export const epwReader: WeatherReader = {
  format: EPW_FORMAT,
  label: 'EPW (hourly year)',
  extensions: ['.epw'],
  recognises: (head) => /^\s*"?(LOCATION|DATA PERIODS)"?,/im.test(head),
  read: (bytes, options) => readEpwText(decodeText(bytes), options),
};
