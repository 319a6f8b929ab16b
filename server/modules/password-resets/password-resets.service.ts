import { beginAttempt } from '../../auth/attempts/attempts'
import { endAllSessions } from '../../auth/sessions.queries'
import { newId, newToken } from '../../auth/tokens'
import type { Db } from '../../db/client'
import { NotFoundError } from '../../errors'
import { composeMail } from '../../mail/compose-mail'
import { queueMail } from '../../mail/mail-queue'
import { momentText } from '../../mail/moment-text'
import type { ServerParts } from '../../parts'
import {
  type AccountRow,
  findAccount,
  findAccountByEmail,
  updateAccount,
} from '../accounts/accounts.queries'
import { ANONYMOUS, recordAudit } from '../audit/record-audit'
import { deleteMail } from '../mails/mails.queries'
import { queuePasswordChanged } from './password-changed-mail'
import {
  countOpenResets,
  findOpenReset,
  insertReset,
  type ResetRow,
  voidResets,
} from './password-resets.queries'

/** A link works for an hour. */
export const RESET_LIFE = 60 * 60 * 1000

/** Links that may be open at once; whoever asks more often gets no further mail. */
const MOST_OPEN = 3

/**
 * Sends a link to an address that has an active account. For any other address the same mail is written
 * and thrown away: neither the answer nor its time tells which addresses are known.
 *
 * @throws TooManyRequestsError if the sender asks too often.
 */
export function requestReset(parts: ServerParts, email: string, sender: string): void {
  const { db, now, mail } = parts
  beginAttempt(parts, { purpose: 'reset', target: email, sender })
  db.transaction((tx) => {
    const account = findAccountByEmail(tx, email)
    const token = newToken()
    const content = composeReset(parts, token, account?.name ?? '', now() + RESET_LIFE)
    const mailId = queueMail(tx, mail, now(), { recipient: email, ...content })
    if (isServed(tx, account, now())) storeReset(parts, tx, account, token)
    else deleteMail(tx, mailId)
  })
}

function isServed(db: Db, account: AccountRow | undefined, at: number): account is AccountRow {
  if (!account || account.deactivatedAt !== null) return false
  return countOpenResets(db, account.id, at) < MOST_OPEN
}

function storeReset({ keyedHash, now }: ServerParts, tx: Db, account: AccountRow, token: string) {
  const at = now()
  const tokenHash = keyedHash('password-reset', token)
  const reset = { id: newId(), tokenHash, accountId: account.id }
  insertReset(tx, { ...reset, createdAt: at, expiresAt: at + RESET_LIFE })
  recordAudit(tx, ANONYMOUS, at, aboutReset('requested', account))
}

function composeReset({ appUrl }: ServerParts, token: string, name: string, expiresAt: number) {
  return composeMail('passwordReset', {
    appUrl,
    link: new URL(`/reset/${token}`, appUrl).href,
    values: { name, expires: momentText(expiresAt) },
  })
}

/** @throws NotFoundError if the link was used, has expired or never was. */
export function viewReset(parts: ServerParts, token: string) {
  const { account, reset } = openReset(parts, parts.db, token)
  return { name: account.name, expiresAt: reset.expiresAt }
}

/**
 * Sets the new password, once; ends all sessions and voids the other links of the account.
 *
 * @throws NotFoundError if the link was used, has expired or never was.
 */
export async function acceptReset(
  parts: ServerParts,
  token: string,
  password: string,
): Promise<void> {
  const { db, now, passwords } = parts
  openReset(parts, db, token)
  const passwordHash = await passwords.hash(password)
  db.transaction((tx) => {
    const { account } = openReset(parts, tx, token)
    voidResets(tx, account.id, now())
    updateAccount(tx, account.id, { passwordHash })
    endAllSessions(tx, account.id)
    queuePasswordChanged(tx, parts, account)
    recordAudit(
      tx,
      { accountId: account.id, name: account.name },
      now(),
      aboutReset('used', account),
    )
  })
}

function openReset(
  { keyedHash, now }: ServerParts,
  db: Db,
  token: string,
): { reset: ResetRow; account: AccountRow } {
  const reset = findOpenReset(db, keyedHash('password-reset', token), now())
  const account = reset && findAccount(db, reset.accountId)
  if (!account || account.deactivatedAt !== null) {
    throw new NotFoundError('This link was used, has expired or never was. Ask for a new one.')
  }
  return { reset, account }
}

function aboutReset(what: 'requested' | 'used', { id, name }: AccountRow) {
  return {
    action: `password-reset.${what}`,
    subjectType: 'account',
    subjectId: id,
    subjectName: name,
  }
}
