import { Body, Equator, Horizon, Observer } from 'astronomy-engine';
import { describe, expect, it } from 'vitest';
import { emptySunPosition, sunPosition } from '../../src/sun/position.js';
import { angularSeparationRad, degrees, radians } from '../angles.js';
import { REDA_ANDREAS_EXAMPLE, YEAR_LATITUDES_DEG } from './cases.js';
import { SUN_TOLERANCES } from './tolerances.js';

describe('sun position against published values', () => {
  it('meets the worked example of Reda & Andreas 2004', () => {
    const example = REDA_ANDREAS_EXAMPLE;
    const sun = emptySunPosition();
    sunPosition(
      example.utcMs,
      radians(example.latitudeDeg),
      radians(example.longitudeDeg),
      example.pressurePa,
      example.dryBulbC,
      sun,
    );
    expect(Math.abs(90 - degrees(sun.elevationRad) - example.zenithDeg)).toBeLessThan(
      SUN_TOLERANCES.publishedExampleDeg,
    );
    expect(Math.abs(degrees(sun.azimuthRad) - example.azimuthDeg)).toBeLessThan(
      SUN_TOLERANCES.publishedExampleDeg,
    );
  });

  it.each(YEAR_LATITUDES_DEG)(
    'stays with a full ephemeris through a year at latitude %d°, refraction left out',
    (latitudeDeg) => {
      const longitudeDeg = -71.5;
      const observer = new Observer(latitudeDeg, longitudeDeg, 0);
      const sun = emptySunPosition();
      let worstDeg = 0;
      // Steps of 3 h 7 min walk through every hour of the day, the night included.
      for (let utcMs = Date.UTC(2025, 0, 1); utcMs < Date.UTC(2026, 0, 1); utcMs += 187 * 60_000) {
        const date = new Date(utcMs);
        const equator = Equator(Body.Sun, date, observer, true, true);
        const truth = Horizon(date, observer, equator.ra, equator.dec);
        sunPosition(utcMs, radians(latitudeDeg), radians(longitudeDeg), 101_325, 15, sun);
        const separationRad = angularSeparationRad(
          sun.trueElevationRad,
          sun.azimuthRad,
          radians(truth.altitude),
          radians(truth.azimuth),
        );
        worstDeg = Math.max(worstDeg, degrees(separationRad));
      }
      expect(worstDeg).toBeGreaterThan(0);
      expect(worstDeg).toBeLessThan(SUN_TOLERANCES.yearSeparationDeg);
    },
  );
});
