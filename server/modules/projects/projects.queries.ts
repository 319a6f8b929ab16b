import { and, count, desc, eq, isNotNull, isNull, sql } from 'drizzle-orm'
import type { z } from 'zod'
import { PAGE_SIZE } from '../../../shared/schemas/paging'
import type { projectsQuerySchema } from '../../../shared/schemas/project'
import type { Db } from '../../db/client'
import { lines, projectMembers, projects, scenarios } from '../../db/schema'
import {
  byName,
  changers,
  containsText,
  keptSelection,
  makers,
  offsetOf,
  ordered,
} from './kept.queries'

type ProjectsQuery = z.output<typeof projectsQuerySchema>
type NewRow = typeof projects.$inferInsert

const SORTS = {
  name: byName(projects.name),
  updated: projects.updatedAt,
  created: projects.createdAt,
}

const selection = {
  id: projects.id,
  name: projects.name,
  site: projects.site,
  client: projects.client,
  datum: projects.datum,
  timeZone: projects.timeZone,
  note: projects.note,
  memberRole: projectMembers.role,
  lines: sql<number>`(select count(*) from ${lines}
    where ${lines.projectId} = ${projects.id} and ${lines.archivedAt} is null)`,
  scenarios: sql<number>`(select count(*) from ${scenarios}
    join ${lines} on ${lines.id} = ${scenarios.lineId}
    where ${lines.projectId} = ${projects.id}
      and ${lines.archivedAt} is null and ${scenarios.archivedAt} is null)`,
  ...keptSelection(projects),
}

/** Projects that the account is a member of; there is no other way to read one. */
function selectOwn(db: Db, accountId: string) {
  return db
    .select(selection)
    .from(projects)
    .innerJoin(
      projectMembers,
      and(eq(projectMembers.projectId, projects.id), eq(projectMembers.accountId, accountId)),
    )
    .innerJoin(makers, eq(makers.id, projects.createdBy))
    .innerJoin(changers, eq(changers.id, projects.updatedBy))
    .$dynamic()
}

export function findOwnProject(db: Db, accountId: string, projectId: string) {
  return selectOwn(db, accountId).where(eq(projects.id, projectId)).get()
}

function matching({ search, archived }: Pick<ProjectsQuery, 'search' | 'archived'>) {
  return and(
    archived === 'yes' ? isNotNull(projects.archivedAt) : isNull(projects.archivedAt),
    containsText([projects.name, projects.site, projects.client], search),
  )
}

export function listOwnProjects(db: Db, accountId: string, query: ProjectsQuery) {
  return selectOwn(db, accountId)
    .where(matching(query))
    .orderBy(ordered(SORTS[query.sort], query.order), projects.id)
    .limit(PAGE_SIZE)
    .offset(offsetOf(query.page))
    .all()
}

export function countOwnProjects(db: Db, accountId: string, query: ProjectsQuery): number {
  return db
    .select({ total: count() })
    .from(projects)
    .innerJoin(projectMembers, eq(projectMembers.projectId, projects.id))
    .where(and(eq(projectMembers.accountId, accountId), matching(query)))
    .get()!.total
}

/** The most recently changed first. */
export function listRecentProjects(db: Db, accountId: string, most: number) {
  return selectOwn(db, accountId)
    .where(isNull(projects.archivedAt))
    .orderBy(desc(projects.updatedAt), projects.id)
    .limit(most)
    .all()
}

/** The row itself, whoever asks. */
export function findProject(db: Db, projectId: string) {
  return db.select().from(projects).where(eq(projects.id, projectId)).get()
}

export function insertProject(db: Db, row: NewRow): void {
  db.insert(projects).values(row).run()
}

export function updateProject(db: Db, projectId: string, row: Partial<NewRow>): void {
  db.update(projects).set(row).where(eq(projects.id, projectId)).run()
}

export function touchProject(
  db: Db,
  { id, ...row }: Pick<NewRow, 'id' | 'updatedAt' | 'updatedBy'>,
): void {
  updateProject(db, id, row)
}

/** With all that belongs to it; the audit trail stays. */
export function deleteProject(db: Db, projectId: string): void {
  db.delete(projects).where(eq(projects.id, projectId)).run()
}
