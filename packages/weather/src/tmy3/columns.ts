import type { WeatherChannel } from '@noonwell/engine';

/** Names of the columns without their units. Source: NREL/TP-581-43156 (Wilcox & Marion 2008), table of the data fields. */
export const TMY3_NAMES: Readonly<Record<WeatherChannel, string>> = {
  dniWm2: 'DNI',
  ghiWm2: 'GHI',
  dhiWm2: 'DHI',
  dryBulbC: 'Dry-bulb',
  windMs: 'Wspd',
  relativeHumidityPct: 'RHum',
  pressurePa: 'Pressure',
};
export const TMY3_DATE = 'Date (MM/DD/YYYY)';
export const TMY3_TIME = 'Time (HH:MM)';
