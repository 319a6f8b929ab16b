import { asc, type Column, getTableColumns } from 'drizzle-orm'
import type { Db } from '../../db/client'
import { barriers, checkBases, grounds } from '../../db/schema'

export function listBarriers(db: Db) {
  return db
    .select(shownColumns(getTableColumns(barriers)))
    .from(barriers)
    .orderBy(asc(barriers.diameter), asc(barriers.position))
    .all()
}

export function listGrounds(db: Db) {
  return db
    .select(shownColumns(getTableColumns(grounds)))
    .from(grounds)
    .orderBy(asc(grounds.position), asc(grounds.id))
    .all()
}

export function listCheckBases(db: Db) {
  return db
    .select(shownColumns(getTableColumns(checkBases)))
    .from(checkBases)
    .orderBy(asc(checkBases.position), asc(checkBases.id))
    .all()
}

/** All columns but those that only the database needs. */
function shownColumns<Columns extends Record<'position' | 'origin', Column>>(columns: Columns) {
  const shown = Object.entries(columns).filter(([name]) => name !== 'position' && name !== 'origin')
  return Object.fromEntries(shown) as Omit<Columns, 'position' | 'origin'>
}
