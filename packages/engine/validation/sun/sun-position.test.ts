import { Body, Equator, Horizon, Observer } from 'astronomy-engine';
import { describe, expect, it } from 'vitest';
import { emptySunPosition, sunPosition } from '../../src/sun/position.js';
import { refractionRad } from '../../src/sun/refraction.js';
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

  it('lifts the sun of that example as the paper does (value from memory)', () => {
    const { trueElevationDeg, refractionDeg, pressurePa, dryBulbC } = REDA_ANDREAS_EXAMPLE;
    const liftDeg = degrees(refractionRad(radians(trueElevationDeg), pressurePa, dryBulbC));
    expect(Math.abs(liftDeg - refractionDeg)).toBeLessThan(SUN_TOLERANCES.refractionDeg);
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

  it('has the parallax of an observer on the ground: no mean error in elevation over a year', () => {
    // On the equator, where an error of the declination raises one half of the year and lowers the other.
    const observer = new Observer(0, 0, 0);
    const sun = emptySunPosition();
    const errorsDeg: number[] = [];
    for (let utcMs = Date.UTC(2025, 0, 1); utcMs < Date.UTC(2026, 0, 1); utcMs += 187 * 60_000) {
      const date = new Date(utcMs);
      const equator = Equator(Body.Sun, date, observer, true, true);
      const truth = Horizon(date, observer, equator.ra, equator.dec);
      sunPosition(utcMs, 0, 0, 101_325, 15, sun);
      errorsDeg.push(degrees(sun.trueElevationRad) - truth.altitude);
    }
    const meanDeg = errorsDeg.reduce((sum, error) => sum + error, 0) / errorsDeg.length;
    expect(Math.abs(meanDeg)).toBeLessThan(SUN_TOLERANCES.yearElevationBiasDeg);
  });
});
