import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { epwFile, syntheticYear } from '@noonwell/testkit';
import { LISTED_PROBLEMS } from '../limits.js';
import { readWeatherFile } from '../index.js';

const sound = epwFile(syntheticYear());
/** NOONWELL_TEST_COUNT raises the number of cases, NOONWELL_TEST_SEED repeats a failure. */
const numRuns = Number(process.env['NOONWELL_TEST_COUNT'] ?? 40);
const seed = Number(process.env['NOONWELL_TEST_SEED'] ?? 20411);

const damage = fc.array(
  fc.record({
    // Half of the damage in the header and first lines, half anywhere.
    at: fc.oneof(fc.nat(2000), fc.nat(sound.length - 1)),
    remove: fc.nat(400),
    insert: fc.uint8Array({ maxLength: 12 }),
  }),
  { minLength: 1, maxLength: 4 },
);

function apply(pieces: readonly { at: number; remove: number; insert: Uint8Array }[]): Uint8Array {
  let bytes = Buffer.from(sound);
  for (const { at, remove, insert } of pieces) {
    bytes = Buffer.concat([bytes.subarray(0, at), insert, bytes.subarray(at + remove)]);
  }
  return bytes;
}

describe('any damage', () => {
  it('is refused with reasons, or leaves a whole year of numbers; it never throws', () => {
    fc.assert(
      fc.property(damage, (pieces) => {
        const result = readWeatherFile(apply(pieces), 'damaged.epw');
        if (result.kind === 'refused') {
          expect(result.problems.length).toBeGreaterThan(0);
          expect(result.problems.length).toBeLessThanOrEqual(LISTED_PROBLEMS);
          expect(result.problemCount).toBeGreaterThanOrEqual(result.problems.length);
          expect(result.problems.every(({ reason, fix }) => reason !== '' && fix !== '')).toBe(true);
          return;
        }
        const { dniWm2, ghiWm2, dhiWm2, dryBulbC, windMs, relativeHumidityPct, pressurePa } = result.year;
        for (const column of [dniWm2, ghiWm2, dhiWm2, dryBulbC, windMs, relativeHumidityPct, pressurePa]) {
          expect(column).toHaveLength(8760);
          expect(column.every((value) => Number.isFinite(value))).toBe(true);
        }
      }),
      { numRuns, seed },
    );
  }, 600_000);
});
