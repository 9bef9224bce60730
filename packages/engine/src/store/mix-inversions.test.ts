import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { propertyRuns } from '../../validation/property-runs.js';
import { mixInversions } from './mix-inversions.js';

function mixed(values: readonly number[]): number[] {
  const layers = Float64Array.from(values);
  mixInversions(layers, new Float64Array(values.length), new Int32Array(values.length));
  return [...layers];
}

describe('mixInversions', () => {
  it('merges a warm layer with the colder ones above it only as far as it rises', () => {
    expect(mixed([10, 40, 20, 30, 50])).toEqual([10, 30, 30, 30, 50]);
    expect(mixed([50, 40, 30])).toEqual([40, 40, 40]);
  });

  it('leaves an ordered tank untouched to the last bit', () => {
    const ordered = [0.1, 0.2, 0.30000000000000004, 7];
    expect(mixed(ordered)).toEqual(ordered);
  });

  it('orders any layers, keeps their sum and never goes beyond their extremes', () => {
    const enthalpies = fc.array(fc.double({ min: -1e4, max: 8e5, noNaN: true }), {
      minLength: 1,
      maxLength: 40,
    });
    fc.assert(
      fc.property(enthalpies, (values) => {
        const result = mixed(values);
        const sum = (list: readonly number[]): number => list.reduce((total, value) => total + value, 0);
        expect(Math.abs(sum(result) - sum(values))).toBeLessThanOrEqual(1e-14 * 8e5 * values.length);
        for (let i = 1; i < result.length; i++) expect(result[i]! - result[i - 1]!).toBeGreaterThan(-1e-9);
        expect(Math.min(...result)).toBeGreaterThanOrEqual(Math.min(...values) - 1e-9);
        expect(Math.max(...result)).toBeLessThanOrEqual(Math.max(...values) + 1e-9);
      }),
      propertyRuns,
    );
  });
});
