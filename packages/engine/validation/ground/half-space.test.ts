import { describe, expect, it } from 'vitest';
import { groundTemperatureC } from '../../src/ground/kusuda-achenbach.js';

describe('ground temperature by Kusuda & Achenbach 1965 (formula from memory)', () => {
  const wave = { meanC: 12, amplitudeK: 10, coldestDay: 30 };
  const diffusivityM2S = 5e-7;

  // Worked by hand: the damping depth √(2 α/ω) = √(2 · 5e-7 · 31 536 000/2π) = √5.01911 = 2.24034 m. At that depth
  // the wave is e⁻¹ = 0.367879 of the surface's and one radian, 58.092 d, late.
  it.each([
    ['surface, coldest day', 0, 30, 12 - 10],
    ['surface, half a year later', 0, 30 + 182.5, 12 + 10],
    ['damping depth, a radian later', 2.24034, 30 + 58.092, 12 - 3.67879],
    ['damping depth, three quarters of a year after that', 2.24034, 30 + 58.092 + 182.5, 12 + 3.67879],
    // cos(−1) = 0.540302.
    ['damping depth, the surface’s coldest day', 2.24034, 30, 12 - 3.67879 * 0.540302],
    // Three damping depths: e⁻³ = 0.0497871.
    ['three damping depths, three radians later', 6.72102, 30 + 174.276, 12 - 0.497871],
  ])('%s', (_, depthM, day, expectedC) => {
    expect(groundTemperatureC(wave, depthM, diffusivityM2S, day)).toBeCloseTo(expectedC, 4);
  });

  it('solves the equation of conduction: ∂T/∂t = α ∂²T/∂z²', () => {
    const stepD = 0.01;
    const stepM = 0.01;
    for (const depthM of [0.3, 1, 2, 4]) {
      for (const day of [20, 90, 200, 340]) {
        const at = (dz: number, dt: number): number =>
          groundTemperatureC(wave, depthM + dz, diffusivityM2S, day + dt);
        const rate = (at(0, stepD) - at(0, -stepD)) / (2 * stepD * 86_400);
        const bend = (at(stepM, 0) - 2 * at(0, 0) + at(-stepM, 0)) / stepM ** 2;
        expect(rate).toBeCloseTo(diffusivityM2S * bend, 10);
        expect(Math.abs(rate - diffusivityM2S * bend)).toBeLessThan(1e-4 * 10 * 2e-7);
      }
    }
  });
});
