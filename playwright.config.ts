import { execFileSync } from 'node:child_process'
import { mkdtempSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { defineConfig } from '@playwright/test'

const PORT = Number(process.env.E2E_PORT ?? 3210)

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

/** A database for this run alone. Workers read this file again and must not make another. */
process.env.E2E_DATABASE ??= join(mkdtempSync(join(tmpdir(), 'toehold-e2e-')), 'e2e.sqlite')

export default defineConfig({
  testDir: 'tests/e2e',
  // Pictures for the documents: `PICTURES=1 npx playwright test pictures`.
  testIgnore: process.env.PICTURES ? [] : ['pictures.spec.ts'],
  timeout: 60_000,
  // One worker: the test of speed must not share its two cores with another browser.
  workers: 1,
  fullyParallel: false,
  reporter: [['list']],
  use: {
    baseURL: `http://localhost:${PORT}`,
    viewport: { width: 1440, height: 900 },
    launchOptions: { executablePath: chromium, args: QUIET },
    // A trace takes a snapshot at every step: TRACE=1 where a failure must be looked into.
    trace: process.env.TRACE ? 'retain-on-failure' : 'off',
  },
  webServer: {
    // Serves what `npm run build` made.
    command: 'node --import tsx server/main.ts',
    url: `http://localhost:${PORT}/api/health`,
    env: { PORT: String(PORT), DATABASE_FILE: process.env.E2E_DATABASE, NODE_ENV: 'test' },
    reuseExistingServer: false,
    timeout: 30_000,
  },
})
