import { asc, count, eq, sql } from 'drizzle-orm'
import type { Db } from '../../db/client'
import { accounts, organisations } from '../../db/schema'

export type OrganisationRow = typeof organisations.$inferSelect

const shown = { id: organisations.id, name: organisations.name, people: count(accounts.id) }

/** Organisations by name, each with how many people belong to it. */
export function listOrganisations(db: Db) {
  return db
    .select(shown)
    .from(organisations)
    .leftJoin(accounts, eq(accounts.organisationId, organisations.id))
    .groupBy(organisations.id)
    .orderBy(asc(sql`lower(${organisations.name})`), asc(organisations.id))
    .all()
}

export function findShownOrganisation(db: Db, id: string) {
  return db
    .select(shown)
    .from(organisations)
    .leftJoin(accounts, eq(accounts.organisationId, organisations.id))
    .where(eq(organisations.id, id))
    .groupBy(organisations.id)
    .get()
}

export function findOrganisation(db: Db, id: string): OrganisationRow | undefined {
  return db.select().from(organisations).where(eq(organisations.id, id)).get()
}

/** By name, whatever its capitals. */
export function findOrganisationByName(db: Db, name: string): OrganisationRow | undefined {
  return db
    .select()
    .from(organisations)
    .where(sql`lower(${organisations.name}) = lower(${name})`)
    .get()
}

export function insertOrganisation(db: Db, organisation: OrganisationRow): void {
  db.insert(organisations).values(organisation).run()
}

export function renameOrganisation(db: Db, id: string, name: string): void {
  db.update(organisations).set({ name }).where(eq(organisations.id, id)).run()
}
