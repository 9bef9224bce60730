import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { documentedExamples, evaluateExample } from '../../validation/documented-examples.js';
import { propertyRuns } from '../../validation/property-runs.js';
import * as water from './water.js';

const {
  waterConductivityWmK,
  waterDensityKgM3,
  waterEnthalpyJkg,
  waterHeatCapacityJkgK,
  waterTemperatureC,
  waterTemperatureNearC,
  waterViscosityPas,
} = water;

const temperature = fc.double({ min: -100, max: 400, noNaN: true });

describe('water', () => {
  it.each(documentedExamples(new URL('.', import.meta.url)))('$file: $expression', (example) => {
    expect(Math.abs(evaluateExample(example, water) - example.promised)).toBeLessThanOrEqual(
      example.halfUnit,
    );
  });

  it('has an enthalpy of exactly zero at 0 °C', () => {
    expect(waterEnthalpyJkg(0)).toBe(0);
    expect(waterTemperatureC(0)).toBe(0);
  });

  it('inverts enthalpy to 1e-12 and the near inverse to 1e-4 K', () => {
    fc.assert(
      fc.property(temperature, (tC) => {
        const h = waterEnthalpyJkg(tC);
        expect(Math.abs(waterTemperatureC(h) - tC)).toBeLessThanOrEqual(1e-12 * Math.max(1, Math.abs(tC)));
        expect(Math.abs(waterTemperatureNearC(h) - tC)).toBeLessThanOrEqual(1e-4);
      }),
      propertyRuns,
    );
  });

  it('has heat capacity as the slope of enthalpy everywhere, the joins of the straight ends included', () => {
    for (let tC = -20; tC <= 220; tC += 0.5) {
      const step = 1e-3;
      const slope = (waterEnthalpyJkg(tC + step) - waterEnthalpyJkg(tC - step)) / (2 * step);
      expect(Math.abs(slope / waterHeatCapacityJkgK(tC) - 1)).toBeLessThan(1e-5);
    }
  });

  it('has an enthalpy that grows with temperature, however small the step', () => {
    fc.assert(
      fc.property(temperature, fc.double({ min: 1e-9, max: 50, noNaN: true }), (tC, rise) => {
        expect(waterEnthalpyJkg(tC + rise)).toBeGreaterThan(waterEnthalpyJkg(tC));
      }),
      propertyRuns,
    );
  });

  it('holds density, viscosity and conductivity at the ends beyond the range', () => {
    for (const property of [
      waterDensityKgM3,
      waterViscosityPas,
      waterConductivityWmK,
      waterHeatCapacityJkgK,
    ]) {
      expect(property(-40)).toBe(property(0));
      expect(property(500)).toBe(property(200));
      expect(property(Number.MAX_VALUE)).toBe(property(200));
    }
  });

  it('passes a NaN on, so that it cannot hide', () => {
    expect(waterEnthalpyJkg(Number.NaN)).toBeNaN();
    expect(waterTemperatureC(Number.NaN)).toBeNaN();
    expect(waterDensityKgM3(Number.NaN)).toBeNaN();
  });
});
