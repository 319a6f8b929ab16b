import { fileURLToPath } from 'node:url'
import type { BetterSQLite3Database } from 'drizzle-orm/better-sqlite3'
import { migrate } from 'drizzle-orm/better-sqlite3/migrator'
import type { Mode } from '../../shared/schemas/health'
import type { Db } from './client'
import { type DemoSeed, seedDemoOnce } from './demo-seed'
import { writeReferenceData } from './reference-data'
import type * as schema from './schema'

const MIGRATIONS = fileURLToPath(new URL('../../drizzle', import.meta.url))

export interface Preparation {
  readonly mode: Mode
  readonly demoSeeds: readonly DemoSeed[]
}

/** Brings any database, new or old, to the state in which the server can work with it. */
export function prepareDatabase(db: Db, { mode, demoSeeds }: Preparation): void {
  // The migrator is typed for the concrete driver; `openDatabase` makes no other.
  migrate(db as BetterSQLite3Database<typeof schema>, { migrationsFolder: MIGRATIONS })
  writeReferenceData(db)
  if (mode === 'demonstration') seedDemoOnce(db, demoSeeds)
}
