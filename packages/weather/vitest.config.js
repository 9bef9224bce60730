import { mergeConfig } from 'vitest/config';
import { sharedConfig } from '../../vitest.shared.js';

export default mergeConfig(sharedConfig, {
  test: { name: 'weather', include: ['src/**/*.test.ts', 'validation/**/*.test.ts', 'test/**/*.test.ts'] },
});
