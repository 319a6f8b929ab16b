import { and, count, eq, gt, isNull } from 'drizzle-orm'
import type { Db } from '../../db/client'
import { passwordResets } from '../../db/schema'

export type ResetRow = typeof passwordResets.$inferSelect

export function insertReset(db: Db, reset: typeof passwordResets.$inferInsert): void {
  db.insert(passwordResets).values(reset).run()
}

/** A reset that can still be used. */
export function findOpenReset(db: Db, tokenHash: string, now: number): ResetRow | undefined {
  return db
    .select()
    .from(passwordResets)
    .where(
      and(
        eq(passwordResets.tokenHash, tokenHash),
        isNull(passwordResets.usedAt),
        gt(passwordResets.expiresAt, now),
      ),
    )
    .get()
}

export function countOpenResets(db: Db, accountId: string, now: number): number {
  return (
    db
      .select({ total: count() })
      .from(passwordResets)
      .where(
        and(
          eq(passwordResets.accountId, accountId),
          isNull(passwordResets.usedAt),
          gt(passwordResets.expiresAt, now),
        ),
      )
      .get()?.total ?? 0
  )
}

/** Ends every reset of an account, used or not: one that was used takes the others with it. */
export function voidResets(db: Db, accountId: string, now: number): void {
  db.update(passwordResets)
    .set({ usedAt: now })
    .where(and(eq(passwordResets.accountId, accountId), isNull(passwordResets.usedAt)))
    .run()
}
