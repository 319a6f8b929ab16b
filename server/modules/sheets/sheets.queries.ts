import { and, asc, count, desc, eq, inArray, isNotNull, isNull, ne, or, sql } from 'drizzle-orm'
import { alias } from 'drizzle-orm/sqlite-core'
import type { z } from 'zod'
import { ISSUED_STATUSES, type SheetStatus } from '../../../shared/schemas/sheet-status'
import type { sheetsQuerySchema } from '../../../shared/schemas/sheet-api'
import { PAGE_SIZE } from '../../../shared/schemas/paging'
import type { Db } from '../../db/client'
import {
  accounts,
  projectMembers,
  projects,
  sheetComments,
  sheetFiles,
  sheets,
  sheetSettings,
} from '../../db/schema'
import { containsText, offsetOf, ordered } from '../projects/kept.queries'

type Query = z.output<typeof sheetsQuerySchema>
export type SheetRow = typeof sheets.$inferSelect
type NewSheet = typeof sheets.$inferInsert

const preparers = alias(accounts, 'preparers')

function matching(projectId: string, { search, status }: Query) {
  return and(
    eq(sheets.projectId, projectId),
    status === 'any' ? undefined : eq(sheets.status, status),
    containsText([sheets.number], search),
  )
}

/** By number, of one number the newest revision first. */
export function listSheets(db: Db, projectId: string, query: Query) {
  const open = and(eq(sheetComments.sheetId, sheets.id), isNull(sheetComments.resolvedAt))
  return db
    .select({
      ...{ id: sheets.id, number: sheets.number, revision: sheets.revision },
      ...{ status: sheets.status, category: sheets.category, content: sheets.content },
      preparedBy: preparers.name,
      openComments: sql<number>`(select count(*) from ${sheetComments} where ${open})`,
      ...{ issuedAt: sheets.issuedAt, updatedAt: sheets.updatedAt },
    })
    .from(sheets)
    .innerJoin(preparers, eq(preparers.id, sheets.preparedBy))
    .where(matching(projectId, query))
    .orderBy(ordered(sheets.number, query.order), desc(sheets.createdAt), asc(sheets.id))
    .limit(PAGE_SIZE)
    .offset(offsetOf(query.page))
    .all()
}

export function countSheets(db: Db, projectId: string, query: Query): number {
  return db.select({ total: count() }).from(sheets).where(matching(projectId, query)).get()!.total
}

export function findSheet(db: Db, projectId: string, sheetId: string): SheetRow | undefined {
  const at = and(eq(sheets.projectId, projectId), eq(sheets.id, sheetId))
  return db.select().from(sheets).where(at).get()
}

/** The project of a sheet, where the account is a member of it. */
export function findOwnSheetProject(db: Db, sheetId: string, accountId: string) {
  return db
    .select({ projectId: sheets.projectId })
    .from(sheets)
    .innerJoin(projectMembers, eq(projectMembers.projectId, sheets.projectId))
    .where(and(eq(sheets.id, sheetId), eq(projectMembers.accountId, accountId)))
    .get()
}

/** Sheets on their way in projects of an account that are not archived; the longest waiting first. */
export function listOnTheirWay(db: Db, accountId: string, statuses: readonly SheetStatus[]) {
  return db
    .select({ sheet: sheets, project: { id: projects.id, name: projects.name } })
    .from(sheets)
    .innerJoin(projects, eq(projects.id, sheets.projectId))
    .innerJoin(projectMembers, eq(projectMembers.projectId, sheets.projectId))
    .where(
      and(
        eq(projectMembers.accountId, accountId),
        isNull(projects.archivedAt),
        inArray(sheets.status, [...statuses]),
      ),
    )
    .orderBy(asc(sheets.updatedAt), asc(sheets.id))
    .all()
}

/** All revisions of a number, the oldest first. */
export function listRevisions(db: Db, projectId: string, number: string): readonly SheetRow[] {
  return db
    .select()
    .from(sheets)
    .where(and(eq(sheets.projectId, projectId), eq(sheets.number, number)))
    .orderBy(asc(sheets.createdAt), asc(sql`length(${sheets.revision})`), asc(sheets.revision))
    .all()
}

/** Revisions of the same number that are in force, besides one. */
export function listInForce(db: Db, { projectId, number, id }: SheetRow): readonly SheetRow[] {
  const inForce: SheetStatus[] = ['approved', 'issued-for-information']
  return db
    .select()
    .from(sheets)
    .where(
      and(
        eq(sheets.projectId, projectId),
        eq(sheets.number, number),
        ne(sheets.id, id),
        inArray(sheets.status, inForce),
      ),
    )
    .all()
}

export function countIssued(db: Db, projectId: string): number {
  const wasIssued = or(isNotNull(sheets.issuedAt), inArray(sheets.status, [...ISSUED_STATUSES]))
  return db
    .select({ total: count() })
    .from(sheets)
    .where(and(eq(sheets.projectId, projectId), wasIssued))
    .get()!.total
}

export function insertSheet(db: Db, row: NewSheet): void {
  db.insert(sheets).values(row).run()
}

export function updateSheet(db: Db, id: string, row: Partial<NewSheet>): void {
  db.update(sheets).set(row).where(eq(sheets.id, id)).run()
}

export function deleteSheet(db: Db, id: string): void {
  db.delete(sheets).where(eq(sheets.id, id)).run()
}

export function findSettings(db: Db, projectId: string) {
  return db.select().from(sheetSettings).where(eq(sheetSettings.projectId, projectId)).get()
}

export function writeSettings(db: Db, row: typeof sheetSettings.$inferInsert): void {
  const { projectId: _, ...set } = row
  db.insert(sheetSettings)
    .values(row)
    .onConflictDoUpdate({ target: sheetSettings.projectId, set })
    .run()
}

export function insertSheetFile(db: Db, row: typeof sheetFiles.$inferInsert): void {
  db.insert(sheetFiles).values(row).run()
}

/** Those of the ids under which a sheet has a file. */
export function listKnownSheetFileIds(db: Db, ids: readonly string[]): readonly string[] {
  const { fileId } = sheetFiles
  return db
    .select({ fileId })
    .from(sheetFiles)
    .where(inArray(fileId, [...ids]))
    .all()
    .map((row) => row.fileId)
}

export function findSheetByCode(db: Db, code: string): SheetRow | undefined {
  return db.select().from(sheets).where(eq(sheets.code, code)).get()
}

export function findSheetByFile(db: Db, sha256: string): SheetRow | undefined {
  return db.select().from(sheets).where(eq(sheets.fileSha256, sha256)).get()
}
