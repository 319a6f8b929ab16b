// `npm start`: from a fresh clone to the running product. Plain Node: nothing is installed yet.
import { spawn } from 'node:child_process'
import { existsSync } from 'node:fs'
import { createServer } from 'node:net'
import { join } from 'node:path'
import { assertNode, buildIfNeeded, installIfNeeded, ROOT } from './preparation.mjs'

function fail(reason) {
  process.stderr.write(`${reason}\n`)
  process.exit(1)
}

/** Asked first, so that nobody waits for an installation to learn that the port is taken. */
function assertPortIsFree(port) {
  return new Promise((resolve) => {
    const probe = createServer()
    probe.once('error', (error) => {
      if (error.code !== 'EADDRINUSE') return resolve()
      const other = `PORT=${Number(port) + 1} npm start`
      fail(`PORT: ${port} is in use; stop what uses it or choose another: ${other}`)
    })
    probe.listen({ port: Number(port) }, () => probe.close(resolve))
  })
}

/** Migrates, writes the reference data, seeds the demo once, and listens. */
function serve() {
  const server = spawn(process.execPath, ['--import', 'tsx', 'server/main.ts'], {
    cwd: ROOT,
    env: { ...process.env, NODE_ENV: 'development' },
    stdio: 'inherit',
  })
  // A terminal sends Ctrl-C to both; the server ends itself, then this process follows.
  for (const signal of ['SIGINT', 'SIGTERM', 'SIGHUP'])
    process.on(signal, () => server.kill(signal))
  server.on('exit', (status) => process.exit(status ?? 1))
}

assertNode()
process.chdir(ROOT)
if (existsSync(join(ROOT, '.env'))) process.loadEnvFile(join(ROOT, '.env'))
// A port that is no number is refused by the server, in its own words.
const port = process.env.PORT || '3000'
if (/^\d+$/.test(port) && Number(port) <= 65_535) await assertPortIsFree(port)
if ((await installIfNeeded()) !== 0) fail('The dependencies could not be installed; see above.')
if ((await buildIfNeeded()) !== 0) fail('The page could not be built; see above.')
serve()
