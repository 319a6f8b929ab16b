// What a thread runs first. It has no loader for TypeScript, whatever started the process (server, test
// or bundle), and loading hundreds of files one by one takes seconds: so its program is made one file.
import { mkdtempSync, readFileSync, rmSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { fileURLToPath, pathToFileURL } from 'node:url'
import { workerData } from 'node:worker_threads'
import { build, stop } from 'esbuild'

/** Packages with machine code are loaded from where they are. */
const NATIVE = /^@myriaddreamin\/typst-ts-node-compiler$/

const program = {
  name: 'toehold:program-of-a-thread',
  setup(bundle) {
    bundle.onResolve({ filter: NATIVE }, ({ path }) => ({
      path: import.meta.resolve(path),
      external: true,
    }))
    // Programs find their folders from where they are.
    bundle.onLoad({ filter: /[\\/]server[\\/].*\.ts$/ }, ({ path }) => ({
      loader: 'ts',
      contents: readFileSync(path, 'utf8').replaceAll(
        'import.meta.url',
        JSON.stringify(pathToFileURL(path).href),
      ),
    }))
  },
}

const folder = mkdtempSync(join(tmpdir(), 'toehold-thread-'))
try {
  const outfile = join(folder, 'program.mjs')
  const entryPoints = [fileURLToPath(workerData.program)]
  const kind = { bundle: true, format: 'esm', platform: 'node', target: 'node20' }
  await build({ ...kind, entryPoints, outfile, plugins: [program], logLevel: 'silent' })
  await stop()
  await import(pathToFileURL(outfile).href)
} finally {
  rmSync(folder, { recursive: true, force: true })
}
