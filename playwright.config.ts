import { execFileSync } from 'node:child_process'
import { mkdtempSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { defineConfig } from '@playwright/test'

/** The port of the first worker's server; those of the others follow. */
const PORT = Number(process.env.E2E_PORT ?? 3210)

/** One for each of the two cores; each has a server and a database of its own. */
const WORKERS = 2

/** Where the server of a worker answers. */
const addressOf = (worker: number) => `http://localhost:${PORT + worker}`

/** Every worker reads this file again, and knows its number. */
const OWN = Number(process.env.TEST_PARALLEL_INDEX ?? 0)

/** The browser of the system; Playwright's own is not downloaded. */
const chromium = execFileSync('which', ['chromium'], { encoding: 'utf8' }).trim()

/** Nothing but the page under test: no calls home, no first-run pages. */
const QUIET = [
  '--no-sandbox',
  '--disable-gpu',
  '--disable-quic',
  '--no-first-run',
  '--disable-background-networking',
  '--disable-component-update',
  '--disable-sync',
]

/** Databases for this run alone. Workers read this file again and must not make others. */
process.env.E2E_FOLDER ??= mkdtempSync(join(tmpdir(), 'toehold-e2e-'))

/** Serves what `npm run build` made. */
const serverOf = (worker: number) => ({
  command: 'node --import tsx server/main.ts',
  url: `${addressOf(worker)}/api/health`,
  env: {
    PORT: String(PORT + worker),
    DATABASE_FILE: join(process.env.E2E_FOLDER!, `e2e-${worker}.sqlite`),
    NODE_ENV: 'test',
  },
  reuseExistingServer: false,
  timeout: 60_000,
})

const SPEED = 'speed.spec.ts'

export default defineConfig({
  testDir: 'tests/e2e',
  // Pictures for the documents: `PICTURES=1 npx playwright test pictures`.
  timeout: 120_000,
  // On a machine that others use at the same time a test may come too late; it is named as flaky.
  retries: 1,
  // Two browsers and two servers share the cores.
  expect: { timeout: 15_000 },
  workers: WORKERS,
  fullyParallel: false,
  projects: [
    { name: 'product', testIgnore: process.env.PICTURES ? [SPEED] : [SPEED, 'pictures.spec.ts'] },
    // Must not share its two cores with another browser.
    { name: 'speed', testMatch: SPEED, dependencies: process.env.SPEED_GATE ? [] : ['product'] },
  ],
  reporter: [['list']],
  use: {
    baseURL: addressOf(OWN),
    viewport: { width: 1440, height: 900 },
    launchOptions: { executablePath: chromium, args: QUIET },
    // A trace takes a snapshot at every step: TRACE=1 where a failure must be looked into.
    trace: process.env.TRACE ? 'retain-on-failure' : 'off',
  },
  webServer: Array.from({ length: WORKERS }, (_, worker) => serverOf(worker)),
})
