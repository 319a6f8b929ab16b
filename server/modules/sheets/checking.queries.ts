import { and, asc, eq, isNull } from 'drizzle-orm'
import { alias } from 'drizzle-orm/sqlite-core'
import type { Db } from '../../db/client'
import {
  accounts,
  projectMembers,
  sheetComments,
  sheetIssues,
  sheetMarks,
  sheetMoves,
} from '../../db/schema'

const answerers = alias(accounts, 'answerers')
const resolvers = alias(accounts, 'resolvers')

export function listMarks(db: Db, sheetId: string) {
  const { line, isTicked, figure, note, at } = sheetMarks
  return db
    .select({ line, isTicked, figure, note, at, by: accounts.name })
    .from(sheetMarks)
    .innerJoin(accounts, eq(accounts.id, sheetMarks.by))
    .where(eq(sheetMarks.sheetId, sheetId))
    .all()
}

export function writeMark(db: Db, row: typeof sheetMarks.$inferInsert): void {
  const { isTicked, figure, note, at, by } = row
  db.insert(sheetMarks)
    .values(row)
    .onConflictDoUpdate({
      target: [sheetMarks.sheetId, sheetMarks.line],
      set: { isTicked, figure, note, at, by },
    })
    .run()
}

export function deleteMark(db: Db, sheetId: string, line: string): void {
  db.delete(sheetMarks)
    .where(and(eq(sheetMarks.sheetId, sheetId), eq(sheetMarks.line, line)))
    .run()
}

export function deleteMarks(db: Db, sheetId: string): void {
  db.delete(sheetMarks).where(eq(sheetMarks.sheetId, sheetId)).run()
}

export function listComments(db: Db, sheetId: string) {
  const { id, line, text, at, answer, answeredAt, resolvedAt } = sheetComments
  return db
    .select({
      ...{ id, line, text, at, answer, answeredAt, resolvedAt },
      by: { id: accounts.id, name: accounts.name },
      answeredBy: answerers.name,
      resolvedBy: resolvers.name,
    })
    .from(sheetComments)
    .innerJoin(accounts, eq(accounts.id, sheetComments.by))
    .leftJoin(answerers, eq(answerers.id, sheetComments.answeredBy))
    .leftJoin(resolvers, eq(resolvers.id, sheetComments.resolvedBy))
    .where(eq(sheetComments.sheetId, sheetId))
    .orderBy(asc(sheetComments.at), asc(sheetComments.id))
    .all()
}

export function findComment(db: Db, sheetId: string, id: string) {
  return db
    .select()
    .from(sheetComments)
    .where(and(eq(sheetComments.sheetId, sheetId), eq(sheetComments.id, id)))
    .get()
}

export function insertComment(db: Db, row: typeof sheetComments.$inferInsert): void {
  db.insert(sheetComments).values(row).run()
}

export function updateComment(
  db: Db,
  id: string,
  row: Partial<typeof sheetComments.$inferInsert>,
): void {
  db.update(sheetComments).set(row).where(eq(sheetComments.id, id)).run()
}

export function listIssues(db: Db, sheetId: string) {
  const { recipient, note, at } = sheetIssues
  return db
    .select({ recipient, note, at, by: accounts.name })
    .from(sheetIssues)
    .innerJoin(accounts, eq(accounts.id, sheetIssues.by))
    .where(eq(sheetIssues.sheetId, sheetId))
    .orderBy(asc(sheetIssues.at), asc(sheetIssues.id))
    .all()
}

export function insertIssue(db: Db, row: typeof sheetIssues.$inferInsert): void {
  db.insert(sheetIssues).values(row).run()
}

export function listMoves(db: Db, sheetId: string) {
  const { move, from, to, reason, at } = sheetMoves
  return db
    .select({ move, from, to, reason, at, by: accounts.name })
    .from(sheetMoves)
    .innerJoin(accounts, eq(accounts.id, sheetMoves.by))
    .where(eq(sheetMoves.sheetId, sheetId))
    .orderBy(asc(sheetMoves.id))
    .all()
}

export function insertMove(db: Db, row: typeof sheetMoves.$inferInsert): void {
  db.insert(sheetMoves).values(row).run()
}

/** Members of a project who can sign in and be written to. */
export function listReachableMembers(db: Db, projectId: string) {
  const { id, name, email, organisationId, role, mayCheck, mayApprove } = accounts
  return db
    .select({ id, name, email, organisationId, role, mayCheck, mayApprove })
    .from(projectMembers)
    .innerJoin(accounts, eq(accounts.id, projectMembers.accountId))
    .where(and(eq(projectMembers.projectId, projectId), isNull(accounts.deactivatedAt)))
    .all()
}
