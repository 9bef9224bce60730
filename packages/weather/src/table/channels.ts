import type { WeatherChannel, WeatherFlag } from '@noonwell/engine';

/** The channels as they are called in sentences. */
export const CHANNEL_NAMES: Readonly<Record<WeatherChannel, string>> = {
  dniWm2: 'direct normal irradiance',
  ghiWm2: 'global horizontal irradiance',
  dhiWm2: 'diffuse horizontal irradiance',
  dryBulbC: 'dry-bulb temperature',
  windMs: 'wind speed',
  relativeHumidityPct: 'relative humidity',
  pressurePa: 'station pressure',
};

/** The mark of a value that was filled. */
export const FILLED_FLAG: Readonly<Record<WeatherChannel, WeatherFlag>> = {
  dniWm2: 'filledIrradiance',
  ghiWm2: 'filledIrradiance',
  dhiWm2: 'filledIrradiance',
  dryBulbC: 'filledDryBulb',
  windMs: 'filledWind',
  relativeHumidityPct: 'filledHumidity',
  pressurePa: 'filledPressure',
};

export const IRRADIANCE_CHANNELS = ['dniWm2', 'ghiWm2', 'dhiWm2'] as const;

export function isIrradiance(channel: WeatherChannel): boolean {
  return IRRADIANCE_CHANNELS.some((irradiance) => irradiance === channel);
}
