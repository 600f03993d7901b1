import js from '@eslint/js';
import angular from 'angular-eslint';
import prettier from 'eslint-config-prettier';
import { defineConfig } from 'eslint/config';
import tseslint from 'typescript-eslint';
import { arrows } from './test/lint/rules/arrows.mjs';
import {
  clockAndChance,
  enums,
  storeOpened,
  subscriptions,
  vagueClasses,
  writingConnection,
} from './test/lint/rules/banned-syntax.mjs';
import { fileNames } from './test/lint/rules/file-names.mjs';
import { networkFeatures } from './test/lint/rules/layers.mjs';

const everySpec = ['**/*.spec.ts', 'test/**/*.ts', 'projects/dashboard/src/app/testing/**/*.ts'];
const client = 'projects/dashboard/src/**';

/** Every rule here is an error with a sentence; what is not worth an error is not a rule. */
export default defineConfig(
  { ignores: ['dist/', 'data/', 'coverage/', '.angular/', 'test/output/', 'node_modules/'] },
  { linterOptions: { reportUnusedDisableDirectives: 'error' } },
  {
    plugins: { underseam: { rules: { arrows, 'file-names': fileNames } } },
    files: ['**/*.ts', '**/*.mjs'],
    rules: {
      'max-lines': ['error', 300],
      'underseam/file-names': 'error',
      eqeqeq: ['error', 'always', { null: 'ignore' }],
    },
  },
  {
    files: ['**/*.mjs'],
    extends: [js.configs.recommended],
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
        ].map((name) => [name, 'readonly']),
      ),
    },
  },
  {
    files: ['**/*.ts'],
    extends: [js.configs.recommended, tseslint.configs.strictTypeChecked],
    languageOptions: {
      parserOptions: {
        project: [
          'tsconfig.check.json',
          'projects/dashboard/tsconfig.spec.json',
          'projects/dashboard/tsconfig.worker.json',
        ],
        tsconfigRootDir: import.meta.dirname,
      },
    },
    rules: {
      'underseam/arrows': 'error',
      '@typescript-eslint/no-explicit-any': 'error',
      '@typescript-eslint/consistent-type-imports': ['error', { fixStyle: 'inline-type-imports' }],
      '@typescript-eslint/restrict-template-expressions': ['error', { allowNumber: true }],
      '@typescript-eslint/no-confusing-void-expression': ['error', { ignoreArrowShorthand: true }],
      '@typescript-eslint/no-extraneous-class': ['error', { allowWithDecorator: true }],
      '@typescript-eslint/no-misused-spread': ['error', { allow: ['string'] }],
      '@typescript-eslint/no-unused-vars': [
        'error',
        { argsIgnorePattern: '^_', ignoreRestSiblings: true },
      ],
      '@typescript-eslint/unbound-method': ['error', { ignoreStatic: true }],
      // The claim "sub" of a token is taken for a method that strings have from old times.
      '@typescript-eslint/no-deprecated': ['error', { allow: ['sub'] }],
      // Right more often than wrong, but not worth an error: an error handed on, a request, a default spelt out.
      '@typescript-eslint/prefer-promise-reject-errors': 'off',
      '@typescript-eslint/no-unsafe-class-instance-assignment': 'off',
      '@typescript-eslint/no-unnecessary-type-arguments': 'off',
      // A function may be async because its interface is, and a JSON field is taken out by its name.
      '@typescript-eslint/require-await': 'off',
      '@typescript-eslint/no-dynamic-delete': 'off',
      // An index that a loop has just bounded is not worth a branch that no test can reach.
      '@typescript-eslint/no-non-null-assertion': 'off',
      // Says itself what type a column or an answer has; the compiler cannot know.
      '@typescript-eslint/no-unnecessary-type-parameters': 'off',
      'no-restricted-syntax': ['error', enums, vagueClasses],
    },
  },
  {
    files: ['shared/**/*.ts', 'db/queries/**/*.ts', 'server/features/**/*.ts'],
    ignores: everySpec,
    rules: { 'no-restricted-syntax': ['error', enums, vagueClasses, ...clockAndChance] },
  },
  {
    files: ['server/features/**/*.ts'],
    ignores: [...everySpec, ...networkFeatures.map((name) => `server/features/${name}/**`)],
    rules: {
      'no-restricted-syntax': [
        'error',
        enums,
        vagueClasses,
        writingConnection,
        ...clockAndChance,
        ...storeOpened,
      ],
    },
  },
  {
    files: [`${client}/*.ts`],
    extends: [angular.configs.tsRecommended],
    processor: angular.processInlineTemplates,
    rules: {
      '@angular-eslint/component-selector': [
        'error',
        // app-root is the name the page's nonce is handed to; a piece of a chart is an attribute of the svg element it fills.
        { type: ['element', 'attribute'], prefix: ['us', 'app'], style: 'kebab-case' },
      ],
      '@angular-eslint/directive-selector': [
        'error',
        { type: 'attribute', prefix: 'us', style: 'camelCase' },
      ],
      '@angular-eslint/prefer-on-push-component-change-detection': 'error',
      '@angular-eslint/prefer-signals': 'error',
    },
  },
  {
    files: [`${client}/features/**/*-page.ts`],
    rules: { 'no-restricted-syntax': ['error', enums, vagueClasses, subscriptions] },
  },
  {
    files: [`${client}/*.html`],
    extends: [angular.configs.templateRecommended, angular.configs.templateAccessibility],
    rules: {
      // A static style attribute breaks the content security policy; a class or [style.x] does not.
      '@angular-eslint/template/no-inline-styles': ['error', { allowBindToStyle: true }],
      '@angular-eslint/template/prefer-self-closing-tags': 'error',
    },
  },
  {
    // Specs may reach anything, make their own clock, and hold what a library hands them untyped.
    files: everySpec,
    rules: {
      'underseam/arrows': 'off',
      '@typescript-eslint/no-unnecessary-condition': 'off',
      '@typescript-eslint/no-unsafe-argument': 'off',
      '@typescript-eslint/no-unsafe-assignment': 'off',
      '@typescript-eslint/no-unsafe-call': 'off',
      '@typescript-eslint/no-unsafe-member-access': 'off',
      '@typescript-eslint/no-unsafe-return': 'off',
      '@typescript-eslint/unbound-method': 'off',
    },
  },
  prettier,
);
