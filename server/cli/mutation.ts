import { spawnSync } from 'node:child_process'
import { existsSync, mkdirSync, readFileSync, rmSync, writeFileSync } from 'node:fs'
import { format } from 'prettier'
import {
  folderResult,
  withoutSurvivors,
  type MutationReport,
  type MutationResults,
} from './mutation/folder-result'

const RESULTS = 'docs/mutation.json'
const CACHE = 'node_modules/.cache/mutation'
const REPORT = 'reports/mutation/mutation.json'

/** A pattern of tests, where time is short. */
const TESTS = process.env.MUTATION_TESTS

/**
 * Runs the mutants of one folder below shared/, without those below it, and keeps the figures; only what changed, and what
 * survived the last time, runs again.
 */
async function measure(folder: string): Promise<void> {
  if (!existsSync(`shared/${folder}`)) throw new Error(`shared/${folder} is not there`)
  mkdirSync(CACHE, { recursive: true })
  const kept = `${CACHE}/${folder.replaceAll('/', '-')}.json`
  const options = ['--mutate', `shared/${folder}/*.ts`, '--incremental', '--incrementalFile', kept]
  if (existsSync(kept)) {
    const report = JSON.parse(readFileSync(kept, 'utf8')) as MutationReport
    writeFileSync(kept, JSON.stringify(withoutSurvivors(report)))
  }
  // A run that is broken off leaves no report: nothing is kept then.
  rmSync(REPORT, { force: true })
  spawnSync('npx', ['stryker', 'run', ...options], { stdio: 'inherit' })
  const report = JSON.parse(readFileSync(REPORT, 'utf8')) as MutationReport
  const results = JSON.parse(readFileSync(RESULTS, 'utf8')) as MutationResults
  const measured = new Date().toISOString().slice(0, 10)
  const before = results.folders[folder]
  const result = folderResult(report, { folder, measured, before, tests: TESTS })
  const folders = Object.entries({ ...results.folders, [folder]: result })
  const sorted = Object.fromEntries(folders.sort(([a], [b]) => a.localeCompare(b)))
  const text = JSON.stringify({ ...results, folders: sorted })
  writeFileSync(RESULTS, await format(text, { parser: 'json', printWidth: 100 }))
}

const folders = process.argv.slice(2)
if (folders.length === 0) {
  process.stderr.write('Name one folder or more below shared/: npm run mutation -- calc/uplift\n')
  process.exitCode = 2
}
for (const folder of folders) await measure(folder)
