import type { Db } from './client'

/**
 * One change as a whole, or not at all. It asks for the right to write before it reads, so that
 * nothing changes between what it reads and what it writes.
 */
export function write<Result>(db: Db, change: (tx: Db) => Result): Result {
  return db.transaction(change, { behavior: 'immediate' })
}
