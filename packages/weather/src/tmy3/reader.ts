import type { WeatherReader } from '../read.js';
import { readTmy3, TMY3_FORMAT } from './read.js';

/** TMY3 in the registry of readers: known by the first heading of its second line. */
export const tmy3Reader: WeatherReader = {
  format: TMY3_FORMAT,
  label: 'TMY3 (hourly typical year)',
  extensions: ['.csv'],
  recognises: (head) => /^[^\r\n]*(?:\r\n|\n|\r)\s*"?Date \(MM\/DD\/YYYY\)/i.test(head),
  read: readTmy3,
};
