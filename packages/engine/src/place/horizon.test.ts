import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { degrees, radians } from '../../validation/angles.js';
import { documentedExamples, evaluateExample } from '../../validation/documented-examples.js';
import { propertyRuns } from '../../validation/property-runs.js';
import { DomainError } from '../errors.js';
import { HorizonProfile, horizonElevationRad } from './horizon.js';

const profile = (...points: (readonly [azimuthDeg: number, elevationDeg: number])[]) =>
  points.map(([azimuthDeg, elevationDeg]) => ({
    azimuthRad: radians(azimuthDeg),
    elevationRad: radians(elevationDeg),
  }));

describe('horizonElevationRad', () => {
  it.each(documentedExamples(new URL('.', import.meta.url)))('$file: $expression', (example) => {
    const value = evaluateExample(example, { horizonElevationRad, degrees, radians });
    expect(Math.abs(value - example.promised)).toBeLessThanOrEqual(example.halfUnit);
  });

  // Worked by hand: 350° → 20° is 30° wide and rises by 6°, 20° → 350° the other way 330° wide.
  it.each([
    [350, 4],
    [0, 6],
    [5, 7],
    [20, 10],
    [360, 6],
    [-10, 4],
    [365, 7],
    [185, 7],
    [53, 9.4],
  ])('at %f° is %f°', (azimuthDeg, elevationDeg) => {
    const points = profile([350, 4], [20, 10]);
    expect(degrees(horizonElevationRad(points, radians(azimuthDeg)))).toBeCloseTo(elevationDeg, 10);
  });

  it('is level without a point and the same all round with one', () => {
    expect(horizonElevationRad([], 3)).toBe(0);
    for (const azimuthDeg of [0, 89, 90, 91, 359]) {
      expect(horizonElevationRad(profile([90, 12]), radians(azimuthDeg))).toBe(radians(12));
    }
  });

  it('goes through its points, whatever their order, and never beyond the two beside a direction', () => {
    const point = fc.tuple(fc.integer({ min: 0, max: 359 }), fc.integer({ min: 0, max: 90 }));
    const points = fc.uniqueArray(point, { minLength: 2, maxLength: 60, selector: ([azimuth]) => azimuth });
    fc.assert(
      fc.property(points, fc.double({ min: 0, max: 360, noNaN: true }), (chosen, azimuthDeg) => {
        const sorted = [...chosen].sort(([one], [other]) => one - other);
        const read = new HorizonProfile(profile(...chosen));
        for (const [at, elevation] of chosen) {
          expect(degrees(read.elevationRad(radians(at)))).toBeCloseTo(elevation, 9);
        }
        const beyond = sorted.find(([at]) => at > azimuthDeg) ?? sorted[0]!;
        const before = sorted.findLast(([at]) => at <= azimuthDeg) ?? sorted.at(-1)!;
        const value = degrees(read.elevationRad(radians(azimuthDeg)));
        expect(value).toBeGreaterThanOrEqual(Math.min(before[1], beyond[1]) - 1e-9);
        expect(value).toBeLessThanOrEqual(Math.max(before[1], beyond[1]) + 1e-9);
      }),
      propertyRuns,
    );
  });

  it.each([
    ['azimuth of horizon point 2', profile([0, 1], [361, 1])],
    ['elevation of horizon point 1', profile([0, 91])],
    ['elevation of horizon point 1', profile([0, -1])],
    ['each direction once', profile([0, 1], [90, 2], [360, 3])],
  ])('names what is wrong: %s', (words, points) => {
    expect(() => new HorizonProfile(points)).toThrow(DomainError);
    expect(() => new HorizonProfile(points)).toThrow(words);
  });

  it('refuses a direction that is no number', () => {
    expect(() => horizonElevationRad([], NaN)).toThrow('azimuth');
  });
});
