import { join } from 'node:path'
import { createKeyedHash, type KeyedHash } from './auth/keyed-hash'
import { createPasswords, type Passwords } from './auth/passwords'
import { createSessions, type Sessions } from './auth/sessions'
import type { Db } from './db/client'
import type { Env } from './env'
import { FILES_FOLDER, type FileStore, openFileStore } from './files/file-store'
import type { MailWay } from './mail/mail-queue'

/** What the services of people and accounts work with. */
export interface ServerParts {
  readonly db: Db
  /** Clock [ms since 1970]; tests bring their own. */
  readonly now: () => number
  readonly keyedHash: KeyedHash
  readonly passwords: Passwords
  readonly mail: MailWay
  /** Address at which people reach the program. */
  readonly appUrl: string
}

/** What their routes need besides. */
export interface RouteParts extends ServerParts {
  readonly sessions: Sessions
  /** Bytes of project files. */
  readonly store: FileStore
}

/** What tests replace: the clock, and the cost of a password. */
export interface Replaceable {
  readonly now?: () => number
  readonly passwords?: Passwords
}

type PartsEnv = Pick<Env, 'appUrl' | 'dataFolder' | 'sessionSecret' | 'smtpUrl' | 'mailFrom'>

/** Puts together what all routes of one server share. */
export function createParts(
  db: Db,
  { appUrl, dataFolder, sessionSecret, smtpUrl, mailFrom }: PartsEnv,
  { now = Date.now, passwords = createPasswords() }: Replaceable = {},
): RouteParts {
  const keyedHash = createKeyedHash(sessionSecret)
  return {
    ...{ db, now, keyedHash, passwords, appUrl },
    mail: { isSmtp: smtpUrl !== undefined, from: mailFrom },
    sessions: createSessions({ db, now, keyedHash, appUrl }),
    store: openFileStore(join(dataFolder, FILES_FOLDER)),
  }
}
