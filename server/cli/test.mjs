// `npm test`: every check and every test. The last line, alone, is `N passed, N failed`.
// Plain Node: on a fresh clone nothing is installed yet.
import { mkdtempSync, readFileSync, rmSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { spawnSync } from 'node:child_process'
import { assertNode, installIfNeeded, run } from './preparation.mjs'

const MINUTE = 60_000

/**
 * Checks that have no tests of their own: one that fails counts as one failure. The two rows run
 * beside each other.
 */
const GATES = [['check:types'], ['check:lint', 'check:format', 'build']]

const total = { passed: 0, failed: 0 }

function heading(text) {
  process.stdout.write(`\n── ${text}\n`)
}

function countFailure(what) {
  process.stdout.write(`FAILED: ${what}\n`)
  total.failed += 1
}

/** Runs one check; what it printed is shown in one piece at its end. */
async function gate(script) {
  const printed = []
  const status = await run('npm', ['run', '--silent', script], {
    env: { NODE_ENV: 'production' },
    timeout: 6 * MINUTE,
    print: (chunk) => printed.push(chunk),
  })
  heading(script)
  process.stdout.write(Buffer.concat(printed))
  if (status !== 0) countFailure(script)
  return status === 0
}

/** Runs checks one after the other; tells whether the last one passed. */
async function gatesInTurn(scripts) {
  let isPassed = false
  for (const script of scripts) isPassed = await gate(script)
  return isPassed
}

/** Runs a test runner that writes a report; a runner that fails without a failed test is one too. */
async function suite({ name, words, report, env, count }) {
  heading(name)
  const status = await run(process.execPath, words, { env, timeout: 13 * MINUTE })
  const counted = readCount(report, count)
  total.passed += counted.passed
  total.failed += counted.failed
  if (counted.passed + counted.failed === 0) countFailure(`${name}: no test ran`)
  else if (status !== 0 && counted.failed === 0) countFailure(`${name}: ended with ${status}`)
}

function readCount(report, count) {
  try {
    return count(JSON.parse(readFileSync(report, 'utf8')))
  } catch {
    return { passed: 0, failed: 0 }
  }
}

const unitTests = (folder) => {
  const report = join(folder, 'unit.json')
  return {
    name: 'vitest',
    report,
    env: { NODE_ENV: 'test' },
    words: [
      'node_modules/vitest/vitest.mjs',
      'run',
      '--reporter=default',
      '--reporter=json',
      `--outputFile.json=${report}`,
    ],
    // A file that does not even load has no tests; it is a failed suite with none in it.
    count: ({ numPassedTests, numFailedTests, testResults }) => ({
      passed: numPassedTests,
      failed:
        numFailedTests +
        testResults.filter((file) => file.status === 'failed' && file.assertionResults.length === 0)
          .length,
    }),
  }
}

const browserTests = (folder) => {
  const report = join(folder, 'browser.json')
  return {
    name: 'playwright',
    report,
    env: { NODE_ENV: 'development', PLAYWRIGHT_JSON_OUTPUT_FILE: report },
    words: ['node_modules/@playwright/test/cli.js', 'test', '--reporter=list,json'],
    count: ({ stats, errors }) => ({
      passed: stats.expected + stats.flaky,
      failed: stats.unexpected + (stats.unexpected === 0 ? errors.length : 0),
    }),
  }
}

function hasChromium() {
  return spawnSync('chromium', ['--version'], { stdio: 'ignore' }).status === 0
}

async function aptInstall(name) {
  const asRoot = process.getuid?.() === 0 ? [] : ['sudo', '-n']
  const apt = async (...words) => {
    const [program, ...rest] = [...asRoot, 'apt-get', ...words]
    return run(program, rest, { env: { DEBIAN_FRONTEND: 'noninteractive' }, timeout: 5 * MINUTE })
  }
  await apt('update', '-qq')
  await apt('install', '-y', '-qq', '--no-install-recommends', name)
}

/** The browser tests drive Debian's own browser. */
async function installChromium() {
  if (hasChromium()) return true
  heading('chromium is missing: installing it')
  await aptInstall('chromium')
  if (hasChromium()) return true
  countFailure('chromium could not be installed; install it with: apt-get install chromium')
  return false
}

function hasPoppler() {
  return spawnSync('pdftotext', ['-v'], { stdio: 'ignore' }).status === 0
}

/** The tests of the documents read them with poppler, as a reader would. */
async function installPoppler() {
  if (hasPoppler()) return
  heading('poppler-utils is missing: installing it')
  await aptInstall('poppler-utils')
  if (!hasPoppler()) countFailure('poppler-utils could not be installed; install it with apt-get')
}

function finish() {
  const { passed, failed } = total
  process.stdout.write(`\n${passed} passed, ${failed} failed\n`)
  process.exitCode = failed > 0 || passed === 0 ? 1 : 0
}

async function runAll(folder) {
  if ((await installIfNeeded()) !== 0) {
    countFailure('the dependencies could not be installed')
    return
  }
  const passed = await Promise.all(GATES.map(gatesInTurn))
  const isBuilt = passed.at(-1)
  await installPoppler()
  await suite(unitTests(folder))
  if (isBuilt && (await installChromium())) await suite(browserTests(folder))
}

assertNode()
const folder = mkdtempSync(join(tmpdir(), 'toehold-test-'))
try {
  await runAll(folder)
} finally {
  rmSync(folder, { recursive: true, force: true })
}
finish()
