import { and, asc, count, desc, eq, gt, isNull, lte } from 'drizzle-orm'
import type { Dot } from '../../../shared/schemas/class'
import type { Db } from '../../db/client'
import { classes, classGuesses } from '../../db/schema'

export type ClassRow = typeof classes.$inferSelect
export type GuessRow = typeof classGuesses.$inferSelect

export function insertClass(db: Db, row: typeof classes.$inferInsert): void {
  db.insert(classes).values(row).run()
}

export function findClass(db: Db, id: string): ClassRow | undefined {
  return db.select().from(classes).where(eq(classes.id, id)).get()
}

export function findClassByCode(db: Db, code: string): ClassRow | undefined {
  return db.select().from(classes).where(eq(classes.code, code)).get()
}

/** Classes of a trainer that are open at a moment, the newest first. */
export function listOpenClasses(db: Db, trainerId: string, at: number): readonly ClassRow[] {
  const isOpen = and(isNull(classes.closedAt), gt(classes.expiresAt, at))
  return db
    .select()
    .from(classes)
    .where(and(eq(classes.openedBy, trainerId), isOpen))
    .orderBy(desc(classes.openedAt))
    .all()
}

export function updateClass(
  db: Db,
  id: string,
  row: Partial<Pick<ClassRow, 'closedAt' | 'step' | 'scene'>>,
): void {
  db.update(classes).set(row).where(eq(classes.id, id)).run()
}

/** Deletes what has expired, with its guesses. */
export function deleteExpiredClasses(db: Db, at: number): void {
  db.delete(classes).where(lte(classes.expiresAt, at)).run()
}

/** Guesses of a scene by value, the smallest first. */
export function listDots(db: Db, classId: string, scene: string): readonly Dot[] {
  const { value } = classGuesses
  return db
    .select({ value, count: count() })
    .from(classGuesses)
    .where(and(eq(classGuesses.classId, classId), eq(classGuesses.scene, scene)))
    .groupBy(value)
    .orderBy(asc(value))
    .all()
}

export function countGuesses(db: Db, classId: string, scene: string): number {
  const here = and(eq(classGuesses.classId, classId), eq(classGuesses.scene, scene))
  return db.select({ total: count() }).from(classGuesses).where(here).get()!.total
}

export function findGuess(
  db: Db,
  { classId, scene, participant }: Omit<GuessRow, 'value'>,
): GuessRow | undefined {
  const here = and(
    eq(classGuesses.classId, classId),
    eq(classGuesses.scene, scene),
    eq(classGuesses.participant, participant),
  )
  return db.select().from(classGuesses).where(here).get()
}

/** One guess of a phone and scene; the latest counts. */
export function putGuess(db: Db, row: GuessRow): void {
  const { classId, scene, participant } = classGuesses
  db.insert(classGuesses)
    .values(row)
    .onConflictDoUpdate({ target: [classId, scene, participant], set: { value: row.value } })
    .run()
}
