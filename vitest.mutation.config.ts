import { fileURLToPath } from 'node:url'
import { defineConfig } from 'vitest/config'

const folder = (path: string) => fileURLToPath(new URL(path, import.meta.url))

/** The tests that may kill a mutant of the engine: pure ones, without browser, server or drawing. */
export default defineConfig({
  resolve: { alias: { '@shared': folder('./shared'), '@': folder('./src') } },
  test: {
    include: ['tests/shared/**/*.test.ts'],
    // Left out: what is no engineering, and long random walks that would cost every mutant seconds.
    // What only they would notice counts as survived.
    exclude: [
      'tests/shared/{drawing,schemas,derivation,sheet,method}/**',
      'tests/shared/checks/section-properties.test.ts',
    ],
    environment: 'node',
    // Mutants share the machine; what hangs is ended by Stryker.
    testTimeout: 60_000,
    setupFiles: ['tests/support/fixed-seed.ts'],
  },
})
