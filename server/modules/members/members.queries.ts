import { and, asc, count, eq, isNull, ne } from 'drizzle-orm'
import type { Db } from '../../db/client'
import { accounts, organisations, projectMembers } from '../../db/schema'

type NewRow = typeof projectMembers.$inferInsert

const oneMember = (projectId: string, accountId: string) =>
  and(eq(projectMembers.projectId, projectId), eq(projectMembers.accountId, accountId))

function selectMembers(db: Db) {
  return db
    .select({
      accountId: accounts.id,
      name: accounts.name,
      organisation: organisations.name,
      role: projectMembers.role,
      accountRole: accounts.role,
      mayCheck: accounts.mayCheck,
      mayApprove: accounts.mayApprove,
      deactivatedAt: accounts.deactivatedAt,
      addedAt: projectMembers.addedAt,
    })
    .from(projectMembers)
    .innerJoin(accounts, eq(accounts.id, projectMembers.accountId))
    .innerJoin(organisations, eq(organisations.id, accounts.organisationId))
    .$dynamic()
}

export function listMembers(db: Db, projectId: string) {
  return selectMembers(db)
    .where(eq(projectMembers.projectId, projectId))
    .orderBy(asc(projectMembers.addedAt), asc(accounts.name), asc(accounts.id))
    .all()
}

export function findMember(db: Db, projectId: string, accountId: string) {
  return selectMembers(db).where(oneMember(projectId, accountId)).get()
}

/** Somebody who can sign in, by address. */
export function findActiveAccount(db: Db, email: string) {
  return db
    .select()
    .from(accounts)
    .where(and(eq(accounts.email, email), isNull(accounts.deactivatedAt)))
    .get()
}

/** Leads that count, besides one account: they can sign in, and are no viewers. */
export function countOtherLeads(db: Db, projectId: string, accountId: string): number {
  return db
    .select({ leads: count() })
    .from(projectMembers)
    .innerJoin(accounts, eq(accounts.id, projectMembers.accountId))
    .where(
      and(
        eq(projectMembers.projectId, projectId),
        eq(projectMembers.role, 'lead'),
        ne(projectMembers.accountId, accountId),
        ne(accounts.role, 'viewer'),
        isNull(accounts.deactivatedAt),
      ),
    )
    .get()!.leads
}

export function insertMember(db: Db, row: NewRow): void {
  db.insert(projectMembers).values(row).run()
}

export function updateMemberRole(db: Db, { projectId, accountId, role }: Omit<NewRow, 'addedAt'>) {
  db.update(projectMembers).set({ role }).where(oneMember(projectId, accountId)).run()
}

export function deleteMember(db: Db, projectId: string, accountId: string): void {
  db.delete(projectMembers).where(oneMember(projectId, accountId)).run()
}
