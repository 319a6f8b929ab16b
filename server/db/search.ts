import { type Column, or, type SQL, sql } from 'drizzle-orm'

/** True where one of the columns contains the words, whatever their capitals; for no words always. */
export function containsWords(words: string, ...columns: readonly Column[]): SQL | undefined {
  if (words === '') return undefined
  return or(...columns.map((column) => sql`instr(lower(${column}), lower(${words})) > 0`))
}
