import { and, eq } from 'drizzle-orm'
import type { MemberRole } from '../../shared/access/roles'
import type { Db } from '../db/client'
import { projectMembers } from '../db/schema'

export function findMemberRole(db: Db, projectId: string, accountId: string): MemberRole | null {
  const found = db
    .select({ role: projectMembers.role })
    .from(projectMembers)
    .where(and(eq(projectMembers.projectId, projectId), eq(projectMembers.accountId, accountId)))
    .get()
  return found?.role ?? null
}
