import { newId, newToken } from '../../auth/tokens'
import type { Db } from '../../db/client'
import type { ServerParts } from '../../parts'
import { countActiveAdministrators } from '../accounts/accounts.queries'
import { PROGRAM, recordAudit } from '../audit/record-audit'
import { insertOrganisation, listOrganisations } from '../organisations/organisations.queries'
import { insertInvitation, revokeUninvited } from './invitations.queries'
import { INVITATION_LIFE, invitationLink } from './invitations.service'

/** Name of the organisation that a new installation begins with; the administrator renames it. */
const FIRST_ORGANISATION = 'My organisation'

/**
 * A one-time link by which the first administrator makes their account, where there is no active one;
 * `null` where there is. Links of earlier starts end.
 */
export function firstAdministratorLink(
  parts: Pick<ServerParts, 'db' | 'keyedHash' | 'now' | 'appUrl'>,
): string | null {
  const { db, keyedHash, now, appUrl } = parts
  return db.transaction((tx) => {
    revokeUninvited(tx, now())
    if (countActiveAdministrators(tx) > 0) return null
    const token = newToken()
    const invitation = {
      id: newId(),
      tokenHash: keyedHash('invitation', token),
      ...{ email: '', role: 'admin' as const, invitedBy: null },
      organisationId: anyOrganisation(tx, now()),
      createdAt: now(),
      expiresAt: now() + INVITATION_LIFE,
    }
    insertInvitation(tx, invitation)
    recordAudit(tx, PROGRAM, now(), {
      action: 'invitation.printed',
      ...{ subjectType: 'invitation', subjectId: invitation.id },
    })
    return invitationLink(appUrl, token)
  })
}

function anyOrganisation(db: Db, createdAt: number): string {
  const [first] = listOrganisations(db)
  if (first) return first.id
  const organisation = { id: newId(), name: FIRST_ORGANISATION, createdAt }
  insertOrganisation(db, organisation)
  return organisation.id
}
