import { resolve } from 'node:path';
import { configs as lit } from 'eslint-plugin-lit';
import litA11y from 'eslint-plugin-lit-a11y';
import { configs as wc } from 'eslint-plugin-wc';
import { defineConfig } from 'eslint/config';
import tseslint from 'typescript-eslint';
import { layers, pageless } from './layers.js';

const pageGlobals = [
  'window', 'self', 'document', 'navigator', 'location', 'customElements', 'localStorage', 'sessionStorage',
  'indexedDB', 'fetch', 'HTMLElement', 'Element', 'Node', 'Event', 'CustomEvent', 'getComputedStyle',
  'requestAnimationFrame', 'matchMedia', 'alert',
];

export default defineConfig(
  { ignores: ['dist/**', 'coverage/**', 'node_modules/**'] },
  { linterOptions: { reportUnusedDisableDirectives: 'error' } },
  ...tseslint.configs.strict,
  {
    rules: {
      'max-lines': ['warn', { max: 300, skipBlankLines: true, skipComments: true }],
      'no-restricted-syntax': ['error', { selector: 'TSEnumDeclaration', message: 'Use a const object and a union.' }],
      eqeqeq: ['error', 'always', { null: 'ignore' }],
      'no-eval': 'error',
      'no-implied-eval': 'error',
      'no-new-func': 'error',
      'no-console': 'error',
      '@typescript-eslint/consistent-type-imports': 'error',
      '@typescript-eslint/no-unused-vars': ['error', { argsIgnorePattern: '^_', varsIgnorePattern: '^_' }],
    },
  },
  {
    // with types: what a compiler lets pass and a page pays for
    files: ['**/*.ts'],
    languageOptions: {
      parserOptions: { projectService: true, tsconfigRootDir: resolve(import.meta.dirname, '..') },
    },
    rules: {
      '@typescript-eslint/await-thenable': 'error',
      '@typescript-eslint/no-base-to-string': 'error',
      '@typescript-eslint/no-deprecated': 'error',
      '@typescript-eslint/no-floating-promises': 'error',
      '@typescript-eslint/no-misused-promises': 'error',
      '@typescript-eslint/no-unnecessary-type-assertion': 'error',
      '@typescript-eslint/only-throw-error': 'error',
      '@typescript-eslint/restrict-plus-operands': 'error',
      '@typescript-eslint/switch-exhaustiveness-check': ['error', { considerDefaultExhaustiveForUnions: true }],
    },
  },
  { files: ['src/**/*.ts'], plugins: { layers }, rules: { 'layers/order': 'error' } },
  {
    files: pageless,
    rules: {
      'no-restricted-globals': [
        'error',
        ...pageGlobals.map((name) => ({ name, message: 'This layer knows no page.' })),
      ],
    },
  },
  {
    files: ['src/elements/**/*.ts', 'src/*.ts', 'tests/elements/**/*.ts', 'tests/hostile/**/*.ts', 'demo/**/*.ts'],
    extends: [lit['flat/recommended'], wc['flat/recommended']],
    plugins: { 'lit-a11y': litA11y },
    rules: litA11y.configs.recommended.rules,
  },
  {
    // its arrays are filled slot by slot from one plan, so an index is known to be there
    files: ['src/formula/**/*.ts'],
    rules: { '@typescript-eslint/no-non-null-assertion': 'off' },
  },
  {
    // tests know what must be there; tools print
    files: ['tests/**', 'demo/**', '.config/**', 'vite.config.ts'],
    rules: { 'no-console': 'off', '@typescript-eslint/no-non-null-assertion': 'off' },
  },
);
