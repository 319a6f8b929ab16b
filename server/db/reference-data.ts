import { eq } from 'drizzle-orm'
import { BARRIERS } from '../../shared/catalogue/barriers'
import { CHECK_BASES } from '../../shared/catalogue/check-bases'
import { GROUNDS } from '../../shared/catalogue/grounds'
import { BARRIER_SOURCE, GROUND_SOURCE } from '../../shared/catalogue/sources'
import type { Db } from './client'
import { barriers, checkBases, grounds } from './schema'

type CatalogueTable = typeof barriers | typeof grounds | typeof checkBases

/**
 * Writes the catalogue that the program ships, in both modes and at every start.
 *
 * A missing row is added. A row that still has `origin: 'reference'` follows the shipped data and
 * gets the next revision when they differ. A row that somebody added or changed (`origin: 'user'`)
 * is left alone, and so is a row that is no longer shipped: an older calculation may name it.
 */
export function writeReferenceData(db: Db): void {
  db.transaction((tx) => {
    BARRIERS.forEach((row, position) => {
      writeRow(tx, barriers, { ...row, position, source: BARRIER_SOURCE })
    })
    GROUNDS.forEach((row, position) => {
      writeRow(tx, grounds, { ...row, position, source: GROUND_SOURCE })
    })
    CHECK_BASES.forEach((row, position) => {
      writeRow(tx, checkBases, { ...row, position })
    })
  })
}

function writeRow<T extends CatalogueTable>(
  db: Db,
  table: T,
  shipped: Omit<T['$inferInsert'], 'origin' | 'revision'>,
): void {
  const stored = db
    .select()
    .from(table as CatalogueTable)
    .where(eq(table.id, shipped.id))
    .get()
  if (!stored) {
    db.insert(table as CatalogueTable)
      .values({ ...shipped, origin: 'reference' })
      .run()
    return
  }
  const { origin, revision, ...figures } = stored
  if (origin === 'user' || isSame(figures, { ...shipped })) return
  db.update(table as CatalogueTable)
    .set({ ...shipped, revision: revision + 1 })
    .where(eq(table.id, shipped.id))
    .run()
}

/** Compares what the table keeps; a field of the shipped data without a column does not count. */
function isSame(stored: Record<string, unknown>, shipped: Record<string, unknown>): boolean {
  return Object.entries(stored).every(([column, value]) => value === (shipped[column] ?? null))
}
