import js from '@eslint/js';
import astro from 'eslint-plugin-astro';
import reactHooks from 'eslint-plugin-react-hooks';
import globals from 'globals';
import { defineConfig } from 'eslint/config';
import tseslint from 'typescript-eslint';

const folders = (names) => names.flatMap((name) => [`**/${name}/**`, `@/${name}/**`, `**/${name}`]);

/** Forbids `files` to import from `names`; types may pass when `typesToo` is not set. */
const gate = (files, names, why, more = []) => ({
  files,
  rules: {
    '@typescript-eslint/no-restricted-imports': [
      'error',
      {
        patterns: [{ group: [...folders(names), ...more], message: why, allowTypeImports: false }],
      },
    ],
  },
});

const outer = [
  'services',
  'db',
  'auth',
  'http',
  'pages',
  'islands',
  'layouts',
  'components',
  'cli',
];
const impure = ['node:*', 'react', 'astro', 'astro:*', 'drizzle-orm', 'mysql2', 'mysql2/*'];

export default defineConfig(
  { ignores: ['dist/', '.astro/', '.data/', 'coverage/', 'node_modules/', 'drizzle/'] },
  js.configs.recommended,
  ...tseslint.configs.recommendedTypeChecked,
  ...astro.configs.recommended,
  reactHooks.configs.flat.recommended,
  {
    languageOptions: {
      globals: { ...globals.node, ...globals.browser },
      parserOptions: {
        projectService: {
          allowDefaultProject: ['*.mjs', 'src/cli/*.mjs'],
          maximumDefaultProjectFileMatchCount_THIS_WILL_SLOW_DOWN_LINTING: 30,
        },
        extraFileExtensions: ['.astro'],
      },
    },
    rules: {
      '@typescript-eslint/switch-exhaustiveness-check': [
        'error',
        { considerDefaultExhaustiveForUnions: true },
      ],
      '@typescript-eslint/consistent-type-imports': 'error',
      '@typescript-eslint/no-unused-vars': [
        'error',
        { argsIgnorePattern: '^_', varsIgnorePattern: '^_', ignoreRestSiblings: true },
      ],
      'max-lines': ['warn', { max: 400, skipBlankLines: true, skipComments: true }],
      'astro/no-set-html-directive': 'error',
      'react-hooks/incompatible-library': 'off',
    },
  },
  {
    // A declaration that imports at its top is a module and declares nothing global.
    files: ['src/env.d.ts'],
    rules: {
      '@typescript-eslint/triple-slash-reference': 'off',
      '@typescript-eslint/consistent-type-imports': 'off',
    },
  },
  {
    // Launchers run before packages are there; they and the configuration have no types.
    files: ['**/*.mjs', '**/*.astro'],
    ...tseslint.configs.disableTypeChecked,
  },
  {
    // The pure folders: the same arguments give the same answer.
    files: [
      'src/kinetics/**',
      'src/screening/**',
      'src/workbooks/**',
      'src/contracts/**',
      'src/demo/**',
      'src/calibration/**',
    ],
    rules: {
      'no-restricted-globals': ['error', 'process', 'fetch', 'setTimeout', 'localStorage'],
      'no-restricted-properties': [
        'error',
        { object: 'Math', property: 'random', message: 'Take a seeded generator as an argument.' },
        { object: 'Date', property: 'now', message: 'Take the time as an argument.' },
      ],
    },
  },
  gate(
    ['src/kinetics/**'],
    ['screening', 'workbooks', 'contracts', ...outer],
    'kinetics imports nothing of the rest.',
    impure,
  ),
  gate(
    ['src/screening/**'],
    ['workbooks', 'contracts', ...outer],
    'screening stands on kinetics only.',
    impure,
  ),
  gate(
    ['src/workbooks/**'],
    ['contracts', ...outer],
    'workbooks stands on kinetics and screening.',
  ),
  gate(
    ['src/calibration/**'],
    ['screening', 'workbooks', 'contracts', ...outer],
    'calibration stands on kinetics only.',
    impure,
  ),
  gate(['src/contracts/**'], outer, 'contracts stands on the pure folders only.', impure),
  gate(
    ['src/islands/**'],
    ['services', 'db', 'auth', 'http', 'workbooks', 'pages', 'cli'],
    'An island knows kinetics, screening and contracts; data comes by props and endpoints.',
    ['node:*', 'drizzle-orm', 'mysql2'],
  ),
  gate(
    ['src/pages/**', 'src/layouts/**', 'src/components/**'],
    ['db', 'cli'],
    'Pages ask a service; SQL lives in src/db.',
    ['drizzle-orm', 'mysql2'],
  ),
  gate(['src/db/**'], ['services', 'pages', 'islands', 'cli', 'http'], 'db is below the services.'),
  gate(
    ['src/services/**'],
    ['pages', 'islands', 'http', 'cli'],
    'Services are below endpoints and pages.',
    ['react', 'astro'],
  ),
);
