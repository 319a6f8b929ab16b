import type { SignIn } from '../../../shared/schemas/account'
import { beginAttempt, forgiveAttempt, type Attempt } from '../../auth/attempts/attempts'
import type { Db } from '../../db/client'
import { SignInRequiredError } from '../../errors'
import type { ServerParts } from '../../parts'
import { ANONYMOUS, recordAudit } from '../audit/record-audit'
import { type AccountRow, findAccountByEmail } from './accounts.queries'

const REFUSAL = 'Address or password is not right.'

/**
 * Finds the account that may be signed in. An unknown address, a deactivated account and a wrong
 * password take the same work and get the same answer.
 *
 * @throws SignInRequiredError or TooManyRequestsError
 */
export async function signIn(
  parts: ServerParts,
  { email, password }: SignIn,
  sender: string,
): Promise<string> {
  const { db, passwords, now } = parts
  const attempt = beginAttempt(parts, { purpose: 'sign-in', target: email, sender })
  const found = findAccountByEmail(db, email)
  const stored = found?.passwordHash ?? null
  const fits = await passwords.fits(password, stored)
  const accountId = db.transaction((tx) => {
    // Read again: the account may have changed while its password was compared.
    const account = findAccountByEmail(tx, email)
    if (!fits || !account || account.passwordHash !== stored || account.deactivatedAt !== null) {
      noteRefusal(tx, now(), attempt, account)
      return null
    }
    forgiveAttempt(tx, attempt)
    recordAudit(tx, { accountId: account.id, name: account.name }, now(), {
      action: 'account.signed-in',
      ...subjectOf(account),
      detail: { failedBefore: attempt.count - 1 },
    })
    return account.id
  })
  if (accountId === null) throw new SignInRequiredError(REFUSAL)
  return accountId
}

/** One line for a series of failures, where it begins to be slowed; never the address that was tried. */
function noteRefusal(db: Db, at: number, attempt: Attempt, account: AccountRow | undefined): void {
  if (!attempt.startsToSlow) return
  recordAudit(db, ANONYMOUS, at, {
    action: 'account.sign-in-slowed',
    ...subjectOf(account),
    detail: { failures: attempt.count },
  })
}

function subjectOf(account: AccountRow | undefined) {
  return {
    subjectType: 'account',
    subjectId: account?.id ?? '',
    subjectName: account?.name ?? '',
  }
}
