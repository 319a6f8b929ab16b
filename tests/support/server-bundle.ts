import { mkdtempSync, mkdirSync, rmSync } from 'node:fs'
import { join } from 'node:path'
import { fileURLToPath, pathToFileURL } from 'node:url'
import { build, type Plugin } from 'vite'
import { afterAll } from 'vitest'

const ROOT = fileURLToPath(new URL('../..', import.meta.url))

/** Under node_modules, so that the packages of the project are found from there. */
const CACHE = join(ROOT, 'node_modules', '.cache', 'toehold-tests')

/** Programs find their folders from where they are: a bundle stands in for the files that it is made of. */
const whereTheyWere: Plugin = {
  name: 'toehold:where-they-were',
  transform(code, id) {
    if (!code.includes('import.meta.url')) return null
    return code.replaceAll('import.meta.url', JSON.stringify(pathToFileURL(id).href))
  },
}

const bundles = new Map<string, Promise<string>>()

/**
 * A program of the server as one file of JavaScript, made once in each test file that starts it:
 * translating three hundred files anew at every start takes longer than all else.
 *
 * Asked for at the top of a test file, whose end removes it.
 *
 * @param path From the root of the project, such as `server/main.ts`.
 */
export function serverBundle(path: string): Promise<string> {
  const made = bundles.get(path) ?? bundle(path)
  bundles.set(path, made)
  return made
}

async function bundle(path: string): Promise<string> {
  mkdirSync(CACHE, { recursive: true })
  const outDir = mkdtempSync(join(CACHE, 'bundle-'))
  afterAll(() => {
    rmSync(outDir, { recursive: true, force: true })
  })
  await build({
    root: ROOT,
    configFile: false,
    publicDir: false,
    logLevel: 'error',
    plugins: [whereTheyWere],
    build: {
      ssr: path,
      outDir,
      target: 'node20',
      rolldownOptions: { output: { entryFileNames: 'program.mjs' } },
    },
  })
  return join(outDir, 'program.mjs')
}
