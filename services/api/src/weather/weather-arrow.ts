import { WEATHER_CHANNELS, type WeatherYear } from '@noonwell/engine';
import { tableFromArrays, tableToIPC } from 'apache-arrow';

/** Start times and measured channels of a weather year as an Arrow IPC stream. */
export function weatherColumnsStream(year: WeatherYear): Uint8Array {
  const channels = Object.fromEntries(WEATHER_CHANNELS.map((channel) => [channel, year[channel]]));
  return tableToIPC(tableFromArrays({ startLocalMs: year.startLocalMs, ...channels }), 'stream');
}
