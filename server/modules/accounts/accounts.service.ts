import type { z } from 'zod'
import type {
  Account,
  AccountChange,
  ownSessionsSchema,
  PasswordChange,
} from '../../../shared/schemas/account'
import { OutOfRangeError } from '../../../shared/errors'
import { beginAttempt, forgiveAttempt } from '../../auth/attempts/attempts'
import {
  endAllSessions,
  endOtherSessions,
  endSession,
  listOpenSessions,
} from '../../auth/sessions.queries'
import type { Db } from '../../db/client'
import { NotFoundError } from '../../errors'
import type { SignedIn } from '../../http/operation'
import type { ServerParts } from '../../parts'
import { recordAudit } from '../audit/record-audit'
import { voidResets } from '../password-resets/password-resets.queries'
import { queuePasswordChanged } from '../password-resets/password-changed-mail'
import { findAccount, findShownAccount, updateAccount } from './accounts.queries'
import { assertTimeZone } from './time-zone'

/** @throws NotFoundError if there is no such account. */
export function readAccount(db: Db, accountId: string): Account {
  const account = findShownAccount(db, accountId)
  if (!account) throw new NotFoundError('account: it does not exist')
  return { ...account, email: account.email ?? '' }
}

/** Changes what a person may change about themselves. */
export function changeAccount(
  { db, now }: ServerParts,
  actor: SignedIn,
  change: AccountChange,
): Account {
  if (change.timeZone !== undefined) assertTimeZone('timeZone', change.timeZone)
  return db.transaction((tx) => {
    const fields = Object.keys(change)
    if (fields.length > 0) {
      updateAccount(tx, actor.accountId, change)
      recordAudit(tx, actor, now(), { ...about(actor, 'account.changed'), detail: { fields } })
    }
    return readAccount(tx, actor.accountId)
  })
}

/**
 * Sets a new password, ends the other sessions and voids open reset links.
 *
 * @throws OutOfRangeError if the present password is wrong, TooManyRequestsError if it was guessed at.
 */
export async function changePassword(
  parts: ServerParts,
  actor: SignedIn,
  { current, next }: PasswordChange,
  sender: string,
): Promise<void> {
  const { db, now, passwords } = parts
  const attempt = beginAttempt(parts, { purpose: 'password', target: actor.accountId, sender })
  const stored = findAccount(db, actor.accountId)?.passwordHash ?? null
  if (!(await passwords.fits(current, stored))) throw wrongPassword()
  const passwordHash = await passwords.hash(next)
  db.transaction((tx) => {
    const account = findAccount(tx, actor.accountId)
    if (!account || account.passwordHash !== stored) throw wrongPassword()
    forgiveAttempt(tx, attempt)
    updateAccount(tx, actor.accountId, { passwordHash })
    endOtherSessions(tx, actor.accountId, actor.sessionId)
    voidResets(tx, actor.accountId, now())
    queuePasswordChanged(tx, parts, account)
    recordAudit(tx, actor, now(), about(actor, 'account.password-changed'))
  })
}

type OwnSessions = z.output<typeof ownSessionsSchema>

export function listOwnSessions({ db, now }: ServerParts, actor: SignedIn): OwnSessions {
  const sessions = listOpenSessions(db, actor.accountId, now())
  return {
    sessions: sessions.map(({ id, createdAt, expiresAt, userAgent }) => ({
      ...{ id, createdAt, expiresAt, userAgent },
      isThis: id === actor.sessionId,
    })),
  }
}

/** @throws NotFoundError if the account has no such session. */
export function endOwnSession({ db, now }: ServerParts, actor: SignedIn, handle: string): void {
  db.transaction((tx) => {
    if (!endSession(tx, actor.accountId, handle)) {
      throw new NotFoundError(`session: "${handle}" is none of yours`)
    }
    recordAudit(tx, actor, now(), about(actor, 'account.session-ended'))
  })
}

export function endOwnSessions({ db, now }: ServerParts, actor: SignedIn): void {
  db.transaction((tx) => {
    const sessions = endAllSessions(tx, actor.accountId)
    recordAudit(tx, actor, now(), {
      ...about(actor, 'account.signed-out-everywhere'),
      detail: { sessions },
    })
  })
}

function about({ accountId, name }: SignedIn, action: string) {
  return { action, subjectType: 'account', subjectId: accountId, subjectName: name }
}

/** The value never travels back: it may be a password of something else. */
function wrongPassword(): OutOfRangeError {
  const allowed = 'your present password'
  const message = `current: what was entered is not ${allowed}`
  return new OutOfRangeError([{ path: 'current', value: null, allowed, unit: '–', message }])
}
