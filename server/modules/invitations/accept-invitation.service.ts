import type { z } from 'zod'
import type { InvitationAccept, invitationViewSchema } from '../../../shared/schemas/account'
import { newId } from '../../auth/tokens'
import type { Db } from '../../db/client'
import { NotFoundError } from '../../errors'
import { unknownIn } from '../../http/unknown-reference'
import type { ServerParts } from '../../parts'
import { insertAccount } from '../accounts/accounts.queries'
import { assertTimeZone } from '../accounts/time-zone'
import { recordAudit } from '../audit/record-audit'
import { findOrganisation } from '../organisations/organisations.queries'
import { findOpenInvitation, type InvitationRow, updateInvitation } from './invitations.queries'
import { assertAddressIsFree } from './invitations.service'

type InvitationView = z.output<typeof invitationViewSchema>

/** @throws NotFoundError if the link was used or revoked, has expired or never was. */
export function viewInvitation(parts: ServerParts, token: string): InvitationView {
  const { email, name, organisationId, role, expiresAt } = openInvitation(parts, parts.db, token)
  const organisation = findOrganisation(parts.db, organisationId)?.name ?? ''
  return { email, name, organisation, role, expiresAt }
}

/**
 * Makes the account that somebody was invited to, once.
 *
 * @returns the id of the account.
 * @throws NotFoundError if the link was used or revoked, has expired or never was; ConflictError if the
 * address has an account; OutOfRangeError if an address is missing or given twice.
 */
export async function acceptInvitation(
  parts: ServerParts,
  token: string,
  accepted: InvitationAccept,
): Promise<string> {
  const { db, passwords, now } = parts
  assertTimeZone('timeZone', accepted.timeZone)
  addressOf(openInvitation(parts, db, token), accepted)
  const passwordHash = await passwords.hash(accepted.password)
  return db.transaction((tx) => {
    const at = now()
    const invitation = openInvitation(parts, tx, token)
    const email = addressOf(invitation, accepted)
    assertAddressIsFree(tx, email)
    updateInvitation(tx, invitation.id, { acceptedAt: at })
    const id = newId()
    const { name, registrationNumber, timeZone, unitSystem } = accepted
    const { role, mayCheck, mayApprove, organisationId } = invitation
    insertAccount(tx, {
      ...{ id, email, name, organisationId, role, mayCheck, mayApprove },
      ...{ registrationNumber, timeZone, unitSystem, passwordHash, createdAt: at },
    })
    recordAudit(tx, { accountId: id, name }, at, {
      action: 'invitation.accepted',
      ...{ subjectType: 'account', subjectId: id, subjectName: name },
      detail: { invitation: invitation.id, role },
    })
    return id
  })
}

function openInvitation({ keyedHash, now }: ServerParts, db: Db, token: string): InvitationRow {
  const found = findOpenInvitation(db, keyedHash('invitation', token), now())
  if (found) return found
  throw new NotFoundError(
    'This invitation was accepted or revoked, has expired or never was. Ask for a new one.',
  )
}

/** The invited address counts; only the first administrator brings an own one. */
function addressOf(invitation: InvitationRow, { email }: InvitationAccept): string {
  if (invitation.email !== '') {
    if (email === undefined || email === invitation.email) return invitation.email
    throw unknownIn('email', email, 'the address that was invited, or left out')
  }
  if (email === undefined) throw unknownIn('email', email, 'your address for mail')
  return email
}
