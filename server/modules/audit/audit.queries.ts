import type { Db } from '../../db/client'
import { auditEntries } from '../../db/schema'

export function insertAuditEntry(db: Db, entry: typeof auditEntries.$inferInsert): void {
  db.insert(auditEntries).values(entry).run()
}
