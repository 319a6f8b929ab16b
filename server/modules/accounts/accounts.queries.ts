import { and, count, eq, isNull } from 'drizzle-orm'
import type { Db } from '../../db/client'
import { accounts, organisations } from '../../db/schema'

export type AccountRow = typeof accounts.$inferSelect
type NewAccountRow = typeof accounts.$inferInsert

export function findAccount(db: Db, id: string): AccountRow | undefined {
  return db.select().from(accounts).where(eq(accounts.id, id)).get()
}

export function findAccountByEmail(db: Db, email: string): AccountRow | undefined {
  return db.select().from(accounts).where(eq(accounts.email, email)).get()
}

/** The account with the name of its organisation, as the API shows it. */
export function findShownAccount(db: Db, id: string) {
  const { email, name, role, mayCheck, mayApprove } = accounts
  const { registrationNumber, timeZone, unitSystem } = accounts
  const organisation = { id: organisations.id, name: organisations.name }
  return db
    .select({
      ...{ id: accounts.id, email, name, organisation, role, mayCheck, mayApprove },
      ...{ registrationNumber, timeZone, unitSystem },
    })
    .from(accounts)
    .innerJoin(organisations, eq(organisations.id, accounts.organisationId))
    .where(eq(accounts.id, id))
    .get()
}

export function insertAccount(db: Db, account: NewAccountRow): void {
  db.insert(accounts).values(account).run()
}

export function updateAccount(db: Db, id: string, change: Partial<NewAccountRow>): void {
  db.update(accounts).set(change).where(eq(accounts.id, id)).run()
}

export function countActiveAdministrators(db: Db): number {
  return (
    db
      .select({ total: count() })
      .from(accounts)
      .where(and(eq(accounts.role, 'admin'), isNull(accounts.deactivatedAt)))
      .get()?.total ?? 0
  )
}
