import { describe, expect, it } from 'vitest';
import { region1, saturationPressureMPa } from './if97-region1.js';
import { iapwsConductivityWmK, iapwsViscosityPas } from './transport.js';

/** The references themselves, against the check values their releases print (values from memory). */

function relativeError(value: number, expected: number): number {
  return Math.abs(value / expected - 1);
}

describe('IAPWS-IF97 region 1, Table 5 of R7-97(2012), to 1e-8', () => {
  it.each([
    [300, 3, 0.100215168e-2, 115.331273, 112.324818, 0.392294792, 4.17301218, 1507.73921],
    [300, 80, 0.971180894e-3, 184.142828, 106.448356, 0.368563852, 4.01008987, 1634.69054],
    [500, 3, 0.1202418e-2, 975.542239, 971.934985, 2.58041912, 4.65580682, 1240.71337],
  ])('at %d K and %d MPa', (temperatureK, pressureMPa, v, h, u, s, cp, w) => {
    const state = region1(temperatureK, pressureMPa);
    // The table prints nine digits: half of its last digit is at most 5e-9.
    for (const [key, expected] of Object.entries({ v, h, u, s, cp, w })) {
      expect(relativeError(state[key as keyof typeof state], expected), key).toBeLessThan(1e-8);
    }
  });

  it('saturation pressure, Table 35', () => {
    expect(relativeError(saturationPressureMPa(300), 0.353658941e-2)).toBeLessThan(1e-8);
    expect(relativeError(saturationPressureMPa(500), 0.263889776e1)).toBeLessThan(1e-8);
    expect(relativeError(saturationPressureMPa(600), 0.123443146e2)).toBeLessThan(1e-8);
  });
});

describe('IAPWS viscosity, Table 4 of R12-08 [µPa·s]', () => {
  it.each([
    [298.15, 998, 889.7351],
    [298.15, 1200, 1437.649467],
    [373.15, 1000, 307.883622],
    [433.15, 1, 14.538324],
    [433.15, 1000, 217.685358],
    [873.15, 1, 32.619287],
    [873.15, 100, 35.802262],
  ])('at %d K and %d kg/m³', (temperatureK, density, expected) => {
    expect(iapwsViscosityPas(temperatureK, density) * 1e6).toBeCloseTo(expected, 5);
  });
});

describe('IAPWS conductivity without enhancement, Table 4 of R15-11 [mW/(m·K)]', () => {
  it.each([
    [298.15, 0, 18.4341883],
    [298.15, 998, 607.712868],
    [298.15, 1200, 799.038144],
    [873.15, 0, 79.1034659],
  ])('at %d K and %d kg/m³', (temperatureK, density, expected) => {
    expect(iapwsConductivityWmK(temperatureK, density) * 1e3).toBeCloseTo(expected, 6);
  });
});
