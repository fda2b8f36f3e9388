import nextCoreWebVitals from 'eslint-config-next/core-web-vitals';
import nextTypescript from 'eslint-config-next/typescript';
import { defineConfig, globalIgnores } from 'eslint/config';

const noProcessEnv = {
  selector: "MemberExpression[object.name='process'][property.name='env']",
  message: 'Settings are read in lib/env.ts alone.',
};
const noRandom = {
  selector: "MemberExpression[object.name='Math'][property.name='random']",
  message: 'The engine answers the same to the same facts: no chance in it.',
};
const noClock = (name) => ({ name, message: `lib/findings is pure: no ${name}.` });

export default defineConfig([
  globalIgnores([
    '.next*/**',
    '.ohmstead*/**',
    'dist/**',
    'coverage/**',
    'test-results/**',
    'playwright-report/**',
    'uploads/**',
    'next-env.d.ts',
  ]),
  nextCoreWebVitals,
  nextTypescript,
  {
    linterOptions: { reportUnusedDisableDirectives: 'error' },
    rules: {
      'max-lines': ['error', { max: 300, skipBlankLines: false, skipComments: false }],
      'no-restricted-syntax': ['error', noProcessEnv],
      // Photos are private bytes behind a session; Next's optimizer would fetch and cache them without one.
      '@next/next/no-img-element': 'off',
      '@typescript-eslint/no-unused-vars': [
        'error',
        { argsIgnorePattern: '^_', varsIgnorePattern: '^_', ignoreRestSiblings: true },
      ],
    },
  },
  {
    files: ['**/*.ts', '**/*.tsx'],
    languageOptions: { parserOptions: { projectService: true, tsconfigRootDir: import.meta.dirname } },
    rules: {
      '@typescript-eslint/no-explicit-any': 'error',
      '@typescript-eslint/no-floating-promises': 'error',
      '@typescript-eslint/switch-exhaustiveness-check': ['error', { considerDefaultExhaustiveForUnions: true }],
    },
  },
  {
    // The PDF's Image has no alt; the web report is the accessible original.
    files: ['components/report/report-*.tsx'],
    rules: { 'jsx-a11y/alt-text': 'off' },
  },
  {
    files: ['lib/findings/**'],
    rules: {
      'no-restricted-globals': [
        'error',
        ...['Date', 'fetch', 'process', 'crypto', 'console', 'performance', 'setTimeout'].map(noClock),
      ],
      'no-restricted-syntax': ['error', noProcessEnv, noRandom],
    },
  },
  {
    files: ['lib/env.ts', 'scripts/**', 'tests/**', '*.config.{ts,mjs}'],
    rules: { 'no-restricted-syntax': 'off' },
  },
]);
