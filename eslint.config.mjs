import js from '@eslint/js'
import prettier from 'eslint-config-prettier'
import { createTypeScriptImportResolver } from 'eslint-import-resolver-typescript'
import importX from 'eslint-plugin-import-x'
import vue from 'eslint-plugin-vue'
import tseslint from 'typescript-eslint'

/** src → shared ← server; nothing else. Messages say why, so that nobody has to look it up. */
const oneWay = {
  zones: [
    { target: './shared', from: './src', message: 'shared/ knows neither src/ nor server/' },
    { target: './shared', from: './server', message: 'shared/ knows neither src/ nor server/' },
    { target: './src', from: './server', message: 'src/ meets server/ only in shared/schemas' },
    { target: './server', from: './src', message: 'server/ meets src/ only in shared/schemas' },
    {
      target: './shared/calc',
      from: './shared/checks',
      message: 'calc/ gives quantities, checks/ compare them',
    },
    { target: './shared/calc', from: './shared/drawing', message: 'calc/ does not draw' },
    { target: './shared/checks', from: './shared/drawing', message: 'checks/ do not draw' },
    { target: './src', from: './tests', message: 'no test code in the product' },
    { target: './server', from: './tests', message: 'no test code in the product' },
    { target: './shared', from: './tests', message: 'no test code in the product' },
  ],
}

const noLucia = {
  regex: '^(lucia|@lucia-auth/.*)$',
  message: 'only server/auth/ knows what sessions are made of',
}
const noDrizzle = {
  regex: '^drizzle-orm(/|$)',
  message: 'only *.queries.ts and server/db/ know the database',
}

export default tseslint.config(
  {
    ignores: [
      'dist/',
      'data/',
      'coverage/',
      'drizzle/',
      'test-results/',
      'playwright-report/',
      '.stryker-tmp/',
      'reports/',
    ],
  },
  js.configs.recommended,
  ...tseslint.configs.strict,
  ...tseslint.configs.stylistic,
  ...vue.configs['flat/recommended'],
  {
    files: ['**/*.vue'],
    languageOptions: { parserOptions: { parser: tseslint.parser } },
  },
  {
    plugins: { 'import-x': importX },
    settings: {
      'import-x/resolver-next': [
        createTypeScriptImportResolver({
          project: ['src/tsconfig.json', 'tests/tsconfig.json'],
          noWarnOnMultipleProjects: true,
        }),
      ],
    },
    rules: {
      'import-x/no-restricted-paths': ['error', oneWay],
      'import-x/no-cycle': 'error',
      'import-x/no-default-export': 'error',
      'import-x/no-mutable-exports': 'error',
      '@typescript-eslint/no-non-null-assertion': 'off',
      '@typescript-eslint/consistent-type-imports': 'error',
      '@typescript-eslint/no-unused-vars': [
        'error',
        { argsIgnorePattern: '^_', varsIgnorePattern: '^_' },
      ],
      eqeqeq: 'error',
      'no-undef': 'off',
      'max-lines': ['error', { max: 250, skipBlankLines: true, skipComments: true }],
      'max-params': ['error', { max: 4 }],
      'max-lines-per-function': ['error', { max: 50, skipBlankLines: true, skipComments: true }],
    },
  },
  {
    files: ['shared/**/*.ts'],
    rules: {
      'no-restricted-imports': [
        'error',
        { patterns: [{ regex: '^(?!zod$|\\.)', message: 'shared/ imports only zod and itself' }] },
      ],
      'no-restricted-globals': ['error', 'process', 'console', 'Date', 'setTimeout', 'fetch'],
      'no-restricted-properties': ['error', { object: 'Math', property: 'random' }],
    },
  },
  {
    files: ['shared/derivation/**/*.ts'],
    rules: {
      'no-restricted-imports': [
        'error',
        {
          patterns: [
            {
              regex: '^(?!zod$|mathjs$|\\.)',
              message: 'shared/derivation imports only zod, mathjs and shared/',
            },
          ],
        },
      ],
    },
  },
  {
    files: ['server/**/*.ts'],
    ignores: ['server/auth/**', 'server/db/**', 'server/**/*.queries.ts'],
    rules: { 'no-restricted-imports': ['error', { patterns: [noLucia, noDrizzle] }] },
  },
  {
    files: ['server/auth/**/*.ts'],
    ignores: ['server/**/*.queries.ts'],
    rules: { 'no-restricted-imports': ['error', { patterns: [noDrizzle] }] },
  },
  {
    files: ['server/db/**/*.ts', 'server/**/*.queries.ts', 'src/**/*.{ts,vue}', 'tests/**/*.ts'],
    ignores: ['server/auth/**'],
    rules: { 'no-restricted-imports': ['error', { patterns: [noLucia] }] },
  },
  {
    files: ['src/**/*.{ts,vue}'],
    ignores: ['src/api/**'],
    rules: {
      'no-restricted-globals': ['error', { name: 'fetch', message: 'only src/api/ calls fetch' }],
    },
  },
  {
    files: ['src/**/*.vue'],
    rules: {
      'vue/component-api-style': ['error', ['script-setup']],
      'vue/block-order': ['error', { order: ['script', 'template', 'style'] }],
      'vue/define-emits-declaration': ['error', 'type-based'],
      'vue/define-props-declaration': ['error', 'type-based'],
      'vue/no-undef-components': ['error', { ignorePatterns: ['^Router(Link|View)$', '^El[A-Z]'] }],
      'max-lines-per-function': 'off',
    },
  },
  {
    files: ['tests/**'],
    rules: { 'max-lines-per-function': 'off', 'max-lines': 'off', 'max-params': 'off' },
  },
  {
    // A catalogue of texts is one long table.
    files: ['shared/texts/**'],
    rules: { 'max-lines': 'off' },
  },
  {
    files: ['*.config.{ts,mjs}', 'src/**/*.d.ts'],
    rules: { 'import-x/no-default-export': 'off' },
  },
  {
    files: ['**/*.vue'],
    rules: { 'import-x/no-default-export': 'off' },
  },
  prettier,
)
