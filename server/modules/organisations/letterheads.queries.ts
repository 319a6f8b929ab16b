import { eq } from 'drizzle-orm'
import type { Db } from '../../db/client'
import { letterheads } from '../../db/schema'

export type LetterheadRow = typeof letterheads.$inferSelect

export function findLetterhead(db: Db, organisationId: string): LetterheadRow | undefined {
  return db.select().from(letterheads).where(eq(letterheads.organisationId, organisationId)).get()
}

export function writeLetterhead(db: Db, row: LetterheadRow): void {
  const { organisationId: target, ...set } = row
  db.insert(letterheads)
    .values({ organisationId: target, ...set })
    .onConflictDoUpdate({ target: letterheads.organisationId, set })
    .run()
}
