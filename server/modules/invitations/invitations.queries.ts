import { and, desc, eq, gt, isNull } from 'drizzle-orm'
import type { Db } from '../../db/client'
import { invitations, organisations } from '../../db/schema'

export type InvitationRow = typeof invitations.$inferSelect

/** Most invitations that the list shows; the newest count. */
const MOST_SHOWN = 500

export function insertInvitation(db: Db, invitation: typeof invitations.$inferInsert): void {
  db.insert(invitations).values(invitation).run()
}

export function findInvitation(db: Db, id: string): InvitationRow | undefined {
  return db.select().from(invitations).where(eq(invitations.id, id)).get()
}

function isOpen(now: number) {
  return and(
    isNull(invitations.acceptedAt),
    isNull(invitations.revokedAt),
    gt(invitations.expiresAt, now),
  )
}

/** An invitation that can still be accepted. */
export function findOpenInvitation(
  db: Db,
  tokenHash: string,
  now: number,
): InvitationRow | undefined {
  return db
    .select()
    .from(invitations)
    .where(and(eq(invitations.tokenHash, tokenHash), isOpen(now)))
    .get()
}

const withOrganisation = {
  invitation: invitations,
  organisation: { id: organisations.id, name: organisations.name },
}

export function listInvitations(db: Db) {
  return db
    .select(withOrganisation)
    .from(invitations)
    .innerJoin(organisations, eq(organisations.id, invitations.organisationId))
    .orderBy(desc(invitations.createdAt), desc(invitations.id))
    .limit(MOST_SHOWN)
    .all()
}

export function findShownInvitation(db: Db, id: string) {
  return db
    .select(withOrganisation)
    .from(invitations)
    .innerJoin(organisations, eq(organisations.id, invitations.organisationId))
    .where(eq(invitations.id, id))
    .get()
}

export function updateInvitation(db: Db, id: string, change: Partial<InvitationRow>): void {
  db.update(invitations).set(change).where(eq(invitations.id, id)).run()
}

/** Ends what is still open for an address; the newest invitation is the one that counts. */
export function revokeOpenInvitations(db: Db, email: string, now: number): void {
  db.update(invitations)
    .set({ revokedAt: now })
    .where(and(eq(invitations.email, email), isOpen(now)))
    .run()
}

/** Ends the one-time links of first administrators. */
export function revokeUninvited(db: Db, now: number): void {
  db.update(invitations)
    .set({ revokedAt: now })
    .where(and(isNull(invitations.invitedBy), isOpen(now)))
    .run()
}

export function eraseInvitedAddress(db: Db, email: string): void {
  db.update(invitations).set({ email: '' }).where(eq(invitations.email, email)).run()
}
