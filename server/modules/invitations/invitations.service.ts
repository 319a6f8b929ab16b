import type { Invitation, NewInvitation } from '../../../shared/schemas/account'
import { mailWords } from '../../../shared/texts/mail.en'
import { newId, newToken } from '../../auth/tokens'
import type { Db } from '../../db/client'
import { ConflictError, NotFoundError } from '../../errors'
import { composeMail } from '../../mail/compose-mail'
import { queueMail } from '../../mail/mail-queue'
import { momentText } from '../../mail/moment-text'
import type { ServerParts } from '../../parts'
import { findAccountByEmail } from '../accounts/accounts.queries'
import { permissionsOf } from '../accounts/permissions'
import { type Author, recordAudit } from '../audit/record-audit'
import { organisationIn } from '../organisations/organisations.service'
import {
  findInvitation,
  findShownInvitation,
  insertInvitation,
  listInvitations,
  revokeOpenInvitations,
  updateInvitation,
} from './invitations.queries'

/** A link works for seven days. */
export const INVITATION_LIFE = 7 * 24 * 60 * 60 * 1000

/**
 * Invites somebody by mail; an earlier invitation to the same address ends.
 *
 * @throws ConflictError if the address has an account, OutOfRangeError for an unknown organisation.
 */
export function invite(parts: ServerParts, author: Author, wanted: NewInvitation): Invitation {
  const { db, keyedHash, now } = parts
  return db.transaction((tx) => {
    const at = now()
    const organisation = organisationIn(tx, 'organisationId', wanted.organisationId)
    assertAddressIsFree(tx, wanted.email)
    revokeOpenInvitations(tx, wanted.email, at)
    const token = newToken()
    const invitation = {
      ...wanted,
      ...permissionsOf(wanted),
      id: newId(),
      tokenHash: keyedHash('invitation', token),
      invitedBy: author.accountId,
      createdAt: at,
      expiresAt: at + INVITATION_LIFE,
    }
    insertInvitation(tx, invitation)
    queueInvitation(parts, tx, {
      ...{ token, recipient: wanted.email, name: wanted.name, role: wanted.role },
      ...{ inviter: author.name, organisation: organisation.name, expiresAt: invitation.expiresAt },
    })
    recordAudit(tx, author, at, {
      ...about('invitation.sent', invitation),
      detail: { role: wanted.role, organisation: organisation.name },
    })
    return shownInvitation(tx, invitation.id, at)
  })
}

/** @throws ConflictError with what to do about it. */
export function assertAddressIsFree(db: Db, email: string): void {
  const account = findAccountByEmail(db, email)
  if (!account) return
  throw new ConflictError(
    account.deactivatedAt === null
      ? 'email: this address has an account already'
      : 'email: this address belongs to a deactivated person; erase it there first',
  )
}

interface InvitationMail {
  readonly token: string
  readonly recipient: string
  readonly name: string
  readonly role: NewInvitation['role']
  readonly inviter: string
  readonly organisation: string
  readonly expiresAt: number
}

function queueInvitation({ appUrl, mail, now }: ServerParts, db: Db, invited: InvitationMail) {
  const { token, recipient, name, role, inviter, organisation, expiresAt } = invited
  const content = composeMail('invitation', {
    appUrl,
    link: invitationLink(appUrl, token),
    values: {
      name: name || mailWords.anonymous,
      inviter: inviter || mailWords.administration,
      role: mailWords.roles[role],
      organisation,
      expires: momentText(expiresAt),
    },
  })
  queueMail(db, mail, now(), { recipient, ...content })
}

export function invitationLink(appUrl: string, token: string): string {
  return new URL(`/invite/${token}`, appUrl).href
}

export function listShownInvitations({ db, now }: ServerParts): readonly Invitation[] {
  return listInvitations(db).map((row) => toInvitation(row, now()))
}

/** @throws NotFoundError, or ConflictError if it is not open any more. */
export function revokeInvitation({ db, now }: ServerParts, author: Author, id: string): void {
  db.transaction((tx) => {
    const at = now()
    const invitation = findInvitation(tx, id)
    if (!invitation) throw new NotFoundError(`invitation: "${id}" does not exist`)
    const { state } = shownInvitation(tx, id, at)
    if (state !== 'open') throw new ConflictError(`invitation: it is ${state}, not open`)
    updateInvitation(tx, id, { revokedAt: at })
    recordAudit(tx, author, at, about('invitation.revoked', invitation))
  })
}

function shownInvitation(db: Db, id: string, at: number): Invitation {
  const found = findShownInvitation(db, id)
  if (!found) throw new NotFoundError(`invitation: "${id}" does not exist`)
  return toInvitation(found, at)
}

type Shown = NonNullable<ReturnType<typeof findShownInvitation>>

function toInvitation({ invitation, organisation }: Shown, at: number): Invitation {
  const { id, email, name, role, mayCheck, mayApprove, createdAt, expiresAt } = invitation
  const state = stateOf(invitation, at)
  return { id, email, name, role, mayCheck, mayApprove, organisation, createdAt, expiresAt, state }
}

function stateOf(invitation: Shown['invitation'], at: number): Invitation['state'] {
  if (invitation.acceptedAt !== null) return 'accepted'
  if (invitation.revokedAt !== null) return 'revoked'
  return invitation.expiresAt <= at ? 'expired' : 'open'
}

/** No address: the trail cannot be changed, and an address must be erasable. */
function about(action: string, { id, name }: { readonly id: string; readonly name: string }) {
  return { action, subjectType: 'invitation', subjectId: id, subjectName: name }
}
