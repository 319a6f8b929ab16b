import { pino } from 'pino'
import { onTestFinished } from 'vitest'
import { createApp } from '../../server/app'
import { IN_MEMORY, openDatabase } from '../../server/db/client'
import { type Preparation, prepareDatabase } from '../../server/db/prepare-database'
import { readEnv } from '../../server/env'
import { createPasswords } from '../../server/auth/passwords'
import { createParts } from '../../server/parts'

export const SECRET = 'a-secret-of-the-tests-that-is-long-enough'

export interface AppOptions {
  /** Environment of the server, as `process.env` would give it. */
  readonly environment?: Record<string, string>
  readonly siteFolder?: string
  /** Demo data to begin with, in demonstration mode. */
  readonly demoSeeds?: Preparation['demoSeeds']
  /** Clock of the server [ms since 1970]. */
  readonly now?: () => number
  /** Takes the lines of the log. */
  readonly log?: (line: string) => void
  readonly atEnd?: AtEnd
}

/** Takes what is done at the end: of a test, or of all that share one server. */
export type AtEnd = (tidy: () => void) => void

/** A database of its own for each test; it is closed when the test ends. */
export function freshDatabase(
  preparation: Partial<Preparation> = {},
  file = IN_MEMORY,
  atEnd: AtEnd = onTestFinished,
): ReturnType<typeof openDatabase> {
  const database = openDatabase(file)
  atEnd(database.close)
  prepareDatabase(database.db, { mode: 'demonstration', demoSeeds: [], ...preparation })
  return database
}

/** Passwords that cost next to nothing: their strength is not what most tests are about. */
export const CHEAP_PASSWORDS = createPasswords({ memoryCost: 8, timeCost: 1 })

/** The whole server on a fresh database in memory; it does not listen. */
export function freshApp(options: AppOptions = {}) {
  const { environment, siteFolder = '/nowhere', log, demoSeeds = [], now, atEnd } = options
  const env = readEnv({ NODE_ENV: 'test', ...environment })
  const { db, close } = freshDatabase({ mode: env.mode, demoSeeds }, IN_MEMORY, atEnd)
  const logger = pino({ level: log ? 'info' : 'silent' }, { write: log ?? (() => undefined) })
  const parts = createParts(db, env, { passwords: CHEAP_PASSWORDS, ...(now ? { now } : {}) })
  const app = createApp({ parts, env, logger, version: '1.2.3', siteFolder })
  return { app, db, close, parts }
}
