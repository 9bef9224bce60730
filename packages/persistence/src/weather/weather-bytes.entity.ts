import { defineEntity, p, type InferEntity } from '@mikro-orm/core';
import { workspaceFilter } from '../tenancy/tenant.js';

/** The uploaded file, byte for byte. */
export const WeatherOriginal = defineEntity({
  name: 'WeatherOriginal',
  tableName: 'weather_originals',
  filters: workspaceFilter,
  properties: {
    weatherYearId: p.uuid().primary(),
    workspaceId: p.uuid(),
    bytes: p.uint8array(),
  },
});
export type WeatherOriginal = InferEntity<typeof WeatherOriginal>;

/** The year the engine reads, as `encodeWeatherYear` of @noonwell/weather writes it. */
export const WeatherColumns = defineEntity({
  name: 'WeatherColumns',
  tableName: 'weather_columns',
  filters: workspaceFilter,
  properties: {
    weatherYearId: p.uuid().primary(),
    workspaceId: p.uuid(),
    bytes: p.uint8array(),
  },
});
export type WeatherColumns = InferEntity<typeof WeatherColumns>;
