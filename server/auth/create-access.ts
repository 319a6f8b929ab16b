import type { Db } from '../db/client'
import type { Access } from '../http/mount-operations'
import { findMemberRole } from './access.queries'
import type { Sessions } from './sessions'

/** Who sends a request, by its session; what they are in a project, by its members. */
export function createAccess(db: Db, sessions: Pick<Sessions, 'read'>): Access {
  return {
    signedIn: sessions.read,
    memberRole: (projectId, accountId) => findMemberRole(db, projectId, accountId),
  }
}
