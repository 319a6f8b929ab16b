import type { Db } from '../../server/db/client'
import { auditEntries } from '../../server/db/schema'

/** The audit trail, oldest first. */
export function auditOf(db: Db) {
  return db.select().from(auditEntries).orderBy(auditEntries.id).all()
}

export function auditActions(db: Db): readonly string[] {
  return auditOf(db).map(({ action }) => action)
}

/** The same as "who: what: on whom". */
export function auditTrail(db: Db): readonly string[] {
  return auditOf(db).map(
    ({ actorName, action, subjectName }) => `${actorName}: ${action}: ${subjectName}`,
  )
}
