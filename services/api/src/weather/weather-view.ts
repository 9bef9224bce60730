import type { WeatherYear } from '@noonwell/persistence';
import type { WeatherYearView } from '@noonwell/schema';

/** Needs `createdBy` populated. */
export function weatherYearView(year: WeatherYear): WeatherYearView {
  return {
    id: year.id,
    name: year.name,
    format: year.format,
    synthetic: year.synthetic,
    latitudeDeg: year.latitudeDeg,
    longitudeDeg: year.longitudeDeg,
    altitudeM: year.altitudeM,
    utcOffsetHours: year.utcOffsetHours,
    originalFileName: year.originalFileName,
    originalBytes: year.originalBytes,
    originalSha256: year.originalSha256,
    warnings: [...year.warnings],
    summary: year.summary,
    createdAt: year.createdAt.toISOString(),
    createdByName: year.createdBy.getEntity().name,
  };
}
