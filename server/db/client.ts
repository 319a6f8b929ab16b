import { mkdirSync } from 'node:fs'
import { dirname } from 'node:path'
import Database, { type RunResult } from 'better-sqlite3'
import { drizzle } from 'drizzle-orm/better-sqlite3'
import type { BaseSQLiteDatabase } from 'drizzle-orm/sqlite-core'
import * as schema from './schema'

/** A database or a transaction in it: whatever runs queries. */
export type Db = BaseSQLiteDatabase<'sync', RunResult, typeof schema>

export interface OpenDatabase {
  readonly db: Db
  readonly close: () => void
}

export const IN_MEMORY = ':memory:'

/** Opens the file, or makes it and its folder. The tables are `migrateDatabase`'s work. */
export function openDatabase(file: string): OpenDatabase {
  if (file !== IN_MEMORY) mkdirSync(dirname(file), { recursive: true })
  const connection = new Database(file)
  // Readers do not wait for the writer; an answered write survives a power cut (FULL).
  connection.pragma('journal_mode = WAL')
  connection.pragma('synchronous = FULL')
  connection.pragma('foreign_keys = ON')
  connection.pragma('busy_timeout = 5000')
  return {
    db: drizzle({ client: connection, schema }),
    close: () => {
      connection.close()
    },
  }
}
