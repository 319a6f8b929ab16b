import { pino } from 'pino'
import { onTestFinished } from 'vitest'
import { createApp } from '../../server/app'
import { IN_MEMORY, openDatabase } from '../../server/db/client'
import { type Preparation, prepareDatabase } from '../../server/db/prepare-database'
import { readEnv } from '../../server/env'

export const SECRET = 'a-secret-of-the-tests-that-is-long-enough'

export interface AppOptions {
  /** Environment of the server, as `process.env` would give it. */
  readonly environment?: Record<string, string>
  readonly siteFolder?: string
  /** Takes the lines of the log. */
  readonly log?: (line: string) => void
}

/** A database of its own for each test; it is closed when the test ends. */
export function freshDatabase(
  preparation: Partial<Preparation> = {},
  file = IN_MEMORY,
): ReturnType<typeof openDatabase> {
  const database = openDatabase(file)
  onTestFinished(database.close)
  prepareDatabase(database.db, { mode: 'demonstration', demoSeeds: [], ...preparation })
  return database
}

/** The whole server on a fresh database in memory; it does not listen. */
export function freshApp({ environment, siteFolder = '/nowhere', log }: AppOptions = {}) {
  const env = readEnv({ NODE_ENV: 'test', ...environment })
  const { db, close } = freshDatabase({ mode: env.mode })
  const logger = pino({ level: log ? 'info' : 'silent' }, { write: log ?? (() => undefined) })
  return { app: createApp({ db, env, logger, version: '1.2.3', siteFolder }), db, close }
}
