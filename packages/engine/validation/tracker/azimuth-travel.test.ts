import { describe, expect, it } from 'vitest';
import { emptySunPosition, sunPosition } from '../../src/sun/position.js';
import { azimuthFromEquatorRad, azimuthTravelNeededRad } from '../../src/tracker/azimuth.js';
import { degrees, radians } from '../angles.js';

/** Twice the widest azimuth from the equator's direction with the sun at or above an elevation, minute by minute. */
function travelOverAYearDeg(latitudeDeg: number, elevationMinDeg: number): number {
  const sun = emptySunPosition();
  let widestRad = 0;
  // The widest swing belongs to the weeks about the local summer solstice; the rest of the year is walked coarsely.
  for (let day = 0; day < 365; day++) {
    const nearSolstice = latitudeDeg >= 0 ? Math.abs(day - 171) < 4 : day > 350 && day < 358;
    const stepMinutes = nearSolstice ? 0.5 : 15;
    for (let minute = 0; minute < 1440; minute += stepMinutes) {
      const utcMs = Date.UTC(2025, 0, 1 + day) + minute * 60_000;
      sunPosition(utcMs, radians(latitudeDeg), 0, 101_325, 15, sun);
      if (sun.trueElevationRad < radians(elevationMinDeg)) continue;
      widestRad = Math.max(widestRad, Math.abs(azimuthFromEquatorRad(sun.azimuthRad, radians(latitudeDeg))));
    }
  }
  return degrees(2 * widestRad);
}

describe('azimuth travel over a year', () => {
  // Common practice, no source: about 220° of the 360° are used at such a latitude.
  it.each([0, 5])('at 41.4° N from elevation %d° up is more than 180° and within 250°', (elevationMinDeg) => {
    const travelDeg = travelOverAYearDeg(41.4, elevationMinDeg);
    expect(travelDeg).toBeGreaterThan(180);
    expect(travelDeg).toBeLessThan(250);
  });

  // Half a degree: in half a minute the rising sun turns 0.1° at these latitudes, on both ends of the travel.
  it.each([
    [41.4, 0],
    [41.4, 5],
    [-30, 10],
    [60, 0],
  ])('by the triangle agrees with a walk through the year, %d° from elevation %d°', (latitude, elevation) => {
    const byTriangleDeg = degrees(azimuthTravelNeededRad(radians(latitude), radians(elevation)));
    expect(Math.abs(byTriangleDeg - travelOverAYearDeg(latitude, elevation))).toBeLessThan(0.5);
  });

  it('is a full turn where the sun passes both sides of the zenith or never sets', () => {
    expect(travelOverAYearDeg(10, 5)).toBeGreaterThan(355);
    expect(azimuthTravelNeededRad(radians(10), radians(5))).toBe(2 * Math.PI);
    expect(travelOverAYearDeg(75, 5)).toBeGreaterThan(355);
    expect(azimuthTravelNeededRad(radians(-75), radians(5))).toBe(2 * Math.PI);
  });

  it('is nothing where the sun never stands that high, and refuses the zenith', () => {
    expect(azimuthTravelNeededRad(radians(70), radians(50))).toBe(0);
    expect(() => azimuthTravelNeededRad(0.7, Math.PI / 2)).toThrow('zenith');
  });
});
