import { BetterSqlite3Adapter } from '@lucia-auth/adapter-sqlite'
import type { Database } from 'better-sqlite3'
import { Lucia, TimeSpan } from 'lucia'
import type { Db } from '../db/client'
import type { SignedIn } from '../http/operation'
import { guardedAdapter, type AdapterParts } from './session-adapter'

/** A session ends when it was not used for so long; in its second half every use renews it. */
const SESSION_LENGTH = new TimeSpan(14, 'd')

/** Rows of `accounts` as the adapter reads them: columns of the database, not of Drizzle. */
interface AccountColumns {
  readonly name: string
  readonly role: SignedIn['role']
  readonly may_check: 0 | 1
  readonly may_approve: 0 | 1
  readonly organisation_id: string
  readonly deactivated_at: number | null
}

interface SessionColumns {
  readonly created_at: number
  readonly user_agent: string
}

declare module 'lucia' {
  interface Register {
    Lucia: ReturnType<typeof createLucia>
    DatabaseUserAttributes: AccountColumns
    DatabaseSessionAttributes: SessionColumns
  }
}

export interface LuciaParts extends AdapterParts {
  readonly db: Db
  readonly appUrl: string
}

/** Lucia on our tables. Only this folder knows that sessions are Lucia's. */
export function createLucia({ db, appUrl, handleOf, now }: LuciaParts) {
  const isSecure = new URL(appUrl).protocol === 'https:'
  const inner = new BetterSqlite3Adapter(connectionOf(db), {
    user: 'accounts',
    session: 'sessions',
  })
  return new Lucia(guardedAdapter(inner, { handleOf, now }), {
    sessionExpiresIn: SESSION_LENGTH,
    sessionCookie: {
      // With the prefix a browser takes the cookie only over https and for this host alone.
      name: isSecure ? '__Host-toehold-session' : 'toehold-session',
      attributes: { secure: isSecure, sameSite: 'lax', path: '/' },
    },
    getUserAttributes: (account) => ({
      name: account.name,
      role: account.role,
      mayCheck: account.may_check === 1,
      mayApprove: account.may_approve === 1,
      organisationId: account.organisation_id,
      isActive: account.deactivated_at === null,
    }),
  })
}

/** The adapter wants the driver's own connection; `openDatabase` makes no database without one. */
function connectionOf(db: Db): Database {
  return (db as Db & { readonly $client: Database }).$client
}
