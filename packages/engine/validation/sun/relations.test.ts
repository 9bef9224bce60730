import { describe, expect, it } from 'vitest';
import { kastenYoungAirMass } from '../../src/sun/air-mass.js';
import { erbsDiffuseFraction } from '../../src/sun/erbs.js';
import { cosIncidence } from '../../src/sun/incidence.js';
import { degrees, radians } from '../angles.js';
import { AIR_MASSES, DIFFUSE_FRACTION, INCIDENCE_EXAMPLE } from './cases.js';
import { SUN_TOLERANCES } from './tolerances.js';

describe('relations of the sun against published values', () => {
  it.each(AIR_MASSES)('air mass at zenith $zenithDeg° is $airMass', ({ zenithDeg, airMass }) => {
    const computed = kastenYoungAirMass(radians(90 - zenithDeg));
    expect(Math.abs(computed / airMass - 1)).toBeLessThan(SUN_TOLERANCES.airMassRelative);
  });

  it('diffuse fraction in the middle branch', () => {
    const computed = erbsDiffuseFraction(DIFFUSE_FRACTION.clearnessIndex);
    expect(Math.abs(computed - DIFFUSE_FRACTION.fraction)).toBeLessThan(SUN_TOLERANCES.diffuseFraction);
  });

  it('incidence on a tilted plane, worked example of Duffie & Beckman (value from memory)', () => {
    const example = INCIDENCE_EXAMPLE;
    // Cooper's declination, as the example has it, and the spherical triangle of pole, zenith and sun.
    const declination = radians(23.45 * Math.sin((2 * Math.PI * (284 + example.dayOfYear)) / 365));
    const hourAngle = radians(15 * (example.solarHour - 12));
    const latitude = radians(example.latitudeDeg);
    const elevation = Math.asin(
      Math.sin(latitude) * Math.sin(declination) +
        Math.cos(latitude) * Math.cos(declination) * Math.cos(hourAngle),
    );
    const azimuth =
      Math.PI +
      Math.atan2(
        Math.sin(hourAngle),
        Math.cos(hourAngle) * Math.sin(latitude) - Math.tan(declination) * Math.cos(latitude),
      );
    const incidenceDeg = degrees(
      Math.acos(cosIncidence(elevation, azimuth, radians(example.tiltDeg), radians(example.planeAzimuthDeg))),
    );
    expect(Math.abs(incidenceDeg - example.incidenceDeg)).toBeLessThan(SUN_TOLERANCES.incidenceDeg);
  });
});
