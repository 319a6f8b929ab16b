import { existsSync, readFileSync } from 'node:fs'
import type { Server } from 'node:http'
import { fileURLToPath } from 'node:url'
import { createApp } from './app'
import { openDatabase } from './db/client'
import { prepareDatabase } from './db/prepare-database'
import { type Env, EnvironmentError, readEnv } from './env'
import { createLogger } from './logger'

/** How long an answer under way may take once the server was told to stop [ms]. */
const LAST_ANSWER = 5000

const inProject = (path: string) => fileURLToPath(new URL(`../${path}`, import.meta.url))

function readEnvironment(): Env {
  const file = inProject('.env')
  if (existsSync(file)) process.loadEnvFile(file)
  try {
    return readEnv(process.env)
  } catch (error) {
    if (error instanceof EnvironmentError) refuseToStart(error.message)
    throw error
  }
}

function refuseToStart(reason: string): never {
  process.stderr.write(`Toehold does not start.\n${reason}\n`)
  process.exit(1)
}

function readVersion(): string {
  const { version } = JSON.parse(readFileSync(inProject('package.json'), 'utf8')) as {
    version: string
  }
  return version
}

function start(): void {
  const env = readEnvironment()
  const logger = createLogger(env.logLevel)
  const { db, close } = openDatabase(env.databaseFile)
  // People and projects of the demonstration are seeded by the modules that will own them.
  prepareDatabase(db, { mode: env.mode, demoSeeds: [] })
  const siteFolder = inProject('dist')
  const app = createApp({ db, env, logger, version: readVersion(), siteFolder })

  const server = app.listen({ port: env.port, host: env.host }, (error?: Error) => {
    if (error) refuseToStart(describeListenError(error, env.port))
    process.stdout.write(`Toehold (${env.mode}) is at ${addressOf(server, env)}\n`)
  })
  stopOnSignal(server, close)
}

function describeListenError(error: Error, port: number): string {
  const isTaken = 'code' in error && error.code === 'EADDRINUSE'
  return isTaken
    ? `PORT: ${port} is in use; stop what uses it or choose another, for example PORT=${port + 1}`
    : error.message
}

function addressOf(server: Server, env: Env): string {
  const bound = server.address()
  const port = typeof bound === 'object' && bound ? bound.port : env.port
  return env.mode === 'production' ? `${env.appUrl} (port ${port})` : `http://localhost:${port}`
}

/** Finishes what is under way, then closes the database. Ctrl-C arrives twice through `npm start`. */
function stopOnSignal(server: Server, closeDatabase: () => void): void {
  let isStopping = false
  const stop = () => {
    if (isStopping) return
    isStopping = true
    server.close(() => {
      closeDatabase()
      process.exit(0)
    })
    server.closeIdleConnections()
    setTimeout(() => {
      server.closeAllConnections()
    }, LAST_ANSWER).unref()
  }
  process.on('SIGINT', stop)
  process.on('SIGTERM', stop)
}

start()
