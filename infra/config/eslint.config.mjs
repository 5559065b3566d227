import js from '@eslint/js';
import reactHooks from 'eslint-plugin-react-hooks';
import { defineConfig, globalIgnores } from 'eslint/config';
import path from 'node:path';
import tseslint from 'typescript-eslint';
import { houseRules } from './rules/house-rules.mjs';

const projectRoot = path.resolve(import.meta.dirname, '../..');
const tests = ['**/*.test.{ts,tsx}', '**/*.e2e.ts', '**/testing/**'];

export default defineConfig(
  globalIgnores(['**/node_modules/', '**/dist/', '**/coverage/', '.data/']),
  { linterOptions: { reportUnusedDisableDirectives: 'error' } },
  js.configs.recommended,
  tseslint.configs.recommended,
  {
    plugins: { house: houseRules },
    rules: {
      '@typescript-eslint/no-explicit-any': 'error',
      '@typescript-eslint/consistent-type-imports': ['error', { fixStyle: 'separate-type-imports' }],
      '@typescript-eslint/no-unused-vars': ['error', { argsIgnorePattern: '^_', ignoreRestSiblings: true }],
      '@typescript-eslint/ban-ts-comment': [
        'error',
        { 'ts-expect-error': 'allow-with-description', 'ts-ignore': true },
      ],
      eqeqeq: ['error', 'always', { null: 'ignore' }],
      'no-warning-comments': ['error', { terms: ['todo', 'fixme', 'xxx'], location: 'anywhere' }],
      'house/disable-needs-reason': 'error',
      'house/no-skipped-tests': 'error',
    },
  },
  {
    // A promise nobody waits for is a write that may never happen: checked with types where writes are made.
    files: ['api/src/**/*.ts', 'infra/**/*.ts', 'e2e/**/*.ts'],
    languageOptions: { parserOptions: { projectService: true, tsconfigRootDir: projectRoot } },
    rules: {
      '@typescript-eslint/await-thenable': 'error',
      '@typescript-eslint/no-floating-promises': 'error',
      '@typescript-eslint/no-misused-promises': 'error',
    },
  },
  {
    files: ['web/src/**/*.{ts,tsx}'],
    extends: [reactHooks.configs.flat.recommended],
    rules: {
      'react-hooks/exhaustive-deps': 'error',
      // These three speak about the React compiler, which this build does not use.
      'react-hooks/incompatible-library': 'off',
      'react-hooks/preserve-manual-memoization': 'off',
      'react-hooks/set-state-in-effect': 'off',
    },
  },
  { files: ['web/src/features/**/*.{ts,tsx}'], ignores: tests, rules: { 'house/theme-colors-only': 'error' } },
  {
    // The environment is read in one place, so that a setting can be found and is checked once.
    files: ['api/src/**/*.ts', 'web/src/**/*.{ts,tsx}', 'shared/src/**/*.ts'],
    ignores: ['api/src/config/env.ts', ...tests],
    rules: {
      'no-console': 'error',
      'no-restricted-properties': [
        'error',
        { object: 'process', property: 'env', message: 'Read it in config/env.ts.' },
      ],
      'no-restricted-imports': [
        'error',
        { paths: [{ name: 'node:process', importNames: ['env'], message: 'Read it in config/env.ts.' }] },
      ],
    },
  },
  {
    // Physiology and the shared rules get their time and their chance from the caller.
    files: ['api/src/physiology/**/*.ts', 'api/src/scheduling/**/*.ts', 'shared/src/**/*.ts'],
    ignores: tests,
    rules: {
      'no-restricted-syntax': [
        'error',
        { selector: "NewExpression[callee.name='Date'][arguments.length=0]", message: 'Take the time as an argument.' },
        {
          selector: "CallExpression[callee.object.name='Date'][callee.property.name='now']",
          message: 'Take the time as an argument.',
        },
        {
          selector: "CallExpression[callee.object.name='Math'][callee.property.name='random']",
          message: 'Take chance as an argument.',
        },
      ],
    },
  },
  {
    files: ['**/*.{ts,tsx,mjs}'],
    ignores: [...tests, 'api/src/physiology/reference-sets/**'],
    rules: { 'max-lines': ['error', { max: 300 }] },
  },
  {
    files: ['**/*.{mjs,cjs}'],
    languageOptions: {
      globals: { process: 'readonly', console: 'readonly', module: 'readonly', setTimeout: 'readonly' },
    },
  },
);
