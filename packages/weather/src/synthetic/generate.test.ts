import { createHash } from 'node:crypto';
import { describe, expect, it } from 'vitest';
import { sunPosition } from '@noonwell/engine';
import { readSyntheticPlace, SYNTHETIC_PLACES } from '@noonwell/testkit';
import {
  encodeWeatherYear,
  findSunOffset,
  generateSyntheticYear,
  summariseWeather,
  syntheticPlaceSchema,
} from '../index.js';

/**
 * What each invented climate must be, so that the demo's story holds: yearly beam [kWh/m²], coldest and warmest
 * hour [°C]; and the checksum of its rounded values, which changes only with the generator or the sun position.
 */
const CLIMATES = {
  brackenfold: {
    dni: [2200, 2700],
    coldest: [-10, 2],
    warmest: [33, 42],
    sha256: '712d9ef3378806c2f90535c2c59966aa251a7243f92de37b8b77bfac1b8bf0ec',
  },
  'tarn-lane': {
    dni: [800, 1100],
    coldest: [-6, 3],
    warmest: [20, 30],
    sha256: '1411406211c2e0c98b539c23565d777f594693a0e29bb5dcd95c3cde3f85b5f2',
  },
  'three-alders': {
    dni: [1200, 1600],
    coldest: [-35, -18],
    warmest: [28, 38],
    sha256: '8f70cbc8d7b5ca5ac65a0e7826b45581ec0e41d7a07380536e645b3640a76c42',
  },
} as const;

describe.each(SYNTHETIC_PLACES)('synthetic year of %s', (name) => {
  const place = readSyntheticPlace(name);
  const year = generateSyntheticYear(place);
  const expected = CLIMATES[name];

  it('is the same every time', () => {
    const sha256 = createHash('sha256').update(encodeWeatherYear(year)).digest('hex');
    expect(sha256).toBe(expected.sha256);
    expect(encodeWeatherYear(generateSyntheticYear(place))).toEqual(encodeWeatherYear(year));
  });

  it('has its climate', () => {
    const summary = summariseWeather(year);
    const within = (value: number, [low, high]: readonly [number, number]) => value >= low && value <= high;
    expect(within(summary.dniKwhM2, expected.dni), `beam ${summary.dniKwhM2}`).toBe(true);
    expect(within(summary.dryBulbMinC, expected.coldest), `coldest ${summary.dryBulbMinC}`).toBe(true);
    expect(within(summary.dryBulbMaxC, expected.warmest), `warmest ${summary.dryBulbMaxC}`).toBe(true);
  });

  it('closes: GHI is DHI plus the beam on the level, on the clock of hour-ending means', () => {
    const { bestMinutes, monthlyBestMinutes, closureError } = findSunOffset(year, 'end');
    expect(bestMinutes).toBe(-30);
    expect(new Set(monthlyBestMinutes)).toEqual(new Set([-30]));
    expect(closureError).toBeLessThan(0.01);
  });

  it('is dark at night, and has days that differ', () => {
    const sun = { elevationRad: 0, azimuthRad: 0, trueElevationRad: 0 };
    const rad = Math.PI / 180;
    let darkHours = 0;
    for (let at = 0; at < 8760; at += 1) {
      const utcMs = year.startLocalMs[at]! + (0.5 - place.utcOffsetHours) * 3_600_000;
      sunPosition(utcMs, place.latitudeDeg * rad, place.longitudeDeg * rad, 100_000, 10, sun);
      if (sun.elevationRad > -9 * rad) continue;
      darkHours += 1;
      expect([year.dniWm2[at], year.ghiWm2[at], year.dhiWm2[at]]).toEqual([0, 0, 0]);
    }
    expect(darkHours).toBeGreaterThan(3000);
    const julyBeam = Array.from({ length: 31 }, (_, day) =>
      year.dniWm2.slice((181 + day) * 24, (182 + day) * 24).reduce((sum, value) => sum + value, 0),
    );
    expect(Math.min(...julyBeam)).toBeLessThan(0.6 * Math.max(...julyBeam));
  });

  it('carries the mark "synthetic" and cannot lose it', () => {
    expect(place.origin).toBe('synthetic');
    expect(syntheticPlaceSchema.safeParse({ ...place, origin: 'measured' }).success).toBe(false);
  });
});

it('changes with the seed', () => {
  const place = readSyntheticPlace('tarn-lane');
  const other = generateSyntheticYear({ ...place, seed: place.seed + 1 });
  expect(encodeWeatherYear(other)).not.toEqual(encodeWeatherYear(generateSyntheticYear(place)));
});

it('makes a leap year where the calendar has one', () => {
  const year = generateSyntheticYear({ ...readSyntheticPlace('tarn-lane'), calendarYear: 2020 });
  expect(year.startLocalMs).toHaveLength(8784);
  expect(year.startLocalMs[59 * 24]).toBe(Date.UTC(2020, 1, 29));
  expect(year.firstWeekday).toBe(2);
});
