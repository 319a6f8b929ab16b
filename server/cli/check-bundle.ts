import { readFileSync } from 'node:fs'
import { fileURLToPath } from 'node:url'
import { gzipSync } from 'node:zlib'
import {
  entryOf,
  firstLoad,
  keptOutModules,
  type Manifest,
  type Modules,
  namedByPage,
} from './bundle/first-load'

/** Script and style of `/`, gzipped; 1 kB is 1000 bytes. */
const BUDGET = 220_000

const PAGE = 'index.html'
/** The view of the place `/`. */
const VIEW = 'src/views/QuickCheckView.vue'

const inDist = (path: string) => fileURLToPath(new URL(`../../dist/${path}`, import.meta.url))

function readJson<T>(path: string): T {
  return JSON.parse(readFileSync(inDist(path), 'utf8')) as T
}

function kilobytes(bytes: number): string {
  return `${(bytes / 1000).toFixed(1).padStart(7)} kB`
}

function checkBundle(): boolean {
  const manifest = readJson<Manifest>('.vite/manifest.json')
  const modules = readJson<Modules>('.vite/modules.json')
  const imported = firstLoad(manifest, [PAGE, entryOf(VIEW, manifest, modules)])
  const files = [...new Set([...imported, ...namedByPage(readFileSync(inDist(PAGE), 'utf8'))])]
  const sizes = files.map((file) => ({ file, size: gzipSync(readFileSync(inDist(file))).length }))
  const sum = sizes.reduce((total, { size }) => total + size, 0)
  const keptOut = keptOutModules(modules, files)

  const lines = sizes
    .sort((one, other) => other.size - one.size)
    .map(({ file, size }) => `${kilobytes(size)}  ${file}`)
  lines.push(`${kilobytes(sum)}  script and style of /, gzipped; ${BUDGET / 1000} kB allowed`)
  for (const id of keptOut) lines.push(`not allowed in the first page: ${id}`)
  process.stdout.write(`${lines.join('\n')}\n`)
  return sum <= BUDGET && keptOut.length === 0
}

if (!checkBundle()) process.exitCode = 1
