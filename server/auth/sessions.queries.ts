import { and, desc, eq, gt, lte, ne } from 'drizzle-orm'
import type { Db } from '../db/client'
import { sessions } from '../db/schema'

const SECOND = 1000

/** Open sessions of an account, the newest first. Their ids are handles that open nothing. */
export function listOpenSessions(db: Db, accountId: string, now: number) {
  const rows = db
    .select()
    .from(sessions)
    .where(and(eq(sessions.userId, accountId), gt(sessions.expiresAt, Math.floor(now / SECOND))))
    .orderBy(desc(sessions.createdAt), desc(sessions.id))
    .all()
  return rows.map((row) => ({ ...row, expiresAt: row.expiresAt * SECOND }))
}

/** Ends one session of an account; false where it has none of that handle. */
export function endSession(db: Db, accountId: string, handle: string): boolean {
  const { changes } = db
    .delete(sessions)
    .where(and(eq(sessions.userId, accountId), eq(sessions.id, handle)))
    .run()
  return changes > 0
}

export function endAllSessions(db: Db, accountId: string): number {
  return db.delete(sessions).where(eq(sessions.userId, accountId)).run().changes
}

export function endOtherSessions(db: Db, accountId: string, kept: string): number {
  return db
    .delete(sessions)
    .where(and(eq(sessions.userId, accountId), ne(sessions.id, kept)))
    .run().changes
}

export function deleteExpiredSessions(db: Db, now: number): void {
  db.delete(sessions)
    .where(lte(sessions.expiresAt, Math.floor(now / SECOND)))
    .run()
}
