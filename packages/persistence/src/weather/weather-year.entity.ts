import { defineEntity, p, type InferEntity } from '@mikro-orm/core';
import type { WeatherSummary } from '@noonwell/schema';
import { User } from '../identity/user.entity.js';
import { createdAtProperty, tenantProperties, workspaceFilter } from '../tenancy/tenant.js';

/** A weather year as it is listed; its columns and the file it came from are rows of their own. */
export const WeatherYear = defineEntity({
  name: 'WeatherYear',
  tableName: 'weather_years',
  filters: workspaceFilter,
  properties: {
    ...tenantProperties(),
    name: p.text(),
    format: p.text(),
    synthetic: p.boolean(),
    latitudeDeg: p.double().$type<number>(),
    longitudeDeg: p.double().$type<number>(),
    altitudeM: p.double().$type<number>(),
    utcOffsetHours: p.double().$type<number>(),
    originalFileName: p.text(),
    originalBytes: p.integer(),
    originalSha256: p.text(),
    warnings: p.json<readonly string[]>(),
    summary: p.json<WeatherSummary>(),
    createdAt: createdAtProperty(),
    createdBy: p.manyToOne(User).ref(),
  },
});
export type WeatherYear = InferEntity<typeof WeatherYear>;
