import type { Health, Mode } from '../../../shared/schemas/health'
import type { Db } from '../../db/client'
import { UnavailableError } from '../../errors'
import { isDatabaseReachable } from './health.queries'

/** What the program says about itself. */
export interface Identity {
  readonly version: string
  readonly mode: Mode
}

/** @throws UnavailableError if the database does not answer. */
export function readHealth(db: Db, { version, mode }: Identity): Health {
  if (!isDatabaseReachable(db)) throw new UnavailableError('The database does not answer.')
  return { status: 'ok', version, mode, database: 'reachable' }
}
