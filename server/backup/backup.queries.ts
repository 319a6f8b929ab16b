import Database from 'better-sqlite3'
import { readMigrationFiles } from 'drizzle-orm/migrator'
import { fileURLToPath } from 'node:url'

const MIGRATIONS = fileURLToPath(new URL('../../drizzle', import.meta.url))

export interface FileRow {
  readonly id: string
  readonly sha256: string
  readonly mediaType: string
}

/** How long a backup waits for a writer [ms]. */
const PATIENCE = 10_000

/** Opens a database for one piece of work that changes nothing in it. */
export function reading<Result>(file: string, work: (connection: Database.Database) => Result) {
  const connection = new Database(file, { readonly: true, fileMustExist: true, timeout: PATIENCE })
  try {
    return work(connection)
  } finally {
    connection.close()
  }
}

/** Writes what the database holds at one moment into a new file, while others go on writing. */
export function writeSnapshot(databaseFile: string, snapshot: string): void {
  reading(databaseFile, (connection) => connection.prepare('VACUUM INTO ?').run(snapshot))
}

/** Files of projects, and those that were frozen with sheets. */
const PROJECT_FILES = 'SELECT id, sha256, media_type AS mediaType FROM project_files'
/** They have no smaller pictures beside them, whatever they are. */
const SHEET_FILES =
  "SELECT file_id AS id, sha256, 'application/octet-stream' AS mediaType FROM sheet_files"

/** A database from before there were sheets has no files of theirs. */
function filesOf(connection: Database.Database): string {
  const hasSheets =
    connection
      .prepare("SELECT 1 FROM sqlite_master WHERE type = 'table' AND name = 'sheet_files'")
      .get() !== undefined
  return hasSheets ? `${PROJECT_FILES} UNION ALL ${SHEET_FILES}` : PROJECT_FILES
}

export function listFileRows(databaseFile: string): readonly FileRow[] {
  return reading(
    databaseFile,
    (connection) => connection.prepare(`${filesOf(connection)} ORDER BY id`).all() as FileRow[],
  )
}

export function hasFileRow(databaseFile: string, id: string): boolean {
  const found = (connection: Database.Database) =>
    connection.prepare(`SELECT 1 FROM (${filesOf(connection)}) WHERE id = ?`).get(id) !== undefined
  return reading(databaseFile, found)
}

/** What is wrong with a database, in words; an empty list where it is whole. */
export function databaseFaults(databaseFile: string): readonly string[] {
  return reading(databaseFile, (connection) => {
    const integrity = connection.pragma('integrity_check') as { integrity_check: string }[]
    const broken = integrity.map((row) => row.integrity_check).filter((word) => word !== 'ok')
    const orphans = connection.pragma('foreign_key_check') as { table: string }[]
    return [...broken, ...orphans.map(({ table }) => `a row of ${table} refers to nothing`)]
  })
}

/** Hashes of the migrations that a database has been through. */
export function appliedMigrations(databaseFile: string): readonly string[] {
  return reading(databaseFile, (connection) => {
    const rows = connection.prepare('SELECT hash FROM __drizzle_migrations ORDER BY created_at')
    return (rows.all() as { hash: string }[]).map(({ hash }) => hash)
  })
}

/** Hashes of the migrations that this program knows. */
export function knownMigrations(): readonly string[] {
  return readMigrationFiles({ migrationsFolder: MIGRATIONS }).map(({ hash }) => hash)
}

/**
 * Takes a database out of use: nobody else has it open, and all of it stands in its one file.
 *
 * - `free`: done
 * - `in-use`: somebody has it open
 * - `broken`: it is no database that can be read
 */
export function takeOutOfUse(databaseFile: string): 'free' | 'in-use' | 'broken' {
  const connection = new Database(databaseFile, { timeout: 0 })
  try {
    connection.pragma('journal_mode = DELETE')
    return 'free'
  } catch (error) {
    const code = error instanceof Error && 'code' in error ? String(error.code) : ''
    return /^SQLITE_(?:BUSY|LOCKED)/.test(code) ? 'in-use' : 'broken'
  } finally {
    connection.close()
  }
}
