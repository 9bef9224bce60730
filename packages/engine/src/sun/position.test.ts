import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { propertyRuns } from '../../validation/property-runs.js';
import { DomainError } from '../errors.js';
import { emptySunPosition, sunPosition } from './position.js';
import { refractionRad, suncalcRefractionRad, trueFromSuncalcRad } from './refraction.js';

const RAD = Math.PI / 180;

describe('sunPosition', () => {
  it('takes the refraction away exactly, above and below the horizon', () => {
    fc.assert(
      fc.property(fc.double({ min: -Math.PI / 2, max: Math.PI / 2, noNaN: true }), (trueRad) => {
        const undone = trueFromSuncalcRad(trueRad + suncalcRefractionRad(trueRad));
        expect(Math.abs(undone - trueRad)).toBeLessThan(1e-14);
      }),
      propertyRuns,
    );
  });

  it('lifts the sun by the density of the air: half the pressure, half the lift', () => {
    const lift = refractionRad(5 * RAD, 100_000, 10);
    expect(refractionRad(5 * RAD, 50_000, 10)).toBeCloseTo(lift / 2, 15);
    expect(refractionRad(5 * RAD, 100_000, 40)).toBeLessThan(lift);
  });

  it('lifts nothing once the upper limb is under the horizon', () => {
    expect(refractionRad(-0.9 * RAD, 101_325, 10)).toBe(0);
    expect(refractionRad(-0.8 * RAD, 101_325, 10)).toBeGreaterThan(0.4 * RAD);
  });

  it('gives a sun that is north at noon in the south and rises in the east', () => {
    const sun = emptySunPosition();
    sunPosition(Date.UTC(2024, 11, 21, 12), -35 * RAD, 0, 101_325, 20, sun);
    expect(Math.cos(sun.azimuthRad)).toBeGreaterThan(0.99);
    sunPosition(Date.UTC(2024, 2, 20, 6, 30), 40 * RAD, 0, 101_325, 20, sun);
    expect(sun.azimuthRad / RAD).toBeGreaterThan(85);
    expect(sun.azimuthRad / RAD).toBeLessThan(100);
  });

  it('gives finite angles in range anywhere, at the poles too', () => {
    const sun = emptySunPosition();
    fc.assert(
      fc.property(
        fc.integer({ min: Date.UTC(1900, 0, 1), max: Date.UTC(2150, 0, 1) }),
        fc.double({ min: -90, max: 90, noNaN: true }),
        fc.double({ min: -180, max: 180, noNaN: true }),
        (utcMs, latitudeDeg, longitudeDeg) => {
          sunPosition(utcMs, latitudeDeg * RAD, longitudeDeg * RAD, 101_325, 15, sun);
          expect(Math.abs(sun.elevationRad)).toBeLessThanOrEqual(Math.PI / 2);
          expect(sun.elevationRad).toBeGreaterThanOrEqual(sun.trueElevationRad - 1e-4);
          expect(sun.azimuthRad).toBeGreaterThanOrEqual(0);
          expect(sun.azimuthRad).toBeLessThan(2 * Math.PI);
        },
      ),
      propertyRuns,
    );
  });

  it.each([
    ['instant', [NaN, 0, 0, 101_325, 15]],
    ['latitude', [0, 1.6, 0, 101_325, 15]],
    ['longitude', [0, 0, Infinity, 101_325, 15]],
    ['air pressure', [0, 0, 0, 1013, 15]],
    ['dry-bulb', [0, 0, 0, 101_325, NaN]],
  ] as const)('refuses an impossible %s by name and leaves the output alone', (name, input) => {
    const sun = emptySunPosition();
    const call = (): void => {
      const [utcMs, latitudeRad, longitudeRad, pressurePa, dryBulbC] = input;
      sunPosition(utcMs, latitudeRad, longitudeRad, pressurePa, dryBulbC, sun);
    };
    expect(call).toThrow(DomainError);
    expect(call).toThrow(name);
    expect(sun).toEqual(emptySunPosition());
  });
});
