import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { OPTICS_TOLERANCES } from '../../validation/optics/tolerances.js';
import { dish } from '../../validation/optics/example-dish.js';
import { propertyRuns } from '../../validation/property-runs.js';
import { DomainError } from '../errors.js';
import { besselI0Scaled } from './bessel.js';
import { apertureAreaM2, type DishSettings } from './dish.js';
import { radialFluxMap, squareFluxDistribution } from './flux-map.js';
import { imageRings, RING_COUNT, ringDensity } from './image.js';
import { roundIntercept, squareIntercept } from './intercept.js';
import { gaussLegendre } from './quadrature.js';

const anyDish = fc
  .record({
    diameterM: fc.double({ min: 0.5, max: 25, noNaN: true }),
    focalRatio: fc.double({ min: 0.25, max: 3, noNaN: true }),
    slopeErrorRad: fc.double({ min: 0, max: 0.02, noNaN: true }),
    sunWidthRad: fc.constantFrom(0.0001, 0.00273, 0.01),
  })
  .map(({ diameterM, focalRatio, slopeErrorRad, sunWidthRad }) => ({
    ...dish(diameterM, focalRatio, slopeErrorRad),
    sunWidthRad,
    specularErrorRad: 0,
    trackingErrorRad: 0,
  }));
/** The hardest dish: rim at exactly 90°, a perfect mirror and a sun almost without width. */
const needle: DishSettings = {
  ...dish(1, 0.25, 0),
  sunWidthRad: 0.0001,
  specularErrorRad: 0,
  trackingErrorRad: 0,
};
const sideShare = fc.double({ min: 0.001, max: 1, noNaN: true });

describe('intercept', () => {
  it('is converged: doubling rings moves it by less than 1e-6, rim at 90° included', () => {
    fc.assert(
      fc.property(fc.oneof(anyDish, fc.constant(needle)), sideShare, (anyD, share) => {
        const doubled = imageRings(anyD, 2 * RING_COUNT);
        const sideM = share * anyD.apertureDiameterM;
        expect(Math.abs(squareIntercept(anyD, sideM) - squareIntercept(anyD, sideM, doubled))).toBeLessThan(
          OPTICS_TOLERANCES.convergence,
        );
        expect(
          Math.abs(roundIntercept(anyD, sideM / 2) - roundIntercept(anyD, sideM / 2, doubled)),
        ).toBeLessThan(OPTICS_TOLERANCES.convergence);
      }),
      propertyRuns,
    );
  });

  it('lies between the discs inside and outside the square, grows with it and never leaves 0 to 1', () => {
    fc.assert(
      fc.property(anyDish, fc.double({ min: 0.001, max: 0.7, noNaN: true }), (anyD, share) => {
        const sideM = share * anyD.apertureDiameterM;
        const square = squareIntercept(anyD, sideM);
        expect(square).toBeGreaterThanOrEqual(roundIntercept(anyD, sideM / 2) - 1e-12);
        expect(square).toBeLessThanOrEqual(roundIntercept(anyD, sideM / Math.SQRT2) + 1e-12);
        expect(squareIntercept(anyD, sideM * 1.1)).toBeGreaterThanOrEqual(square - 1e-12);
        expect(square).toBeGreaterThan(0);
        expect(square).toBeLessThanOrEqual(1);
      }),
      propertyRuns,
    );
  });

  it('agrees with the elliptical Gaussian integrated over the square itself, turn by turn', () => {
    // Independent of the averaged density: the two-dimensional Gaussian on a grid of nodes, for 64 orientations.
    const traced = dish(5, 0.35, 0.01);
    const halfM = 0.1;
    const { nodes, weights } = gaussLegendre(48);
    let direct = 0;
    for (const { areaShare, tangentialM, radialM } of imageRings(traced, 12)) {
      for (let turn = 0; turn < 64; turn++) {
        const angle = ((turn + 0.5) * Math.PI) / 64;
        nodes.forEach((u, i) => {
          nodes.forEach((v, j) => {
            const x = (2 * u - 1) * halfM;
            const y = (2 * v - 1) * halfM;
            const along = (x * Math.cos(angle) + y * Math.sin(angle)) / radialM;
            const across = (y * Math.cos(angle) - x * Math.sin(angle)) / tangentialM;
            const density =
              Math.exp(-(along * along + across * across) / 2) / (2 * Math.PI * radialM * tangentialM);
            direct += (areaShare / 64) * weights[i]! * weights[j]! * 4 * halfM * halfM * density;
          });
        });
      }
    }
    expect(Math.abs(squareIntercept(traced, 2 * halfM) - direct)).toBeLessThan(1e-6);
  });

  it('refuses an impossible target or dish by name', () => {
    const good = dish(5, 0.6);
    expect(() => squareIntercept(good, 5.1)).toThrow('side of the square');
    expect(() => squareIntercept(good, 0)).toThrow(DomainError);
    expect(() => roundIntercept(good, 2.6)).toThrow('radius of the disc');
    for (const [name, change] of [
      ['aperture diameter', { apertureDiameterM: -5 }],
      ['focal ratio', { focalRatio: 0.2 }],
      ['slope error', { slopeErrorRad: NaN }],
      ['slope error', { slopeErrorRad: 0.11 }],
      ['sun width', { sunWidthRad: 0 }],
      ['reflectance', { reflectance: 1.01 }],
      ['shadow fraction', { shadowFraction: -0.1 }],
    ] as const satisfies readonly (readonly [string, Partial<DishSettings>])[]) {
      expect(() => imageRings({ ...good, ...change })).toThrow(name);
    }
  });
});

