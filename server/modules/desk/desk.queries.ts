import { desc, eq } from 'drizzle-orm'
import type { Db } from '../../db/client'
import { auditEntries, scenarios } from '../../db/schema'

/** The newest entries of the audit trail of one project. */
export function listChanges(db: Db, projectId: string, most: number) {
  const { id, at, actorName, action, subjectType, subjectId, subjectName } = auditEntries
  return db
    .select({ id, at, actorName, action, subjectType, subjectId, subjectName })
    .from(auditEntries)
    .where(eq(auditEntries.projectId, projectId))
    .orderBy(desc(auditEntries.id))
    .limit(most)
    .all()
}

/** The line of a scenario, where the scenario still exists. */
export function findLineOfScenario(db: Db, scenarioId: string): string | null {
  const { lineId } = scenarios
  const row = db.select({ lineId }).from(scenarios).where(eq(scenarios.id, scenarioId)).get()
  return row?.lineId ?? null
}
