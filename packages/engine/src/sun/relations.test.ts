import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { propertyRuns } from '../../validation/property-runs.js';
import { DomainError } from '../errors.js';
import { absoluteAirMass, kastenYoungAirMass } from './air-mass.js';
import { meinelClearSkyBeamWm2 } from './clear-sky.js';
import { erbsDiffuseFraction } from './erbs.js';
import { extraterrestrialNormalWm2 } from './extraterrestrial.js';
import { cosIncidence } from './incidence.js';

const RAD = Math.PI / 180;
const elevation = fc.double({ min: 0, max: Math.PI / 2, noNaN: true });

describe('air mass', () => {
  it('grows as the sun sinks and equals 1 at the zenith within 0.03 %', () => {
    fc.assert(
      fc.property(elevation, elevation, (a, b) => {
        if (a < b - 1e-9) expect(kastenYoungAirMass(a)).toBeGreaterThan(kastenYoungAirMass(b));
      }),
      propertyRuns,
    );
    expect(Math.abs(kastenYoungAirMass(Math.PI / 2) - 1)).toBeLessThan(3e-4);
  });

  it('is refused below the horizon rather than invented', () => {
    expect(() => kastenYoungAirMass(-0.001)).toThrow(DomainError);
    expect(() => absoluteAirMass(1, -1)).toThrow('air pressure');
  });
});

describe('extraterrestrial irradiance', () => {
  it('is highest in early January, lowest in early July', () => {
    const days = Array.from({ length: 365 }, (_, i) => extraterrestrialNormalWm2(i + 1));
    expect(days.indexOf(Math.max(...days)) + 1).toBe(365);
    expect([182, 183]).toContain(days.indexOf(Math.min(...days)) + 1);
    expect(() => extraterrestrialNormalWm2(0)).toThrow(DomainError);
    expect(() => extraterrestrialNormalWm2(367)).toThrow(DomainError);
  });
});

describe('clear-sky beam', () => {
  it('is nothing without sun, rises with the sun and with altitude, and stays under the beam outside the air', () => {
    expect(meinelClearSkyBeamWm2(0, 300)).toBe(0);
    expect(meinelClearSkyBeamWm2(-0.3, 300)).toBe(0);
    expect(meinelClearSkyBeamWm2(20 * RAD, 0)).toBeGreaterThan(meinelClearSkyBeamWm2(10 * RAD, 0));
    expect(meinelClearSkyBeamWm2(20 * RAD, 2000)).toBeGreaterThan(meinelClearSkyBeamWm2(20 * RAD, 0));
    expect(meinelClearSkyBeamWm2(90 * RAD, 7000)).toBeLessThan(1353);
    expect(() => meinelClearSkyBeamWm2(1, 9000)).toThrow('altitude');
  });
});

describe('diffuse fraction', () => {
  it('falls from all diffuse to 0.165, its branches meeting within the fit', () => {
    expect(erbsDiffuseFraction(0)).toBe(1);
    expect(erbsDiffuseFraction(1.3)).toBe(0.165);
    for (const joint of [0.22, 0.8]) {
      const step = erbsDiffuseFraction(joint) - erbsDiffuseFraction(joint + 1e-9);
      expect(Math.abs(step)).toBeLessThan(2e-3);
    }
    expect(() => erbsDiffuseFraction(-0.01)).toThrow(DomainError);
    expect(() => erbsDiffuseFraction(NaN)).toThrow(DomainError);
  });
});

describe('cosine of incidence', () => {
  it('is 1 on a plane that faces the sun and 0 on one edge-on to it, wherever the sun stands', () => {
    fc.assert(
      fc.property(elevation, fc.double({ min: 0, max: 2 * Math.PI, noNaN: true }), (h, azimuth) => {
        expect(cosIncidence(h, azimuth, Math.PI / 2 - h, azimuth)).toBeCloseTo(1, 12);
        expect(cosIncidence(h, azimuth, Math.PI / 2, azimuth + Math.PI / 2)).toBeCloseTo(0, 12);
        expect(cosIncidence(h, azimuth, 0, 1)).toBeCloseTo(Math.sin(h), 12);
      }),
      propertyRuns,
    );
  });

  it('keeps the sign when the sun is behind, and refuses what is no angle', () => {
    expect(cosIncidence(0, 0, Math.PI / 2, Math.PI)).toBeCloseTo(-1, 12);
    expect(() => cosIncidence(0, NaN, 1, 0)).toThrow(DomainError);
    expect(() => cosIncidence(0, 0, -1, 0)).toThrow('tilt');
  });
});
