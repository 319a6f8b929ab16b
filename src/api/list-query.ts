/** Search, order and page of a list, as they stand behind its address. */
export interface ListQuery {
  readonly search?: string
  readonly page?: number
  readonly sort?: string
  readonly order?: 'asc' | 'desc'
  readonly archived?: 'no' | 'yes'
  readonly verdict?: string
}

/** The query with its question mark; empty without any. */
export function queryOf(query: ListQuery): string {
  const entries = Object.entries(query).filter(([, value]) => value !== undefined && value !== '')
  const search = new URLSearchParams(entries.map(([key, value]) => [key, String(value)]))
  return search.size === 0 ? '' : `?${search.toString()}`
}
