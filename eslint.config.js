import js from '@eslint/js';
import astro from 'eslint-plugin-astro';
import jsxA11y from 'eslint-plugin-jsx-a11y';
import reactHooks from 'eslint-plugin-react-hooks';
import tseslint from 'typescript-eslint';

/** Names of folders that say nothing about what is in them. */
const NO_GRAB_BAGS = ['utils', 'helpers', 'common', 'misc', 'lib', 'shared'];

export default tseslint.config(
  { ignores: ['dist', '.astro', '.data', 'coverage', 'test-results', 'playwright-report', 'drizzle'] },
  js.configs.recommended,
  ...tseslint.configs.strict,
  ...tseslint.configs.stylistic,
  ...astro.configs['flat/recommended'],
  ...astro.configs['flat/jsx-a11y-strict'],
  { files: ['**/*.tsx'], plugins: { 'jsx-a11y': jsxA11y }, rules: jsxA11y.flatConfigs.strict.rules },
  { files: ['**/*.tsx'], ...reactHooks.configs.flat['recommended-latest'] },
  {
    rules: {
      '@typescript-eslint/consistent-type-imports': ['error', { fixStyle: 'inline-type-imports' }],
      '@typescript-eslint/consistent-type-definitions': 'off',
      '@typescript-eslint/no-unused-vars': ['error', { argsIgnorePattern: '^_', varsIgnorePattern: '^_' }],
      eqeqeq: ['error', 'always', { null: 'ignore' }],
      'no-console': 'error',
      'no-restricted-imports': [
        'error',
        {
          patterns: NO_GRAB_BAGS.map((name) => ({
            regex: `^\\.{1,2}/(.*/)?${name}(/|$)`,
            message: 'Put it in the room that owns it; grab-bag folders do not exist here.',
          })),
        },
      ],
    },
  },
  {
    files: ['src/**/*.{ts,tsx,astro,mjs}'],
    ignores: ['src/server/env.ts'],
    rules: {
      'no-restricted-properties': [
        'error',
        { object: 'process', property: 'env', message: 'Settings are read once, in src/server/env.ts.' },
      ],
    },
  },
  {
    files: ['src/**/*.{ts,tsx}'],
    ignores: ['src/pages/**', 'src/middleware.ts'],
    rules: {
      'no-restricted-syntax': [
        'error',
        {
          selector: 'ExportDefaultDeclaration',
          message: 'Named exports only, so that a name can be searched for.',
        },
        {
          selector: 'ImportDeclaration[source.value=/^astro:/]',
          message: 'astro:* only in pages, layouts, middleware and .astro files: the worker loads the rest.',
        },
      ],
    },
  },
  {
    files: ['scripts/**', 'fake-s3/**', 'fake-smtp/**', 'tests/**', 'src/cli/**', '*.config.*'],
    languageOptions: {
      globals: {
        process: 'readonly',
        console: 'readonly',
        Buffer: 'readonly',
        URL: 'readonly',
        fetch: 'readonly',
        setTimeout: 'readonly',
        clearTimeout: 'readonly',
        setInterval: 'readonly',
        clearInterval: 'readonly',
        AbortSignal: 'readonly',
      },
    },
    rules: { 'no-console': 'off' },
  },
  { files: ['tests/**'], rules: { '@typescript-eslint/no-non-null-assertion': 'off' } },
  { files: ['**/*.astro'], rules: { 'no-undef': 'off' } },
);
