import js from '@eslint/js';
import angular from 'angular-eslint';
import { createTypeScriptImportResolver } from 'eslint-import-resolver-typescript';
import importX from 'eslint-plugin-import-x';
import tseslint from 'typescript-eslint';
import { folderZones, layerBans, shapeBans, syntaxBans } from './eslint.layers.mjs';

const SPECS = [
  '**/*.spec.ts',
  '**/*.fixture.ts',
  '**/testing/**',
  'frontend/e2e/**',
  'frontend/jest-setup.ts',
];

export default tseslint.config(
  { ignores: ['dist/', 'node_modules/', '.angular/', '.data/', 'coverage/', 'jest.config.cjs'] },
  { linterOptions: { reportUnusedDisableDirectives: 'error' } },
  js.configs.recommended,
  {
    files: ['**/*.mjs', '**/*.cjs'],
    languageOptions: {
      globals: Object.fromEntries(
        [
          'process',
          'console',
          'Buffer',
          'URL',
          'setTimeout',
          'clearTimeout',
          'setInterval',
          'clearInterval',
          'fetch',
          'performance',
          'AbortController',
          'AbortSignal',
          'TextDecoder',
          'TextEncoder',
          'require',
          'module',
          '__dirname',
          'setImmediate',
          'structuredClone',
          'URLSearchParams',
        ].map((name) => [name, 'readonly']),
      ),
    },
  },
  ...tseslint.configs.recommended.map((config) => ({ ...config, files: ['**/*.ts'] })),
  {
    files: ['**/*.ts'],
    plugins: { 'import-x': importX },
    languageOptions: { parserOptions: { projectService: false } },
    settings: {
      // Without this no-cycle never opens a .ts file and finds nothing.
      'import-x/extensions': ['.ts', '.mjs', '.js'],
      'import-x/resolver-next': [
        createTypeScriptImportResolver({
          project: ['tsconfig.json', 'backend/tsconfig.json', 'frontend/tsconfig.app.json'],
        }),
      ],
    },
    rules: {
      'import-x/no-restricted-paths': ['error', { zones: folderZones() }],
      'import-x/no-cycle': 'error',
      '@typescript-eslint/no-unused-vars': ['error', { argsIgnorePattern: '^_', varsIgnorePattern: '^_' }],
      '@typescript-eslint/consistent-type-imports': 'error',
      'max-lines': ['error', { max: 400 }],
      'max-lines-per-function': ['error', { max: 60, skipComments: true, skipBlankLines: true }],
      'no-console': 'error',
      eqeqeq: 'error',
    },
  },
  {
    files: ['**/*.ts'],
    ignores: SPECS,
    rules: { 'no-restricted-syntax': ['error', ...syntaxBans()] },
  },
  {
    files: ['shared/units/**/*.ts'],
    ignores: SPECS,
    rules: { 'no-restricted-syntax': ['error', ...shapeBans()] },
  },
  ...layerBans(),
  {
    files: SPECS,
    rules: { 'max-lines-per-function': 'off' },
  },
  {
    // The one place that knows everything wires everything.
    files: ['backend/src/app/services.ts'],
    rules: { 'max-lines-per-function': 'off' },
  },
  {
    files: ['frontend/src/**/*.ts'],
    ignores: SPECS,
    extends: [...angular.configs.tsRecommended],
    processor: angular.processInlineTemplates,
    rules: {
      '@angular-eslint/prefer-on-push-component-change-detection': 'error',
      '@angular-eslint/prefer-signals': 'error',
      '@angular-eslint/prefer-inject': 'error',
      '@angular-eslint/component-class-suffix': 'off',
      '@angular-eslint/directive-class-suffix': 'off',
    },
  },
  {
    files: ['frontend/src/**/*.html'],
    extends: [...angular.configs.templateRecommended, ...angular.configs.templateAccessibility],
    rules: {
      '@angular-eslint/template/prefer-control-flow': 'error',
      '@angular-eslint/template/prefer-class-binding': 'error',
    },
  },
);