describe('flux map', () => {
  it('integrates to the intercept: ∫ S 2πρ dρ is the aperture times the round intercept', () => {
    fc.assert(
      fc.property(anyDish, fc.double({ min: 0.001, max: 0.2, noNaN: true }), (anyD, share) => {
        const radiusM = share * anyD.apertureDiameterM;
        const { nodes, weights } = gaussLegendre(200);
        // Nodes crowd towards the focus (ρ = R u³), where the image of a steep dish is needle-thin.
        const radiiM = nodes.map((u) => radiusM * u ** 3);
        const suns = radialFluxMap(anyD, radiiM);
        const lightM2 = suns.reduce(
          (sum, flux, i) =>
            sum + flux * 2 * Math.PI * radiiM[i]! * weights[i]! * 3 * radiusM * nodes[i]! ** 2,
          0,
        );
        expect(Math.abs(lightM2 / apertureAreaM2(anyD) - roundIntercept(anyD, radiusM))).toBeLessThan(1e-6);
      }),
      propertyRuns,
    );
  });

  it('falls from its peak at the focus outwards', () => {
    const suns = radialFluxMap(
      dish(5, 0.6),
      Float64Array.from({ length: 50 }, (_, i) => i * 0.005),
    );
    for (let i = 1; i < suns.length; i++) expect(suns[i]!).toBeLessThan(suns[i - 1]!);
    expect(() => radialFluxMap(dish(5, 0.6), Float64Array.of(-0.1))).toThrow('distance');
  });

  it('spreads the square’s light over its cells: mean 1, whole light the square intercept, symmetric', () => {
    for (const cells of [1, 2, 5, 10]) {
      const mirror = dish(5, 0.6);
      const { relativeFlux, meanSuns, unevenness, peakSuns } = squareFluxDistribution(mirror, 0.28, cells);
      const mean = relativeFlux.reduce((sum, flux) => sum + flux, 0) / relativeFlux.length;
      expect(mean).toBeCloseTo(1, 12);
      const light = (meanSuns * 0.28 ** 2) / apertureAreaM2(mirror);
      expect(Math.abs(light - squareIntercept(mirror, 0.28))).toBeLessThan(1e-6);
      expect(unevenness * meanSuns).toBeLessThan(peakSuns);
      for (let row = 0; row < cells; row++) {
        for (let column = 0; column < cells; column++) {
          const flux = relativeFlux[row * cells + column]!;
          expect(flux).toBeGreaterThan(0);
          expect(relativeFlux[column * cells + row]).toBe(flux);
          expect(relativeFlux[(cells - 1 - row) * cells + column]).toBe(flux);
        }
      }
    }
  });

  it('refuses cells that cannot be laid out', () => {
    expect(() => squareFluxDistribution(dish(5, 0.6), 0.28, 2.5)).toThrow('cells per side');
    expect(() => squareFluxDistribution(dish(5, 0.6), 6, 4)).toThrow('side of the square');
  });
});

describe('pieces of the integral', () => {
  // Abramowitz & Stegun 1964, table 9.8: e⁻ˣI₀(x) (values from memory).
  it.each([
    [0, 1],
    [1, 0.4657596077],
    [5, 0.1835408126],
    [10, 0.1278333372],
  ])('scaled Bessel function at %d', (x, value) => {
    expect(Math.abs(besselI0Scaled(x) - value)).toBeLessThan(1e-9);
  });

  it('scaled Bessel function agrees with its integral on both sides of the change of series', () => {
    for (const x of [0.3, 19.999, 20.001, 60, 1e4]) {
      // (1/π)∫ exp(−x(1 − cos θ)) dθ; the trapezoid rule converges exponentially for a periodic integrand.
      const points = 4000;
      let mean = 0;
      for (let i = 0; i < points; i++) {
        mean += Math.exp(-x * (1 - Math.cos(((i + 0.5) * Math.PI) / points))) / points;
      }
      expect(Math.abs(besselI0Scaled(x) / mean - 1)).toBeLessThan(1e-12);
    }
  });

  it('quadrature is exact for polynomials up to degree 2n − 1', () => {
    for (const order of [1, 2, 5, 24, 200]) {
      const { nodes, weights } = gaussLegendre(order);
      for (const degree of [0, 1, 2 * order - 1]) {
        const integral = nodes.reduce((sum, node, i) => sum + weights[i]! * node ** degree, 0);
        expect(Math.abs(integral * (degree + 1) - 1)).toBeLessThan(1e-12);
      }
    }
    expect(() => gaussLegendre(0)).toThrow(DomainError);
  });

  it('a ring’s light is one, and its rings share out the aperture', () => {
    const rings = imageRings(dish(5, 0.3, 0.01));
    expect(rings.reduce((sum, ring) => sum + ring.areaShare, 0)).toBeCloseTo(1, 13);
    const rim = rings[0]!;
    const { nodes, weights } = gaussLegendre(200);
    const endM = 9 * rim.radialM;
    const light = nodes.reduce(
      (sum, u, i) => sum + weights[i]! * endM * 2 * Math.PI * u * endM * ringDensity(rim, u * endM),
      0,
    );
    expect(light).toBeCloseTo(1, 9);
  });
});
