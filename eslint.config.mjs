import { builtinModules } from 'node:module';
import { createTypeScriptImportResolver } from 'eslint-import-resolver-typescript';
import { importX } from 'eslint-plugin-import-x';
import reactHooks from 'eslint-plugin-react-hooks';
import tseslint from 'typescript-eslint';

const client = ['app/**/*.{ts,tsx}', 'components/**/*.{ts,tsx}', 'hooks/**/*.{ts,tsx}', 'index.ts'];
const typed = ['**/*.{ts,tsx}'];

/** Which folder may not import which. The direction is app → components, hooks → shared ← server. */
const zones = [
  { target: './shared', from: ['./app', './components', './hooks', './server', './tests', './assets'] },
  { target: './server', from: ['./app', './components', './hooks', './tests', './assets'] },
  { target: './hooks', from: ['./app', './components', './server', './tests'] },
  {
    target: './components',
    from: ['./app', './server', './tests', './hooks/api', './hooks/queries', './hooks/upload', './hooks/events'],
  },
  { target: './app', from: ['./server', './tests', './hooks/api/call.ts'] },
].map((zone) => ({
  ...zone,
  message: 'The layers run app → components, hooks → shared ← server (see DEVELOPERS.md).',
}));

const typography = {
  name: 'react-native',
  importNames: ['Text', 'TextInput', 'Button'],
  message: 'Text, TextInput and Button come from components/ui, so that type and colour stay on the tokens.',
};
const skiaIndex = {
  name: '@shopify/react-native-skia',
  message: 'Only components/viewer and components/charts draw with Skia; a route loads them lazily.',
};
const noFetching = {
  name: '@tanstack/react-query',
  message: 'Components never fetch: a screen passes them what a hook has read.',
};
const noOrm = ['typeorm', 'pg'].map((name) => ({
  name,
  message: 'The database is touched in repositories, entities, migrations and server/database only.',
}));

/** @param {object[]} paths @param {object[]} [patterns] */
const banImports = (paths, patterns = []) => ({ 'no-restricted-imports': ['error', { paths, patterns }] });

const pure = {
  regex: `^(node:.*|${builtinModules.join('|')}|react($|/)|react-.*|expo.*|@expo/.*|@shopify/.*|@tanstack/.*|typeorm|pg|pg-boss|express|sharp|utif|multer|pino.*)$`,
  message: 'shared/ is pure TypeScript that runs anywhere: no React, no Node built-ins, no database.',
};
const banDom = [
  'window',
  'document',
  'navigator',
  'localStorage',
  'sessionStorage',
  'fetch',
  'process',
  'Buffer',
  '__dirname',
  'require',
].map((name) => ({ name, message: 'shared/ is pure TypeScript that runs anywhere.' }));
const banRequests = ['fetch', 'XMLHttpRequest', 'EventSource', 'WebSocket'].map((name) => ({
  name,
  message: 'Requests are made in hooks/ only, through the one function that calls an endpoint.',
}));
const banEnvironment = {
  object: 'process',
  property: 'env',
  message: 'The environment is read once, in server/config.ts.',
};
const banBarrels = ['ExportAllDeclaration', 'ExportNamedDeclaration[source]'].map((selector) => ({
  selector,
  message: 'No barrels: import from the file that holds the thing.',
}));

