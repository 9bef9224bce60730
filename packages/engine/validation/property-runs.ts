/**
 * Seed and count of the property tests: fixed and small by default so that a red run repeats itself; a longer
 * run sets NOONWELL_TEST_COUNT, and NOONWELL_TEST_SEED to walk elsewhere.
 */
export const propertyRuns = {
  seed: Number(process.env['NOONWELL_TEST_SEED'] ?? 20_260_117),
  numRuns: Number(process.env['NOONWELL_TEST_COUNT'] ?? 100),
};
