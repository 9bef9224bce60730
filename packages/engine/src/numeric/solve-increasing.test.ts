import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { propertyRuns } from '../../validation/property-runs.js';
import { ConvergenceError, solveIncreasing, type IncreasingProblem } from './solve-increasing.js';

function counted(f: (x: number) => number): IncreasingProblem & { calls: number; last: number } {
  return {
    calls: 0,
    last: NaN,
    residual(x) {
      this.calls++;
      this.last = x;
      return f(x);
    },
  };
}

describe('root of an increasing function', () => {
  it('finds a receiver-like balance from any guess, and its last call is at the root', () => {
    fc.assert(
      fc.property(
        fc.double({ min: -270, max: 20_000, noNaN: true }),
        fc.double({ min: 1e-3, max: 1e6, noNaN: true }),
        fc.double({ min: 0, max: 1e6, noNaN: true }),
        (guess, slope, absorbedW) => {
          const balance = (x: number) => 5e-9 * ((x + 273.15) ** 4 - 293.15 ** 4) + 20 * (x - 20) - absorbedW;
          const problem = counted(balance);
          const root = solveIncreasing(problem, guess, slope, -273.15, 50_000, 1e-6);
          expect(Math.abs(balance(root))).toBeLessThanOrEqual(1e-6 + 1e-13 * absorbedW);
          expect(problem.last).toBe(root);
          expect(problem.calls).toBeLessThan(120);
        },
      ),
      propertyRuns,
    );
  });

  it('crosses a kink without leaving the bracket', () => {
    const problem = counted((x) => (x < 1 ? x - 1 : 1e6 * (x - 1)) + 0.5);
    expect(solveIncreasing(problem, 900, 1e6, -1000, 1000, 1e-9)).toBeCloseTo(0.5, 8);
  });

  it('says so when no root lies between the bounds, or the function is not a number', () => {
    expect(() =>
      solveIncreasing(
        counted((x) => x + 10),
        1,
        1,
        0,
        5,
        1e-9,
      ),
    ).toThrow(ConvergenceError);
    expect(() =>
      solveIncreasing(
        counted((x) => x - 10),
        1,
        1,
        0,
        5,
        1e-9,
      ),
    ).toThrow(ConvergenceError);
    expect(() =>
      solveIncreasing(
        counted(() => NaN),
        1,
        1,
        0,
        5,
        1e-9,
      ),
    ).toThrow(/not a number/);
  });
});
