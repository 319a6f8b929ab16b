import type { Logger } from 'pino'
import type { Db } from '../db/client'
import { deleteExpiredClasses } from '../modules/classes/classes.queries'
import { ATTEMPTS_FORGOTTEN_AFTER } from './attempts/attempts'
import { deleteAttemptsBefore } from './attempts/attempts.queries'
import { deleteExpiredSessions } from './sessions.queries'

const HOUR = 60 * 60 * 1000

export interface HousekeepingParts {
  readonly db: Db
  readonly now: () => number
}

/** Deletes what counts no longer: sessions that ended, attempts that are forgotten, classes. */
export function forgetExpired({ db, now }: HousekeepingParts): void {
  deleteExpiredSessions(db, now())
  deleteExpiredClasses(db, now())
  deleteAttemptsBefore(db, now() - ATTEMPTS_FORGOTTEN_AFTER)
}

/** Forgets at the start and every hour; returns what stops it. */
export function startHousekeeping(
  parts: HousekeepingParts,
  logger: Pick<Logger, 'error'>,
): () => void {
  const run = () => {
    try {
      forgetExpired(parts)
    } catch (error) {
      logger.error({ err: error }, 'what has expired could not be deleted; tried again in an hour')
    }
  }
  run()
  const timer = setInterval(run, HOUR)
  timer.unref()
  return () => {
    clearInterval(timer)
  }
}
