import { defineConfig } from 'vitest/config';

/** Every workspace with a vitest.config.js of its own is a project: a new package needs no line here. */
export default defineConfig({
  test: { projects: ['packages/*/vitest.config.js', 'services/*/vitest.config.js'] },
});