export default tseslint.config(
  { ignores: ['node_modules/', 'dist/', 'coverage/', '.expo/', '.ringwright/', 'public/', 'assets/', 'expo-env.d.ts'] },
  {
    linterOptions: { noInlineConfig: true, reportUnusedDisableDirectives: 'error' },
    plugins: { 'import-x': importX },
    settings: {
      ...importX.flatConfigs.typescript.settings,
      'import-x/resolver-next': [
        createTypeScriptImportResolver({
          project: ['tsconfig.json', 'server/tsconfig.json', 'tests/e2e/tsconfig.json'],
          noWarnOnMultipleProjects: true,
        }),
      ],
    },
    rules: {
      eqeqeq: ['error', 'always', { null: 'ignore' }],
      'no-constant-condition': ['error', { checkLoops: false }],
      'no-debugger': 'error',
      'no-duplicate-case': 'error',
      'no-fallthrough': 'error',
      'no-self-assign': 'error',
      'no-unreachable': 'error',
      'no-unsafe-finally': 'error',
      'no-useless-catch': 'error',
      'no-var': 'error',
      'prefer-const': 'error',
      'use-isnan': 'error',
      'import-x/no-restricted-paths': ['error', { zones }],
      'import-x/no-cycle': 'error',
      'import-x/no-self-import': 'error',
    },
  },
  {
    files: typed,
    extends: [tseslint.configs.recommended],
    languageOptions: {
      parserOptions: {
        project: ['tsconfig.json', 'server/tsconfig.json', 'tests/e2e/tsconfig.json'],
        tsconfigRootDir: import.meta.dirname,
      },
    },
    rules: {
      '@typescript-eslint/await-thenable': 'error',
      '@typescript-eslint/ban-ts-comment': [
        'error',
        { 'ts-expect-error': true, 'ts-ignore': true, 'ts-nocheck': true },
      ],
      '@typescript-eslint/consistent-type-imports': ['error', { fixStyle: 'inline-type-imports' }],
      '@typescript-eslint/no-explicit-any': 'error',
      '@typescript-eslint/no-floating-promises': 'error',
      '@typescript-eslint/no-misused-promises': [
        'error',
        { checksVoidReturn: { attributes: false, arguments: false } },
      ],
      '@typescript-eslint/no-non-null-assertion': 'off',
      '@typescript-eslint/no-unused-vars': [
        'error',
        { argsIgnorePattern: '^_', varsIgnorePattern: '^_', ignoreRestSiblings: true },
      ],
      '@typescript-eslint/only-throw-error': 'error',
      '@typescript-eslint/switch-exhaustiveness-check': ['error', { considerDefaultExhaustiveForUnions: true }],
      'no-console': 'error',
      'no-restricted-syntax': ['error', ...banBarrels],
      'import-x/no-default-export': 'error',
    },
  },
  {
    files: ['shared/**/*.ts'],
    rules: { ...banImports([], [pure]), 'no-restricted-globals': ['error', ...banDom] },
  },
  {
    files: ['server/**/*.ts'],
    rules: { ...banImports(noOrm), 'no-restricted-properties': ['error', banEnvironment] },
  },
  {
    files: [
      'server/features/**/*{R,r}epository.ts',
      'server/features/**/*{R,r}eadModel*.ts',
      'server/{database,entities,migrations,worker/queue}/**/*.ts',
      'server/scripts/**/*.ts',
    ],
    rules: banImports([]),
  },
  {
    files: ['server/config.ts', 'server/scripts/**/*.ts'],
    rules: { 'no-restricted-properties': 'off' },
  },
  {
    // Commands write to the terminal.
    files: ['server/scripts/**/*.ts', 'server/demo/**/*.ts'],
    rules: { 'no-console': 'off' },
  },
  {
    files: client,
    plugins: { 'react-hooks': reactHooks },
    rules: {
      'react-hooks/rules-of-hooks': 'error',
      'react-hooks/exhaustive-deps': 'error',
      'no-restricted-properties': ['error', banEnvironment],
      ...banImports([typography, skiaIndex]),
    },
  },
  {
    files: ['hooks/**/*.{ts,tsx}'],
    rules: banImports([typography, skiaIndex]),
  },
  {
    files: ['components/**/*.{ts,tsx}'],
    rules: { ...banImports([typography, skiaIndex, noFetching]), 'no-restricted-globals': ['error', ...banRequests] },
  },
  {
    files: ['components/{viewer,charts}/**/*.{ts,tsx}'],
    rules: banImports([typography, noFetching]),
  },
  {
    files: ['components/ui/**/*.{ts,tsx}'],
    rules: banImports([skiaIndex, noFetching]),
  },
  {
    // Expo Router makes a route of every file in app/, so nothing else may stand there.
    files: ['app/**/*.{ts,tsx}'],
    rules: {
      'import-x/no-default-export': 'off',
      'no-restricted-globals': ['error', ...banRequests],
      'no-restricted-syntax': [
        'error',
        ...banBarrels,
        {
          selector: 'Program:not(:has(ExportDefaultDeclaration))',
          message: 'app/ holds routes only; a route has a default export.',
        },
      ],
    },
  },
  {
    files: ['tests/**/*.{ts,tsx}', '**/*.d.ts'],
    rules: { 'import-x/no-default-export': 'off' },
  },
  {
    files: ['**/*.{js,mjs,cjs}'],
    extends: [tseslint.configs.recommended],
    rules: { '@typescript-eslint/no-require-imports': 'off' },
  },
);
