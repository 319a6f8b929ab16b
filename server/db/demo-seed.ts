import { eq } from 'drizzle-orm'
import type { Db } from './client'
import { meta } from './schema'

/** A set of invented people or projects that demonstration mode starts with. */
export interface DemoSeed {
  /** Never changes: the database remembers it. */
  readonly name: string
  readonly run: (db: Db) => void
}

/**
 * Runs each seed once in the life of a database, in one transaction with its mark: what somebody
 * deletes from the demo stays deleted, and a seed that fails leaves nothing behind.
 */
export function seedDemoOnce(db: Db, seeds: readonly DemoSeed[]): void {
  for (const seed of seeds) {
    const key = `demo_seeded:${seed.name}`
    db.transaction((tx) => {
      if (tx.select().from(meta).where(eq(meta.key, key)).get()) return
      seed.run(tx)
      tx.insert(meta).values({ key, value: new Date().toISOString() }).run()
    })
  }
}
