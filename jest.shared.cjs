/**
 * What the jest workspaces share (persistence, api, worker). swc checks no types: `npm run typecheck` does.
 * @type {import('jest').Config}
 */
module.exports = {
  testEnvironment: 'node',
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
