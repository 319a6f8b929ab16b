/**
 * Mutation tests of the engine, one folder at a time: `npm run mutation -- calc/uplift`.
 *
 * Not part of CI: a folder takes minutes. What was measured is kept in docs/mutation.json.
 *
 * @type {import('@stryker-mutator/api/core').PartialStrykerOptions}
 */
export default {
  // All tests in one process: a mutant costs milliseconds where a fresh worker costs seconds.
  testRunner: 'in-process',
  plugins: ['./server/cli/mutation/in-process-runner.mjs'],
  coverageAnalysis: 'perTest',
  // A message or a label is no engineering: it has tests of its own.
  mutator: { excludedMutations: ['StringLiteral'] },
  ignoreStatic: true,
  reporters: ['progress-append-only', 'clear-text', 'json'],
  clearTextReporter: { logTests: false, allowColor: false },
  concurrency: 1,
  // A machine that has other work must not count as a mutant that hangs.
  timeoutMS: 30_000,
  timeoutFactor: 4,
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
    'server/modules',
    '.stryker-bundle',
  ],
  thresholds: { high: 95, low: 85, break: 85 },
}
