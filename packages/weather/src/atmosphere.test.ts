import { describe, expect, it } from 'vitest';
import { standardAltitudeM, standardPressurePa } from './index.js';

describe('standard atmosphere', () => {
  // ISO 2533:1975, table of pressure against geopotential altitude (values from memory).
  it.each([
    [0, 101325],
    [1000, 89874.6],
    [2000, 79495.2],
    [5000, 54019.9],
    [11000, 22632.1],
  ])('has at %d m a pressure of %d Pa', (altitudeM, pressurePa) => {
    expect(standardPressurePa(altitudeM)).toBeCloseTo(pressurePa, 0);
    expect(standardAltitudeM(standardPressurePa(altitudeM))).toBeCloseTo(altitudeM, 6);
  });

  it('refuses what lies outside', () => {
    expect(() => standardPressurePa(12_000)).toThrow(/altitude is 12000/);
    expect(() => standardPressurePa(NaN)).toThrow(/altitude/);
    expect(() => standardAltitudeM(0)).toThrow(/pressure/);
  });
});
