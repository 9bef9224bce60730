import { describe, expect, it } from 'vitest';
import { buriedPipeConductanceWmK } from '../../src/heat-transfer/buried-pipe.js';

const bare = {
  boreM: 0.1,
  wallM: 0,
  insulationM: 0,
  insulationConductivityWmK: 0.04,
  soilConductivityWmK: 1,
};

describe('conductance of a buried pipe', () => {
  it.each([
    // arcosh 2 = ln(2 + √3) = 1.316958; 2π over it is 4.770987.
    [2, 4.770987],
    // arcosh 10 = ln(10 + √99) = 2.993223; 2.099137.
    [10, 2.099137],
    // Deep: ln(2z/r), the far form of the shape factor. ln 400 = 5.991465; 1.048689, within (r/2z)².
    [200, 1.048689],
  ])('is the shape factor 2π/arcosh(z/r) of Incropera et al., Table 4.1, at z/r = %f', (ratio, expected) => {
    expect(buriedPipeConductanceWmK({ ...bare, depthM: 0.05 * ratio })).toBeCloseTo(expected, 5);
  });

  it('is that of a line source and its image: the pipe’s wall is a line of equal temperature', () => {
    // Carslaw & Jaeger 1959: source √(z² − r²) under the surface, sink as far above it; per unit of heat and metre
    // the temperature is ln(d_image/d_source)/(2πk), the surface at 0.
    const radiusM = 0.05;
    for (const depthM of [0.07, 0.2, 0.8]) {
      const sourceM = Math.sqrt(depthM ** 2 - radiusM ** 2);
      for (const angle of [0, 0.7, 1.6, 3.1, 4.4]) {
        const x = radiusM * Math.sin(angle);
        const z = depthM + radiusM * Math.cos(angle);
        const temperature = Math.log(Math.hypot(x, z + sourceM) / Math.hypot(x, z - sourceM)) / (2 * Math.PI);
        expect(1 / temperature).toBeCloseTo(buriedPipeConductanceWmK({ ...bare, depthM }), 9);
      }
    }
  });

  it('has insulation and ground in series', () => {
    // ln(0.041/0.011)/0.04 = 32.8937; arcosh(0.8/0.041)/1.5 = 2.44251 (3.66377/1.5): 2π over the sum.
    const pipe = {
      boreM: 0.02,
      wallM: 0.001,
      insulationM: 0.03,
      insulationConductivityWmK: 0.04,
      depthM: 0.8,
      soilConductivityWmK: 1.5,
    };
    expect(buriedPipeConductanceWmK(pipe)).toBeCloseTo((2 * Math.PI) / (32.8937 + 2.44251), 4);
  });

  it.each([
    ['pipe depth', { depthM: 0.05 }],
    ['pipe depth', { depthM: 101 }],
    ['soil conductivity', { soilConductivityWmK: 0 }],
    ['insulation conductivity', { insulationConductivityWmK: NaN }],
    ['pipe bore', { boreM: 0 }],
    ['pipe wall', { wallM: -1 }],
    ['pipe insulation', { insulationM: -1 }],
  ])('refuses a bad %s: %o', (words, change) => {
    expect(() => buriedPipeConductanceWmK({ ...bare, depthM: 1, ...change })).toThrow(words);
  });
});
