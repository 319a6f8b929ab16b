import { readdirSync } from 'node:fs'
import { join, resolve } from 'node:path'
import { pathToFileURL } from 'node:url'
import { declareClassPlugin, PluginKind } from '@stryker-mutator/api/plugin'
import { determineHitLimitReached, toMutantRunResult } from '@stryker-mutator/api/test-runner'
import { build } from 'esbuild'

const WORLD = '__stryker__'
const TESTS = 'tests/shared'
const SETUP = './tests/support/fixed-seed.ts'
/** What is no engineering, and long random walks: what only they would notice counts as survived. */
const LEFT_OUT =
  /^tests\/shared\/(access|deployment|derivation|drawing|forecast|method|schemas|sheet)\/|section-properties/

/**
 * Runs the pure tests of the engine in one process: they are bundled and loaded once, and a mutant is
 * switched on while its tests run. A mutant costs milliseconds where a fresh worker costs seconds.
 *
 * What a test file computes while it is loaded is computed without the mutant; a mutant that only this
 * would notice counts as survived.
 */
class InProcessRunner {
  capabilities() {
    return { reloadEnvironment: false }
  }

  async init() {
    // Instrumented files keep hold of this object: it must be there before they are loaded.
    globalThis[WORLD] = { mutantCoverage: { static: {}, perTest: {} } }
    this.tests = await loadTests()
  }

  async dryRun() {
    const tests = await this.#run(this.tests, { covers: true, bails: false })
    return { status: 'complete', tests, mutantCoverage: globalThis[WORLD].mutantCoverage }
  }

  async mutantRun({ activeMutant, testFilter, hitLimit }) {
    const world = globalThis[WORLD]
    const chosen = testFilter ? this.tests.filter(({ id }) => testFilter.includes(id)) : this.tests
    world.activeMutant = activeMutant.id
    world.hitCount = hitLimit === undefined ? undefined : 0
    world.hitLimit = hitLimit
    const tests = await this.#run(chosen, { covers: false, bails: true })
    world.activeMutant = undefined
    const late = determineHitLimitReached(world.hitCount, hitLimit)
    return toMutantRunResult(late ?? { status: 'complete', tests })
  }

  async #run(tests, { covers, bails }) {
    const results = []
    for (const { id, name, run } of tests) {
      if (covers) globalThis[WORLD].currentTestId = id
      const started = performance.now()
      const failureMessage = await run().then(() => null, String)
      const timeSpentMs = performance.now() - started
      results.push(
        failureMessage === null
          ? { id, name, timeSpentMs, status: 0 }
          : { id, name, timeSpentMs, status: 1, failureMessage },
      )
      if (covers) globalThis[WORLD].currentTestId = undefined
      if (bails && failureMessage !== null) break
    }
    return results
  }
}

/** All tests of the engine, as one bundle; `vitest` is replaced by what collects them. */
async function loadTests() {
  // MUTATION_TESTS: a pattern of paths, where time is short; what is not asked kills nothing.
  const chosen = new RegExp(process.env.MUTATION_TESTS ?? '')
  const files = readdirSync(TESTS, { recursive: true })
    .map((file) => join(TESTS, file).replaceAll('\\', '/'))
    .filter((file) => file.endsWith('.test.ts') && !LEFT_OUT.test(file) && chosen.test(file))
    .sort()
  const inFile = (file) => `startFile(${JSON.stringify(file)}); await import('./${file}')`
  const contents = [
    `import '${SETUP}'`,
    `import { collected, startFile } from 'vitest'`,
    ...files.map(inFile),
    'export const tests = collected',
  ].join('\n')
  const outfile = resolve('.stryker-bundle', `tests-${process.pid}.mjs`)
  await build({
    stdin: { contents, resolveDir: process.cwd(), loader: 'ts' },
    outfile,
    bundle: true,
    platform: 'node',
    format: 'esm',
    target: 'node20',
    packages: 'external',
    alias: { vitest: resolve('server/cli/mutation/collect-tests.mjs') },
    logLevel: 'error',
  })
  const { tests } = await import(pathToFileURL(outfile).href)
  return tests
}

export const strykerPlugins = [
  declareClassPlugin(PluginKind.TestRunner, 'in-process', InProcessRunner),
]
