import { asc, eq, sql } from 'drizzle-orm'
import type { StoreItem } from '../../../shared/schemas/depot'
import type { Db } from '../../db/client'
import { accounts, depots, organisations, projects, storeItems } from '../../db/schema'

type NewRow = typeof depots.$inferInsert

function selectDepots(db: Db) {
  return db
    .select({
      id: depots.id,
      organisationId: depots.organisationId,
      name: depots.name,
      callOutTime: depots.callOutTime,
      loadTime: depots.loadTime,
      driveTime: depots.driveTime,
      crews: depots.crews,
      note: depots.note,
      updatedAt: depots.updatedAt,
      updatedBy: { id: accounts.id, name: accounts.name },
      version: depots.version,
    })
    .from(depots)
    .innerJoin(accounts, eq(accounts.id, depots.updatedBy))
    .$dynamic()
}

/** Depots of an organisation in the order of their names. */
export function listDepots(db: Db, organisationId: string) {
  return selectDepots(db)
    .where(eq(depots.organisationId, organisationId))
    .orderBy(asc(sql`lower(${depots.name})`), asc(depots.id))
    .all()
}

export function findDepot(db: Db, depotId: string) {
  return selectDepots(db).where(eq(depots.id, depotId)).get()
}

export function listItems(db: Db, depotId: string): StoreItem[] {
  const { kind, barrierId, diameter, mass, serviceable, inRepair, note } = storeItems
  return db
    .select({ kind, barrierId, diameter, mass, serviceable, inRepair, note })
    .from(storeItems)
    .where(eq(storeItems.depotId, depotId))
    .orderBy(asc(storeItems.position))
    .all()
}

export function insertDepot(db: Db, row: NewRow): void {
  db.insert(depots).values(row).run()
}

export function updateDepot(db: Db, depotId: string, row: Partial<NewRow>): void {
  db.update(depots).set(row).where(eq(depots.id, depotId)).run()
}

export function deleteDepot(db: Db, depotId: string): void {
  db.delete(depots).where(eq(depots.id, depotId)).run()
}

export function replaceItems(db: Db, depotId: string, items: readonly StoreItem[]): void {
  db.delete(storeItems).where(eq(storeItems.depotId, depotId)).run()
  items.forEach((item, position) => {
    db.insert(storeItems)
      .values({ depotId, position, ...item })
      .run()
  })
}

/** The organisation whose store counts in a project: that of whoever made it. */
export function findStoreOrganisation(db: Db, projectId: string) {
  return db
    .select({ id: organisations.id, name: organisations.name })
    .from(projects)
    .innerJoin(accounts, eq(accounts.id, projects.createdBy))
    .innerJoin(organisations, eq(organisations.id, accounts.organisationId))
    .where(eq(projects.id, projectId))
    .get()
}
