import { type Column, or, type SQL, sql } from 'drizzle-orm'
import { alias } from 'drizzle-orm/sqlite-core'
import { accounts } from '../../db/schema'
import { PAGE_SIZE } from '../../../shared/schemas/paging'

/** Accounts under a second name each, for "made by" and "changed by" in one row. */
export const makers = alias(accounts, 'makers')
export const changers = alias(accounts, 'changers')

interface KeptColumns<C extends Column> {
  readonly createdAt: C
  readonly updatedAt: C
  readonly archivedAt: Column
  readonly version: C
}

/** When and by whom something was made and changed, as answers carry it; join makers and changers. */
export function keptSelection<T extends KeptColumns<Column>>(table: T) {
  return {
    createdAt: table.createdAt as T['createdAt'],
    createdBy: { id: makers.id, name: makers.name },
    updatedAt: table.updatedAt as T['updatedAt'],
    updatedBy: { id: changers.id, name: changers.name },
    archivedAt: table.archivedAt as T['archivedAt'],
    version: table.version as T['version'],
  }
}

/** True where any of the columns contains the text, as it stands: % and _ are no wildcards. */
export function containsText(columns: readonly Column[], text: string): SQL | undefined {
  if (text === '') return undefined
  const pattern = `%${text.replace(/[\\%_]/g, (sign) => `\\${sign}`)}%`
  return or(...columns.map((column) => sql`${column} like ${pattern} escape '\\'`))
}

/** Rows before a page. */
export function offsetOf(page: number): number {
  return (page - 1) * PAGE_SIZE
}

/** Order of a column in the direction that was asked for. */
export function ordered(column: Column | SQL, order: 'asc' | 'desc'): SQL {
  return order === 'asc' ? sql`${column} asc` : sql`${column} desc`
}

/** Names in the order of an index of words: capitals do not count. */
export function byName(column: Column): SQL {
  return sql`lower(${column})`
}
