import { mergeConfig } from 'vitest/config';
import { sharedConfig } from '../../vitest.shared.js';

export default mergeConfig(sharedConfig, { test: { name: 'local', include: ['lib/**/*.test.mjs'] } });
