import js from '@eslint/js';
import { defineConfig } from 'eslint/config';
import { createTypeScriptImportResolver } from 'eslint-import-resolver-typescript';
import importX from 'eslint-plugin-import-x';
import reactHooks from 'eslint-plugin-react-hooks';
import globals from 'globals';
import tseslint from 'typescript-eslint';

/** Import directions of the project, each with the sentence that a developer reads. */
const zones = [
  {
    target: './shared',
    from: ['./api', './web', './test', './sample-data'],
    message: 'shared/ is pure and is imported by the others, never the other way round.',
  },
  {
    target: './web',
    from: ['./api', './test', './sample-data'],
    message: 'The client talks to the API over HTTP; what both need lives in shared/.',
  },
  {
    target: './api',
    from: ['./web', './test'],
    message: 'The API never imports the client or the tests.',
  },
  {
    target: './shared/geometry',
    from: './shared',
    except: ['./geometry', './units.ts'],
    message: 'geometry/ is the ground floor: it imports units.ts only.',
  },
  {
    target: './shared/solar',
    from: './shared',
    except: ['./solar', './geometry', './units.ts'],
    message: 'solar/ may import geometry/ and units.ts only.',
  },
  {
    target: './shared/massing',
    from: './shared',
    except: ['./massing', './geometry', './units.ts'],
    message: 'massing/ may import geometry/ and units.ts only.',
  },
  {
    target: './shared/shadow',
    from: ['./shared/receptors', './shared/rules', './shared/study', './shared/drawing'],
    message: 'shadow/ knows neither receptors, rules nor studies.',
  },
  {
    target: './shared/receptors',
    from: ['./shared/rules', './shared/study', './shared/drawing'],
    message: 'receptors/ knows neither rules nor studies.',
  },
  {
    target: './shared/rules',
    from: ['./shared/study', './shared/drawing'],
    message: 'rules/ is judged by a study and does not know it.',
  },
  {
    target: './web/components',
    from: ['./web/features', './web/app', './web/map'],
    message: 'components/ are free of the product: features import them.',
  },
  {
    target: './web/map',
    from: ['./web/features', './web/app'],
    message: 'The map takes props; features and pages pass them.',
  },
  {
    target: './web/features',
    from: './web/app',
    except: ['./paths.ts'],
    message: 'Pages compose features; a feature knows paths.ts alone of app/.',
  },
];

const pureGlobals = [
  'process',
  'Buffer',
  'window',
  'document',
  'navigator',
  'fetch',
  'localStorage',
  'setTimeout',
  'setInterval',
  'performance',
].map((name) => ({ name, message: 'shared/ is pure: no I/O, no clock, no DOM, no Node.' }));

export default defineConfig(
  { ignores: ['node_modules/', 'dist/', '.noonmark/', '.noonmark-test/', 'test/e2e/screenshots/'] },
  js.configs.recommended,
  tseslint.configs.strictTypeChecked,
  importX.flatConfigs.recommended,
  importX.flatConfigs.typescript,
  {
    languageOptions: {
      globals: { ...globals.node, ...globals.browser },
      parserOptions: { projectService: true, tsconfigRootDir: import.meta.dirname },
    },
    settings: {
      'import-x/resolver-next': [createTypeScriptImportResolver({ alwaysTryTypes: true })],
    },
    rules: {
      curly: ['error', 'multi-line'],
      eqeqeq: 'error',
      'no-console': 'error',
      '@typescript-eslint/consistent-type-imports': 'error',
      '@typescript-eslint/restrict-template-expressions': ['error', { allowNumber: true }],
      '@typescript-eslint/no-confusing-void-expression': ['error', { ignoreArrowShorthand: true }],
      '@typescript-eslint/no-unused-vars': [
        'error',
        { argsIgnorePattern: '^_', varsIgnorePattern: '^_', ignoreRestSiblings: true },
      ],
      'import-x/no-restricted-paths': ['error', { basePath: import.meta.dirname, zones }],
      'import-x/no-unresolved': ['error', { ignore: ['\\?'] }],
      'import-x/no-cycle': 'error',
      'import-x/no-named-as-default': 'off',
      'import-x/no-named-as-default-member': 'off',
      'import-x/order': [
        'error',
        { groups: ['builtin', 'external', 'parent', 'sibling'], alphabetize: { order: 'asc' } },
      ],
    },
  },
  {
    files: ['shared/**'],
    rules: {
      'no-restricted-globals': ['error', ...pureGlobals],
      'no-restricted-syntax': [
        'error',
        {
          selector: "MemberExpression[object.name='Date'][property.name='now']",
          message: 'No code in shared/ reads the clock: take the instant as an argument.',
        },
        {
          selector: "NewExpression[callee.name='Date'][arguments.length=0]",
          message: 'No code in shared/ reads the clock: take the instant as an argument.',
        },
        {
          selector: "CallExpression[callee.object.name='Math'][callee.property.name='random']",
          message: 'shared/ gives the same result for the same input.',
        },
      ],
      'import-x/no-nodejs-modules': 'error',
    },
  },
  { ...reactHooks.configs.flat.recommended, files: ['web/**'] },
  {
    files: ['api/start/**', 'api/cli/**', 'sample-data/**', 'test/bench/**'],
    rules: { 'no-console': 'off' },
  },
  // MikroORM's base class wants promises; generated migrations have nothing to wait for.
  { files: ['api/migrations/**'], rules: { '@typescript-eslint/require-await': 'off' } },
);
