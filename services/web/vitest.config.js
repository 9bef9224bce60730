import { mergeConfig } from 'vitest/config';
import { sharedConfig, sourceCondition } from '../../vitest.shared.js';

/** Component and unit tests in a simulated browser; the real browser is in e2e/ with its own config. */
export default mergeConfig(sharedConfig, {
  resolve: { conditions: [sourceCondition, 'module', 'browser', 'development|production'] },
  test: {
    name: 'web',
    environment: 'jsdom',
    include: ['src/**/*.test.ts', 'src/**/*.test.tsx', 'e2e/**/*.test.ts'],
    deps: {
      optimizer: {
        // Fluent is hundreds of small files: bundling it once makes each test file start in a second.
        client: { enabled: true, include: ['@fluentui/react-components', '@fluentui/react-icons'] },
      },
    },
  },
});
