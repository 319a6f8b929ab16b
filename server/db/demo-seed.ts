import { eq, sql } from 'drizzle-orm'
import type { Db } from './client'
import { meta } from './schema'

/** A set of invented people or projects that demonstration mode starts with. */
export interface DemoSeed {
  /** Never changes: the database remembers it. */
  readonly name: string
  readonly run: (db: Db) => void
}

/** One that takes its time, and works on the database that it was made with. */
export interface SlowDemoSeed {
  readonly name: string
  readonly run: () => Promise<void>
}

const keyOf = (name: string) => `demo_seeded:${name}`

function isSeeded(db: Db, name: string): boolean {
  return (
    db
      .select()
      .from(meta)
      .where(eq(meta.key, keyOf(name)))
      .get() !== undefined
  )
}

function mark(db: Db, name: string): void {
  db.insert(meta)
    .values({ key: keyOf(name), value: new Date().toISOString() })
    .run()
}

/**
 * Runs each seed once in the life of a database, in one transaction with its mark: what somebody
 * deletes from the demo stays deleted, and a seed that fails leaves nothing behind.
 */
export function seedDemoOnce(db: Db, seeds: readonly DemoSeed[]): void {
  for (const seed of seeds) {
    db.transaction((tx) => {
      if (isSeeded(tx, seed.name)) return
      seed.run(tx)
      mark(tx, seed.name)
    })
  }
}

/**
 * The same for a seed that takes its time. Its transaction stays open meanwhile: it runs before the
 * server listens, when nobody else writes.
 */
export async function seedSlowlyOnce(db: Db, seed: SlowDemoSeed): Promise<void> {
  if (isSeeded(db, seed.name)) return
  db.run(sql`begin immediate`)
  try {
    await seed.run()
    mark(db, seed.name)
    db.run(sql`commit`)
  } catch (error) {
    db.run(sql`rollback`)
    throw error
  }
}
