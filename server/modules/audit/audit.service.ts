import type { AuditEntry, AuditQuery } from '../../../shared/schemas/account'
import { PAGE_SIZE } from '../../../shared/schemas/paging'
import { auditColumns } from '../../../shared/texts/mail.en'
import type { Db } from '../../db/client'
import { type CsvCell, toCsv } from '../../http/csv'
import { type AuditFilter, countAuditEntries, listAuditEntries } from './audit.queries'

/** Most entries of one CSV file; the filter by time reaches the others. */
export const MOST_CSV_ROWS = 20_000

export function pageOfAudit(db: Db, { page, ...filter }: AuditQuery) {
  const items = listAuditEntries(db, filter, { offset: (page - 1) * PAGE_SIZE, limit: PAGE_SIZE })
  return { items, page, pageSize: PAGE_SIZE, total: countAuditEntries(db, filter) }
}

/** The trail as CSV, the newest first. */
export function auditCsv(db: Db, filter: AuditFilter): string {
  const entries = listAuditEntries(db, filter, { offset: 0, limit: MOST_CSV_ROWS })
  return toCsv([auditColumns, ...entries.map(cells)])
}

function cells(entry: AuditEntry): readonly CsvCell[] {
  return [
    entry.id,
    new Date(entry.at).toISOString(),
    entry.actorName,
    entry.action,
    entry.subjectType,
    entry.subjectName,
    entry.subjectId,
    entry.projectId,
    entry.fromVersion,
    entry.toVersion,
    JSON.stringify(entry.detail),
  ]
}
