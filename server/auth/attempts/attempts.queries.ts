import { eq, lt } from 'drizzle-orm'
import type { Db } from '../../db/client'
import { attempts } from '../../db/schema'

export type AttemptRow = typeof attempts.$inferSelect

export function findAttempts(db: Db, key: string): AttemptRow | undefined {
  return db.select().from(attempts).where(eq(attempts.key, key)).get()
}

export function writeAttempts(db: Db, row: AttemptRow): void {
  const { count, lastAt } = row
  db.insert(attempts)
    .values(row)
    .onConflictDoUpdate({ target: attempts.key, set: { count, lastAt } })
    .run()
}

export function deleteAttempts(db: Db, key: string): void {
  db.delete(attempts).where(eq(attempts.key, key)).run()
}

export function deleteAttemptsBefore(db: Db, moment: number): void {
  db.delete(attempts).where(lt(attempts.lastAt, moment)).run()
}
