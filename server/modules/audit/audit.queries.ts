import { and, count, desc, gte, lte, type SQL, sql } from 'drizzle-orm'
import type { AuditQuery } from '../../../shared/schemas/account'
import type { Db } from '../../db/client'
import { auditEntries } from '../../db/schema'
import { containsWords } from '../../db/search'

export function insertAuditEntry(db: Db, entry: typeof auditEntries.$inferInsert): void {
  db.insert(auditEntries).values(entry).run()
}

export type AuditFilter = Omit<AuditQuery, 'page'>

function wanted({ search, action, from, to }: AuditFilter): SQL | undefined {
  const { actorName, subjectName, subjectId, at } = auditEntries
  return and(
    containsWords(search, actorName, subjectName, subjectId, auditEntries.action),
    action === '' ? undefined : sql`instr(${auditEntries.action}, ${action}) = 1`,
    from === undefined ? undefined : gte(at, from),
    to === undefined ? undefined : lte(at, to),
  )
}

/** Entries of the trail, the newest first; who acted by the name as it was then. */
export function listAuditEntries(
  db: Db,
  filter: AuditFilter,
  { offset, limit }: { readonly offset: number; readonly limit: number },
) {
  const { id, at, actorName, subjectType, subjectId, subjectName, projectId } = auditEntries
  const { action, fromVersion, toVersion, detail } = auditEntries
  return db
    .select({
      ...{ id, at, actorName, action, subjectType, subjectId, subjectName, projectId },
      ...{ fromVersion, toVersion, detail },
    })
    .from(auditEntries)
    .where(wanted(filter))
    .orderBy(desc(id))
    .limit(limit)
    .offset(offset)
    .all()
}

export function countAuditEntries(db: Db, filter: AuditFilter): number {
  return db.select({ total: count() }).from(auditEntries).where(wanted(filter)).get()?.total ?? 0
}
