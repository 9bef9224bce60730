import type { EntityManager } from '@mikro-orm/postgresql';
import { WeatherColumns, WeatherOriginal, WeatherYear, withWorkspace } from '@noonwell/persistence';
import { syntheticYear } from '@noonwell/testkit';
import { encodeWeatherYear, summariseWeather } from '@noonwell/weather';

let columns: Uint8Array | undefined;

/** A weather year straight into the database: reading a file is another test's business. */
export function addWeatherYear(
  em: EntityManager,
  workspaceId: string,
  userId: string,
  name: string,
): Promise<string> {
  const year = syntheticYear();
  const bytes = (columns ??= encodeWeatherYear(year));
  return withWorkspace(em, workspaceId, async (inner) => {
    const row = inner.create(WeatherYear, {
      workspaceId,
      name,
      format: 'epw',
      synthetic: true,
      latitudeDeg: year.latitudeDeg,
      longitudeDeg: year.longitudeDeg,
      altitudeM: year.altitudeM,
      utcOffsetHours: year.utcOffsetHours,
      originalFileName: 'test.epw',
      originalBytes: 1,
      originalSha256: '0'.repeat(64),
      warnings: [],
      summary: summariseWeather(year),
      createdBy: userId,
    });
    await inner.flush();
    await inner.insert(WeatherColumns, { weatherYearId: row.id, workspaceId, bytes });
    await inner.insert(WeatherOriginal, {
      weatherYearId: row.id,
      workspaceId,
      bytes: new Uint8Array([0x4c]),
    });
    return row.id;
  });
}
