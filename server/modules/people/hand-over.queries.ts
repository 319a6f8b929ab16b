import { and, eq } from 'drizzle-orm'
import type { Db } from '../../db/client'
import { projectMembers, projects } from '../../db/schema'

/** Projects in which the account is a lead. */
export function listLedProjects(db: Db, accountId: string) {
  return db
    .select({ id: projects.id, name: projects.name })
    .from(projectMembers)
    .innerJoin(projects, eq(projects.id, projectMembers.projectId))
    .where(and(eq(projectMembers.accountId, accountId), eq(projectMembers.role, 'lead')))
    .all()
}

/** Makes the account a lead, as a new member where it was none. */
export function makeLead(db: Db, projectId: string, accountId: string, addedAt: number): void {
  db.insert(projectMembers)
    .values({ projectId, accountId, role: 'lead', addedAt })
    .onConflictDoUpdate({
      target: [projectMembers.projectId, projectMembers.accountId],
      set: { role: 'lead' },
    })
    .run()
}

export function makeReader(db: Db, projectId: string, accountId: string): void {
  db.update(projectMembers)
    .set({ role: 'reader' })
    .where(and(eq(projectMembers.projectId, projectId), eq(projectMembers.accountId, accountId)))
    .run()
}
