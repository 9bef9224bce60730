import { mergeConfig } from 'vitest/config';
import { sharedConfig } from '../../vitest.shared.js';

/** Browser tests against a running, really built app whose address is in NOONWELL_E2E_URL. */
export default mergeConfig(sharedConfig, {
  // Found from wherever the tests are started.
  root: import.meta.dirname,
  test: {
    name: 'e2e',
    include: ['e2e/**/*.e2e.ts'],
    testTimeout: 180_000,
    hookTimeout: 120_000,
    // One app and one database: files run one after the other.
    fileParallelism: false,
  },
});
