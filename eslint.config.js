import js from '@eslint/js';
import angular from 'angular-eslint';
import prettier from 'eslint-config-prettier';
import globals from 'globals';
import tseslint from 'typescript-eslint';

/**
 * The layers, as a rule that fails the build. Each part of the house names what it may not reach;
 * the stages of the engine are held by tests/architecture, which reads the real import graph.
 */
const ENGINE_INSIDE = {
  regex: '(^|/)engine/(?!index)',
  message: 'Reach the engine only through shared/engine/index.ts (import from "#engine").',
};
const CONTRACTS_INSIDE = {
  regex: '(^|/)contracts/(?!index)',
  message: 'Reach the contracts only through shared/contracts/index.ts (import from "#contracts").',
};
const WEB = { regex: '(^|/)web/', message: 'api and worker never import web.' };
const SERVER = {
  regex: '(^|/)(api|worker)/',
  message: 'web reaches api only by HTTP; it imports nothing of api or worker.',
};
const NODE_BUILTINS = { regex: '^(node:|fs$|path$|events$|stream$)', message: 'shared/ is pure.' };
const restrict = (...patterns) => ({ 'no-restricted-imports': ['error', { patterns }] });

export default tseslint.config(
  { ignores: ['dist/', 'node_modules/', '.angular/', '.data/', 'coverage/'] },
  js.configs.recommended,
  {
    files: ['**/*.ts'],
    extends: [...tseslint.configs.strict, ...tseslint.configs.stylistic],
    rules: {
      '@typescript-eslint/no-unused-vars': ['error', { argsIgnorePattern: '^_' }],
      '@typescript-eslint/no-non-null-assertion': 'off',
      '@typescript-eslint/consistent-type-imports': 'error',
      '@typescript-eslint/consistent-type-definitions': 'off',
    },
  },
  {
    files: ['web/src/**/*.ts'],
    extends: [...angular.configs.tsRecommended],
    processor: angular.processInlineTemplates,
    languageOptions: { globals: globals.browser },
    rules: {
      '@angular-eslint/prefer-on-push-component-change-detection': 'error',
      '@angular-eslint/component-selector': [
        'error',
        { type: 'element', prefix: 'nl', style: 'kebab-case' },
      ],
      '@angular-eslint/directive-selector': [
        'error',
        { type: 'attribute', prefix: 'nl', style: 'camelCase' },
      ],
      '@typescript-eslint/no-extraneous-class': 'off',
      ...restrict(ENGINE_INSIDE, CONTRACTS_INSIDE, SERVER),
    },
  },
  {
    files: ['web/src/app/**/*.html'],
    extends: [...angular.configs.templateRecommended, ...angular.configs.templateAccessibility],
  },
  {
    files: ['api/**/*.{ts,mjs}', 'worker/**/*.ts', 'tests/**/*.ts', 'fixtures/**/*.ts'],
    languageOptions: { globals: globals.node },
  },
  {
    files: ['api/**/*.ts', 'worker/**/*.ts'],
    rules: restrict(ENGINE_INSIDE, CONTRACTS_INSIDE, WEB),
  },
  {
    files: ['shared/engine/**/*.ts'],
    ignores: [
      'shared/engine/**/*.spec.ts',
      'shared/engine/{testing,bench,cli}/**',
      'shared/engine/{rules,language}/write-reference.ts',
    ],
    rules: {
      ...restrict(NODE_BUILTINS, {
        regex: '^[a-z#@]',
        message: 'The engine has no dependency: relative imports only.',
      }),
      'no-restricted-globals': ['error', 'console', 'Date', 'setTimeout', 'process', 'Intl'],
      'no-restricted-properties': ['error', { object: 'Math', property: 'random' }],
    },
  },
  {
    files: ['shared/contracts/**/*.ts'],
    ignores: ['shared/contracts/**/*.spec.ts'],
    rules: restrict(NODE_BUILTINS, WEB, SERVER),
  },
  {
    files: ['**/*.js', '**/*.mjs'],
    languageOptions: { globals: globals.node },
  },
  prettier,
);
