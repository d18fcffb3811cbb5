// @ts-check
import eslint from '@eslint/js';
import angular from 'angular-eslint';
import prettier from 'eslint-config-prettier';
import { defineConfig, globalIgnores } from 'eslint/config';
import globals from 'globals';
import tseslint from 'typescript-eslint';

/** Import bans of one part of the repository. The last config object that sets a rule wins, so each part lists all. */
const restrict = (...groups) => ({
  'no-restricted-imports': [
    'error',
    {
      paths: [
        {
          name: 'echarts',
          message: "Import from 'echarts/core', '/charts', '/components', '/renderers'.",
        },
      ],
      patterns: groups,
    },
  ],
});
const group = (message, ...patterns) => ({ group: patterns, message });
/** For the pure libraries: anything but relative paths and the named packages is refused. */
const onlyImports = (message, ...allowed) => ({
  'no-restricted-imports': [
    'error',
    { patterns: [{ regex: `^(?!\\.|${allowed.join('|')})`, message }] },
  ],
});
const notTheServer = group(
  'The client may not import the server.',
  '**/server/**',
  'express',
  'knex',
  'objection',
  'node:*',
);
const notTheClient = group(
  'The server may not import the client.',
  '**/apps/**',
  '@angular/*',
  'rxjs',
  'rxjs/*',
);

export default defineConfig(
  globalIgnores([
    'dist/',
    'coverage/',
    '.local/',
    'samples/',
    'reports/',
    'test-results/',
    'playwright-report/',
    '.angular/',
  ]),
  { linterOptions: { reportUnusedDisableDirectives: 'error' } },

  // Plain JavaScript: no type information.
  {
    files: ['**/*.{js,mjs}'],
    extends: [eslint.configs.recommended],
    languageOptions: { globals: globals.node },
  },
  {
    files: ['apps/web/public/**/*.js'],
    languageOptions: { sourceType: 'script', globals: globals.browser },
  },

  {
    files: ['**/*.ts'],
    extends: [
      eslint.configs.recommended,
      tseslint.configs.strictTypeChecked,
      tseslint.configs.stylisticTypeChecked,
    ],
    languageOptions: {
      parserOptions: { projectService: true, tsconfigRootDir: import.meta.dirname },
    },
    rules: {
      '@typescript-eslint/consistent-type-imports': ['error', { fixStyle: 'inline-type-imports' }],
      '@typescript-eslint/no-extraneous-class': ['error', { allowWithDecorator: true }],
      '@typescript-eslint/restrict-template-expressions': ['error', { allowNumber: true }],
      '@typescript-eslint/switch-exhaustiveness-check': 'error',
      '@typescript-eslint/no-unused-vars': ['error', { argsIgnorePattern: '^_' }],
      'no-restricted-syntax': [
        'error',
        {
          selector:
            "ImportDeclaration[source.value='zod'] > :not(ImportNamespaceSpecifier)[type=/^Import/]",
          message:
            "Write `import * as z from 'zod'`: `{ z }` bundles the whole of zod (455 kB against 90 kB).",
        },
        {
          selector: 'ImportExpression[source.value=/(^|\\u002f)(apps|server)\\u002f/]',
          message:
            'no-restricted-imports does not see import(): import statically inside the layer.',
        },
      ],
      eqeqeq: 'error',
      'no-console': ['error', { allow: ['warn', 'error'] }],
    },
  },

  // The client.
  {
    files: ['apps/web/**/*.ts'],
    extends: [angular.configs.tsRecommended],
    processor: angular.processInlineTemplates,
    rules: {
      '@angular-eslint/component-selector': [
        'error',
        { type: 'element', prefix: 'app', style: 'kebab-case' },
      ],
      '@angular-eslint/directive-selector': [
        'error',
        { type: 'attribute', prefix: 'app', style: 'camelCase' },
      ],
      '@angular-eslint/prefer-on-push-component-change-detection': 'error',
      '@angular-eslint/prefer-signals': 'error',
      '@angular-eslint/prefer-output-readonly': 'error',
      '@angular-eslint/no-uncalled-signals': 'error',
      '@angular-eslint/use-lifecycle-interface': 'error',
      '@typescript-eslint/unbound-method': ['error', { ignoreStatic: true }], // Validators.required
      ...restrict(notTheServer),
    },
  },
  {
    files: ['apps/web/**/*.html'],
    extends: [angular.configs.templateRecommended, angular.configs.templateAccessibility],
    rules: {
      '@angular-eslint/template/button-has-type': 'error',
      '@angular-eslint/template/no-call-expression': 'off', // signals are calls
      '@angular-eslint/template/no-duplicate-attributes': 'error',
      '@angular-eslint/template/no-positive-tabindex': 'error',
      '@angular-eslint/template/prefer-self-closing-tags': 'error',
    },
  },

  {
    files: ['apps/web/src/app/figures/**/*.ts'],
    ignores: ['**/*.spec.ts'],
    rules: restrict(
      notTheServer,
      group(
        'Figures draw numbers: they know no HTTP and no page.',
        '**/api/**',
        '@angular/common/http',
        '@angular/router',
      ),
    ),
  },

  // The libraries: neither platform, neither application, no clock and no chance.
  {
    files: ['libs/**/*.ts'],
    ignores: ['**/*.spec.ts'],
    rules: {
      'no-restricted-globals': [
        'error',
        ...['document', 'window', 'fetch', 'process', 'performance', 'setTimeout'].map((name) => ({
          name,
          message: 'A library runs on both sides and does no I/O.',
        })),
      ],
      'no-restricted-properties': [
        'error',
        { object: 'Math', property: 'random', message: 'Pass a seeded random source in.' },
        { object: 'Date', property: 'now', message: 'A library has no clock: pass the time in.' },
      ],
    },
  },
  {
    files: ['libs/analysis/**/*.ts'],
    ignores: ['**/*.spec.ts'],
    rules: onlyImports(
      'analysis is arithmetic: it imports itself, fft.js and simple-statistics.',
      'fft\\.js$',
      'simple-statistics$',
    ),
  },
  {
    files: ['libs/guide-log/**/*.ts'],
    ignores: ['**/*.spec.ts'],
    rules: onlyImports('guide-log reads text: it imports itself and Papa Parse.', 'papaparse$'),
  },
  {
    files: ['libs/contract/**/*.ts'],
    ignores: ['**/*.spec.ts'],
    rules: onlyImports('The contract imports zod and itself.', 'zod$'),
  },

  // The server.
  {
    files: ['server/**/*.ts'],
    rules: { ...restrict(notTheClient), 'no-console': 'off' },
  },
  {
    files: ['server/**/*-routes.ts'],
    rules: restrict(
      notTheClient,
      group('Routes know no SQL: ask the service.', 'knex', 'objection', 'pg', '**/*-model.ts'),
    ),
  },
  {
    files: ['server/**/*-model.ts'],
    rules: restrict(notTheClient, group('Models know no HTTP.', 'express', '**/http/**')),
  },
  { files: ['test/**/*.ts'], rules: { ...restrict(), 'no-console': 'off' } },

  // Tests.
  {
    files: ['**/*.spec.ts'],
    rules: {
      '@typescript-eslint/no-non-null-assertion': 'off',
      '@typescript-eslint/no-unsafe-assignment': 'off',
    },
  },
  prettier,
);
