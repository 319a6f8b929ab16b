import { and, desc, eq } from 'drizzle-orm'
import type { Db } from '../../db/client'
import { accounts, scenarioVersions } from '../../db/schema'

type NewRow = typeof scenarioVersions.$inferInsert

const common = {
  version: scenarioVersions.version,
  name: scenarioVersions.name,
  savedAt: scenarioVersions.savedAt,
  savedBy: { id: accounts.id, name: accounts.name },
  summary: scenarioVersions.summary,
}

/** The newest first. */
export function listVersions(db: Db, scenarioId: string) {
  return db
    .select(common)
    .from(scenarioVersions)
    .innerJoin(accounts, eq(accounts.id, scenarioVersions.savedBy))
    .where(eq(scenarioVersions.scenarioId, scenarioId))
    .orderBy(desc(scenarioVersions.version))
    .all()
}

export function findVersion(db: Db, scenarioId: string, version: number) {
  const { note, content } = scenarioVersions
  return db
    .select({ ...common, note, content })
    .from(scenarioVersions)
    .innerJoin(accounts, eq(accounts.id, scenarioVersions.savedBy))
    .where(and(eq(scenarioVersions.scenarioId, scenarioId), eq(scenarioVersions.version, version)))
    .get()
}

export function insertVersion(db: Db, row: NewRow): void {
  db.insert(scenarioVersions).values(row).run()
}
