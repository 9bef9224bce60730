import { existsSync, readdirSync } from 'node:fs';
import { builtinModules } from 'node:module';
import js from '@eslint/js';
import prettier from 'eslint-config-prettier';
import reactHooks from 'eslint-plugin-react-hooks';
import globals from 'globals';
import tseslint from 'typescript-eslint';

const testFiles = [
  '**/*.test.ts',
  '**/*.test.tsx',
  '**/*.spec.ts',
  '**/*.e2e-spec.ts',
  '**/*.e2e.ts',
  '**/test/**/*.ts',
  '**/validation/**/*.ts',
];

/** One block a web feature: it may use shared/ and app/, never another feature. */
const featuresRoot = 'services/web/src/features';
const features = existsSync(new URL(featuresRoot, import.meta.url))
  ? readdirSync(new URL(featuresRoot, import.meta.url), { withFileTypes: true })
      .filter((entry) => entry.isDirectory())
      .map((entry) => entry.name)
  : [];
const featureBoundaries = features
  .filter(() => features.length > 1)
  .map((feature) => {
    const others = features.filter((name) => name !== feature).join('|');
    return {
      files: [`${featuresRoot}/${feature}/**/*.{ts,tsx}`],
      rules: {
        'no-restricted-imports': [
          'error',
          {
            patterns: [
              {
                regex: `^(\\.\\./)+(features/)?(${others})(/|$)`,
                message: 'Features never import each other: move what both need to src/shared.',
              },
            ],
          },
        ],
      },
    };
  });

export default tseslint.config(
  {
    ignores: [
      '**/dist/',
      '**/.tsbuild/',
      '**/coverage/',
      'data/',
      'screenshots/',
      '**/generated/',
      '**/node_modules/',
    ],
  },
  js.configs.recommended,
  {
    files: ['**/*.ts', '**/*.tsx'],
    extends: [tseslint.configs.strictTypeChecked],
    languageOptions: {
      parserOptions: {
        projectService: true,
        tsconfigRootDir: import.meta.dirname,
      },
    },
    rules: {
      '@typescript-eslint/consistent-type-imports': 'error',
      '@typescript-eslint/no-explicit-any': 'error',
      '@typescript-eslint/no-unused-vars': ['error', { argsIgnorePattern: '^_', varsIgnorePattern: '^_' }],
      '@typescript-eslint/restrict-template-expressions': [
        'error',
        { allowNumber: true, allowBoolean: true },
      ],
      // Loops over a year index typed arrays inside their own length; noUncheckedIndexedAccess would
      // otherwise ask for a branch in every step.
      '@typescript-eslint/no-non-null-assertion': 'off',
      // Modules and controllers of NestJS are classes with a decorator and nothing else.
      '@typescript-eslint/no-extraneous-class': ['error', { allowWithDecorator: true }],
      '@typescript-eslint/switch-exhaustiveness-check': [
        'error',
        { considerDefaultExhaustiveForUnions: true },
      ],
      eqeqeq: ['error', 'always', { null: 'ignore' }],
    },
  },
  {
    // Dependency injection reads constructor types at run time: `import type` would erase them.
    files: ['services/api/**/*.ts', 'services/worker/**/*.ts'],
    rules: { '@typescript-eslint/consistent-type-imports': 'off' },
  },
  {
    files: ['packages/engine/src/**/*.ts'],
    ignores: testFiles,
    rules: {
      'no-restricted-imports': [
        'error',
        {
          paths: builtinModules.map((name) => ({
            name,
            message: 'The engine is pure calculation: no files, network or processes.',
          })),
          patterns: [
            { group: ['node:*'], message: 'The engine is pure calculation: no files, network or processes.' },
            { group: ['@noonwell/*'], message: 'The engine imports none of our other packages.' },
          ],
        },
      ],
    },
  },
  ...featureBoundaries,
  {
    files: ['services/web/**/*.{ts,tsx}'],
    extends: [reactHooks.configs.flat.recommended],
  },
  {
    files: testFiles,
    rules: {
      // Matchers take methods unbound by design.
      '@typescript-eslint/unbound-method': 'off',
    },
  },
  {
    files: ['**/*.mjs', '**/*.js'],
    languageOptions: { globals: globals.node },
  },
  {
    files: ['**/*.cjs'],
    languageOptions: { globals: globals.node, sourceType: 'commonjs' },
  },
  prettier,
);
