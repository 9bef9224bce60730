import { describe, expect, it } from 'vitest';
import {
  airConductivityWmK,
  airDensityKgM3,
  airHeatCapacityJkgK,
  airPrandtl,
  airViscosityPas,
} from '../../src/heat-transfer/air.js';
import { counterFlowEffectiveness } from '../../src/heat-transfer/epsilon-ntu.js';
import { flatWindConvectionWm2K } from '../../src/heat-transfer/flat-wind-convection.js';
import { verticalPlateNusselt } from '../../src/heat-transfer/flat-natural-convection.js';
import { pipeConductanceWmK } from '../../src/heat-transfer/pipe-insulation.js';
import { clearSkyTemperatureK } from '../../src/heat-transfer/sky-temperature.js';
import { stagnationTemperatureC } from '../../src/heat-transfer/stagnation.js';

describe('checks of the model', () => {
  it('sky temperature at 20 °C is 277.06 ± 0.01 K (Swinbank 1963)', () => {
    expect(Math.abs(clearSkyTemperatureK(20) - 277.06)).toBeLessThan(0.01);
  });

  it('stagnation at C = 254, 900 W/m², 0.81 optical, ε 0.9, h 20 W/m²K, 20 °C is 1067 ± 1 °C (analytic balance)', () => {
    const faceC = stagnationTemperatureC({
      concentration: 254,
      dniWm2: 900,
      opticalEfficiency: 0.81,
      emittance: 0.9,
      lossWm2K: 20,
      ambientC: 20,
    });
    expect(Math.abs(faceC - 1067)).toBeLessThan(1);
  });

  it('counter-flow effectiveness at NTU 2, ratio 0.5 is 0.7746 ± 1e-4 (analytic)', () => {
    expect(Math.abs(counterFlowEffectiveness(2, 0.5) - 0.7746)).toBeLessThan(1e-4);
  });

  it('4 m of pipe in 50 mm of insulation conducts well under 1 % of what the dish delivers (common practice, no source)', () => {
    // Both ways, water at 93 °C in 10 °C air, against 10 kW: the heat of a dish of that size on a clear hour.
    const wattsPerKelvin =
      2 *
      4 *
      pipeConductanceWmK({
        boreM: 0.02,
        wallM: 0.001,
        insulationM: 0.05,
        insulationConductivityWmK: 0.035,
        outsideFilmWm2K: 15,
      });
    expect(wattsPerKelvin * 83).toBeLessThan(0.01 * 10_000);
  });
});

/**
 * Air at 1 bar (its densities say so, though its heading reads atmospheric pressure): Incropera & DeWitt, Fundamentals of Heat and Mass Transfer, Table A.4 (values from memory).
 * Columns: T [K], density [kg/m³], heat capacity [kJ/(kg·K)], viscosity [1e-7 Pa·s], conductivity [1e-3 W/(m·K)], Pr.
 */
const AIR_TABLE = [
  [200, 1.7458, 1.007, 132.5, 18.1, 0.737],
  [250, 1.3947, 1.006, 159.6, 22.3, 0.72],
  [300, 1.1614, 1.007, 184.6, 26.3, 0.707],
  [350, 0.995, 1.009, 208.2, 30.0, 0.7],
  [400, 0.8711, 1.014, 230.1, 33.8, 0.69],
  [500, 0.6964, 1.03, 270.1, 40.7, 0.684],
  [600, 0.5804, 1.051, 305.8, 46.9, 0.685],
  [700, 0.4975, 1.075, 338.8, 52.4, 0.695],
  [800, 0.4354, 1.099, 369.8, 57.3, 0.709],
  [1000, 0.3482, 1.141, 424.4, 66.7, 0.726],
  [1200, 0.2902, 1.175, 473, 76.3, 0.728],
] as const;

describe('air against a textbook table (values from memory)', () => {
  // Tolerances are what the docstrings state; Sutherland's relation runs below the table at high temperature.
  it.each(AIR_TABLE)('at %d K', (temperatureK, density, heatCapacity, viscosity, conductivity, prandtl) => {
    const tC = temperatureK - 273.15;
    expect(Math.abs(airDensityKgM3(tC, 1e5) / density - 1)).toBeLessThan(0.004);
    expect(Math.abs(airHeatCapacityJkgK(tC) / (1000 * heatCapacity) - 1)).toBeLessThan(0.01);
    expect(Math.abs(airViscosityPas(tC) / (1e-7 * viscosity) - 1)).toBeLessThan(0.025);
    expect(Math.abs(airConductivityWmK(tC) / (1e-3 * conductivity) - 1)).toBeLessThan(0.025);
    expect(Math.abs(airPrandtl(tC) / prandtl - 1)).toBeLessThan(0.04);
  });
});

describe('convection against hand-worked figures', () => {
  it('Churchill & Chu 1975 at Ra 1.813e9, Pr 0.69 gives Nu 147 (Incropera & DeWitt, worked fire screen, value from memory)', () => {
    expect(Math.abs(verticalPlateNusselt(1.813e9, 0.69) - 147)).toBeLessThan(1);
  });

  it('Sparrow, Ramsey & Mass 1979 at Re 61 730 on a 0.3 m face, worked by hand from the table at 350 K', () => {
    // Film 350 K: ν = 208.2e-7/0.995 = 2.092e-5 m²/s, Pr 0.700, k 0.0300; at 4.305 m/s Re = 61 730;
    // Nu = 0.86 × 248.5 × 0.8879 = 189.7; h = 189.7 × 0.0300/0.3 = 18.97 W/(m²·K). 1 % covers the properties.
    const coefficient = flatWindConvectionWm2K(120, 33.7, 4.305, 0.3, 101325);
    expect(Math.abs(coefficient / 18.97 - 1)).toBeLessThan(0.01);
  });
});
