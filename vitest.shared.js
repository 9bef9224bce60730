import { defineConfig } from 'vitest/config';

/** Tests read the sources of our packages through this export condition, so nothing has to be built first. */
export const sourceCondition = '@noonwell/source';

/** What every vitest workspace shares; a workspace merges its own name and environment into it. */
export const sharedConfig = defineConfig({
  resolve: { conditions: [sourceCondition, 'module', 'node', 'development|production'] },
  ssr: { resolve: { conditions: [sourceCondition, 'module', 'node', 'development|production'] } },
  test: {
    environment: 'node',
    testTimeout: 30_000,
    hookTimeout: 60_000,
    restoreMocks: true,
  },
});
