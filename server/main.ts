import { existsSync, readFileSync } from 'node:fs'
import type { Server } from 'node:http'
import { fileURLToPath } from 'node:url'
import type { Logger } from 'pino'
import { createApp } from './app'
import { startHousekeeping } from './auth/housekeeping'
import { openDatabase } from './db/client'
import { type DemoSeed, seedSlowlyOnce } from './db/demo-seed'
import { prepareDatabase } from './db/prepare-database'
import { ferryQuaySeed } from './demo/ferry-quay'
import { ferryQuayOrdersSeed } from './demo/ferry-quay-orders'
import { ferryQuaySheetsSeed } from './demo/ferry-quay-sheets'
import { ferryQuayStoreSeed } from './demo/ferry-quay-store'
import { type Env, EnvironmentError, readEnv } from './env'
import { endEventStreams } from './http/event-stream'
import { createLogger } from './logger'
import { startMailWorker } from './mail/mail-worker'
import { createSmtpSender } from './mail/smtp-sender'
import { demoPeopleSeed, usableDemoAccounts } from './modules/accounts/demo-accounts.service'
import { sweepFiles } from './modules/files/files.service'
import { stopComposing, warmComposing } from './modules/sheets/composing'
import { firstAdministratorLink } from './modules/invitations/first-administrator.service'
import { createParts, type RouteParts } from './parts'

/** How long an answer under way may take once the server was told to stop [ms]. */
const LAST_ANSWER = 5000

/** Until the typesetter is loaded, so that whoever opens the first page does not wait for it [ms]. */
const WARM_AFTER = 10_000

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

async function start(): Promise<void> {
  const env = readEnvironment()
  const logger = createLogger(env.logLevel)
  const { db, close } = openDatabase(env.databaseFile)
  const parts = createParts(db, env)
  prepareDatabase(db, { mode: env.mode, demoSeeds: demoSeeds(parts) })
  if (env.mode === 'production') refuseDemoAccounts(parts, env)
  const version = readVersion()
  if (env.hasDemoSheets) {
    await seedSlowlyOnce(db, ferryQuaySheetsSeed({ ...parts, software: `Toehold ${version}` }))
    await seedSlowlyOnce(db, ferryQuayOrdersSeed(parts))
  }
  const app = createApp({ parts, env, logger, version, siteFolder: inProject('dist') })

  const server = app.listen({ port: env.port, host: env.host }, (error?: Error) => {
    if (error) refuseToStart(describeListenError(error, env.port))
    process.stdout.write(`Toehold (${env.mode}) is at ${addressOf(server, env)}\n`)
    printFirstAdministrator(parts)
  })
  const stopWorkers = startWorkers(parts, env, logger)
  stopOnSignal(server, async () => {
    await Promise.all([stopWorkers(), stopComposing()])
    close()
  })
}

/** In this order: projects name the people who made them. */
function demoSeeds({ passwords, now }: RouteParts): readonly DemoSeed[] {
  return [demoPeopleSeed(passwords), ferryQuaySeed(now), ferryQuayStoreSeed(now)]
}

/** Their password stands on the sign-in page of every demonstration. */
function refuseDemoAccounts({ db }: RouteParts, { databaseFile }: Env): void {
  const names = usableDemoAccounts(db)
  if (names.length === 0) return
  refuseToStart(
    `DATABASE_FILE: ${databaseFile} holds accounts of the demonstration, whose password everybody ` +
      `knows (${names.join(', ')}); production needs another file, or have them deactivated`,
  )
}

function printFirstAdministrator(parts: RouteParts): void {
  const link = firstAdministratorLink(parts)
  if (link === null) return
  process.stdout.write(`There is no administrator yet. Make the first account, once, at\n${link}\n`)
}

/** What runs beside the requests: mail on its way out, and forgetting what has expired. */
function startWorkers(parts: RouteParts, env: Env, logger: Logger): () => Promise<void> {
  const stopHousekeeping = startHousekeeping(parts, logger)
  sweepFiles(parts).catch((error: unknown) => {
    logger.error({ err: error }, 'files without a row were not swept')
  })
  setTimeout(() => {
    warmComposing().catch((error: unknown) => {
      logger.error({ err: error }, 'the typesetter did not start')
    })
  }, WARM_AFTER).unref()
  if (env.smtpUrl === undefined) return () => Promise.resolve(stopHousekeeping())
  const sender = createSmtpSender(env.smtpUrl, env.mailFrom)
  const mail = startMailWorker({ ...parts, sender, logger })
  return async () => {
    stopHousekeeping()
    const lastMail = mail.stop()
    sender.close()
    await lastMail
  }
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

/** Finishes what is under way, then closes. Ctrl-C arrives twice through `npm start`. */
function stopOnSignal(server: Server, closeAll: () => Promise<void>): void {
  let isStopping = false
  const stop = () => {
    if (isStopping) return
    isStopping = true
    server.close(() => {
      void closeAll().then(() => process.exit(0))
    })
    server.closeIdleConnections()
    endEventStreams()
    setTimeout(() => {
      server.closeAllConnections()
    }, LAST_ANSWER).unref()
    // A mail server that does not answer holds up nobody; its mail is tried again at the next start.
    setTimeout(() => process.exit(0), 2 * LAST_ANSWER).unref()
  }
  process.on('SIGINT', stop)
  process.on('SIGTERM', stop)
}

await start()
