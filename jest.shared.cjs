const { join } = require('node:path');

/**
 * What the jest workspaces share (persistence, api, worker). swc checks no types: `npm run typecheck` does.
 * @type {import('jest').Config}
 */
module.exports = {
  testEnvironment: 'node',
  // The same two files for every workspace: jest runs a set-up once a run, however many projects name it.
  globalSetup: join(__dirname, 'jest.global-setup.cjs'),
  globalTeardown: join(__dirname, 'jest.global-teardown.cjs'),
  // Our packages are read from source; 'require' and 'default' are for everybody else's.
  testEnvironmentOptions: { customExportConditions: ['@noonwell/source', 'node', 'require', 'default'] },
  testMatch: ['**/*.spec.ts', '**/*.e2e-spec.ts'],
  modulePathIgnorePatterns: ['<rootDir>/dist/', '<rootDir>/.tsbuild/'],
  moduleNameMapper: { '^(\\.{1,2}/.*)\\.js$': '$1' },
  transform: {
    '^.+\\.(t|j|mj)s$': [
      '@swc/jest',
      {
        jsc: {
          parser: { syntax: 'typescript', decorators: true },
          transform: { legacyDecorator: true, decoratorMetadata: true, useDefineForClassFields: false },
          target: 'es2022',
        },
        module: { type: 'commonjs' },
      },
    ],
  },
  // These ship ES modules only.
  transformIgnorePatterns: ['/node_modules/(?!(suncalc)/)'],
};
