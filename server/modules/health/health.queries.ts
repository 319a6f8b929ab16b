import type { Db } from '../../db/client'
import { meta } from '../../db/schema'

/** True where a read of the database succeeds. */
export function isDatabaseReachable(db: Db): boolean {
  try {
    db.select().from(meta).limit(1).all()
    return true
  } catch {
    return false
  }
}
