// Plain Node without dependencies: this runs before anything is installed.
import { spawn } from 'node:child_process'
import { createHash } from 'node:crypto'
import { existsSync, readdirSync, readFileSync, statSync, writeFileSync } from 'node:fs'
import { createRequire } from 'node:module'
import { join } from 'node:path'
import { fileURLToPath } from 'node:url'

export const ROOT = fileURLToPath(new URL('../..', import.meta.url))

/** What the built page is made from. */
const PAGE_SOURCES = [
  'index.html',
  'vite.config.ts',
  'package-lock.json',
  'src',
  'shared',
  'public',
]

/** Dotfiles are not served. */
const BUILD_MARK = join(ROOT, 'dist', '.sources')

const inRoot = (path) => join(ROOT, path)

/**
 * Runs a program to its end and gives its exit status; what it prints is shown as it comes, or given
 * to `print` where several run at once. With a time limit it gets a process group of its own, so that
 * nothing it started outlives it.
 */
export function run(program, words, { env = {}, timeout, print } = {}) {
  return new Promise((resolve) => {
    const out = print ? 'pipe' : 'inherit'
    const child = spawn(program, words, {
      cwd: ROOT,
      env: { ...process.env, ...env },
      stdio: ['ignore', out, out],
      detached: timeout !== undefined,
    })
    for (const stream of print ? [child.stdout, child.stderr] : []) stream.on('data', print)
    const release = timeout === undefined ? () => undefined : endGroupInTime(child, timeout)
    child.on('error', (error) => {
      process.stderr.write(`${program}: ${error.message}\n`)
      release()
      resolve(1)
    })
    child.on('close', (status) => {
      release()
      resolve(status ?? 1)
    })
  })
}

function endGroupInTime(child, timeout) {
  const end = () => child.pid && process.kill(-child.pid, 'SIGKILL')
  const interrupt = () => {
    end()
    process.exit(130)
  }
  const timer = setTimeout(() => {
    process.stderr.write(`Stopped after ${timeout / 60_000} minutes.\n`)
    end()
  }, timeout)
  process.once('SIGINT', interrupt).once('SIGTERM', interrupt)
  return () => {
    clearTimeout(timer)
    process.off('SIGINT', interrupt).off('SIGTERM', interrupt)
  }
}

/** Refuses an older Node in words, before anything else fails without them. */
export function assertNode() {
  const [major, minor] = process.versions.node.split('.').map(Number)
  if (major > 20 || (major === 20 && minor >= 19)) return
  process.stderr.write(`Toehold needs Node 20.19 or newer; this is ${process.version}.\n`)
  process.exit(1)
}

/** Installs what package-lock.json names, unless exactly that is there. Gives the exit status. */
export async function installIfNeeded() {
  if (isInstalled()) return 0
  process.stdout.write('Installing the dependencies; the first time this takes some minutes.\n')
  // Development dependencies build and test the page, so NODE_ENV must not leave them out.
  return run('npm', ['ci', '--include=dev', '--no-audit', '--no-fund'])
}

function isInstalled() {
  if (!existsSync(inRoot('node_modules/.package-lock.json'))) return false
  const wanted = readPackages('package-lock.json')
  // npm writes this file last: an installation that was interrupted has none.
  const present = readPackages('node_modules/.package-lock.json')
  const isSame = Object.entries(wanted).every(
    ([path, { version, optional }]) =>
      path === '' || present[path]?.version === version || (optional && !present[path]),
  )
  return isSame && isDatabaseDriverUsable()
}

function readPackages(file) {
  return JSON.parse(readFileSync(inRoot(file), 'utf8')).packages
}

/** It is compiled for one version of Node; after a change of Node it must be installed again. */
function isDatabaseDriverUsable() {
  try {
    const Database = createRequire(inRoot('package.json'))('better-sqlite3')
    new Database(':memory:').close()
    return true
  } catch {
    return false
  }
}

/** Builds the page into dist/, unless it was built from exactly these sources. */
export async function buildIfNeeded() {
  const fingerprint = fingerprintSources()
  if (existsSync(BUILD_MARK) && readFileSync(BUILD_MARK, 'utf8') === fingerprint) return 0
  process.stdout.write('Building the page.\n')
  const words = ['node_modules/vite/bin/vite.js', 'build', '--logLevel', 'warn']
  const status = await run(process.execPath, words, { env: { NODE_ENV: 'production' } })
  if (status === 0) writeFileSync(BUILD_MARK, fingerprint)
  return status
}

function fingerprintSources() {
  const hash = createHash('sha256')
  for (const file of PAGE_SOURCES.flatMap(filesUnder)) {
    hash
      .update(file)
      .update('\0')
      .update(readFileSync(inRoot(file)))
      .update('\0')
  }
  return hash.digest('hex')
}

function filesUnder(path) {
  if (!existsSync(inRoot(path))) return []
  if (statSync(inRoot(path)).isFile()) return [path]
  return readdirSync(inRoot(path), { recursive: true, withFileTypes: true })
    .filter((entry) => entry.isFile())
    .map((entry) => join(entry.parentPath, entry.name).slice(ROOT.length))
    .sort()
}
