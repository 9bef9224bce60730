import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { propertyRuns } from '../../validation/property-runs.js';
import { DomainError } from '../errors.js';
import { spreadBeam } from './sunlit-substeps.js';

const spread = (dniWm2: number, sunlit: readonly number[]): number[] => {
  const out = new Float64Array(sunlit.length).fill(NaN);
  spreadBeam(dniWm2, Uint8Array.from(sunlit), out);
  return [...out];
};

describe('spreadBeam', () => {
  it('gives the beam of a sunrise hour to its sunlit part', () => {
    expect(spread(100, [0, 0, 0, 1])).toEqual([0, 0, 0, 400]);
    expect(spread(100, [0, 0, 1, 1])).toEqual([0, 0, 200, 200]);
  });

  it('leaves a wholly sunlit record as it is', () => {
    expect(spread(0.1, [1, 1, 1])).toEqual([0.1, 0.1, 0.1]);
  });

  it('keeps beam that came with the sun down, evenly', () => {
    expect(spread(30, [0, 0, 0])).toEqual([30, 30, 30]);
  });

  it('conserves the energy of any record, and never lights a dark sub-step beside a sunlit one', () => {
    fc.assert(
      fc.property(
        fc.double({ min: 0, max: 1400, noNaN: true }),
        fc.array(fc.constantFrom(0, 1), { minLength: 1, maxLength: 60 }),
        (dniWm2, sunlit) => {
          const beam = spread(dniWm2, sunlit);
          const mean = beam.reduce((sum, value) => sum + value, 0) / beam.length;
          expect(Math.abs(mean - dniWm2)).toBeLessThanOrEqual(dniWm2 * sunlit.length * 2 ** -52);
          if (sunlit.includes(1)) {
            expect(beam.every((value, i) => sunlit[i] === 1 || value === 0)).toBe(true);
          }
        },
      ),
      propertyRuns,
    );
  });

  it('refuses bad input and writes nothing', () => {
    const out = new Float64Array(2).fill(7);
    expect(() => {
      spreadBeam(-1, new Uint8Array(2), out);
    }).toThrow(DomainError);
    expect(() => {
      spreadBeam(NaN, new Uint8Array(2), out);
    }).toThrow(DomainError);
    expect(() => {
      spreadBeam(1, new Uint8Array(3), out);
    }).toThrow('3 and 2');
    expect(() => {
      spreadBeam(1, new Uint8Array(0), new Float64Array(0));
    }).toThrow(DomainError);
    expect([...out]).toEqual([7, 7]);
  });
});
