/**
 * Mutation tests of the engine, one folder at a time: `npm run mutation -- calc/uplift`.
 *
 * Not part of CI: a folder takes minutes. What was measured is kept in docs/mutation.json.
 *
 * @type {import('@stryker-mutator/api/core').PartialStrykerOptions}
 */
export default {
  testRunner: 'vitest',
  plugins: ['@stryker-mutator/vitest-runner'],
  vitest: { configFile: 'vitest.mutation.config.ts' },
  coverageAnalysis: 'perTest',
  // A message or a label is no engineering: it has tests of its own.
  mutator: { excludedMutations: ['StringLiteral'] },
  ignoreStatic: true,
  reporters: ['progress-append-only', 'clear-text', 'json'],
  clearTextReporter: { logTests: false, allowColor: false },
  concurrency: 1,
  timeoutMS: 10_000,
  disableTypeChecks: false,
  tempDirName: '.stryker-tmp',
  ignorePatterns: [
    'data',
    'dist',
    'coverage',
    'docs',
    'drizzle',
    'test-results',
    'public',
    'tests/e2e',
    'tests/server',
    'server',
  ],
  thresholds: { high: 95, low: 85, break: 85 },
}
