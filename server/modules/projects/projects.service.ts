import { randomUUID } from 'node:crypto'
import type { z } from 'zod'
import { effectiveMember } from '../../../shared/access/rules'
import { PAGE_SIZE } from '../../../shared/schemas/paging'
import type {
  newProjectSchema,
  Project,
  projectChangeSchema,
  projectsPageSchema,
  projectsQuerySchema,
} from '../../../shared/schemas/project'
import type { Db } from '../../db/client'
import type { SignedIn } from '../../http/operation'
import { recordAudit } from '../audit/record-audit'
import { insertMember } from '../members/members.queries'
import { change, type Deed, type ProjectWork } from './deed'
import { assertVersion, changedFields, noProject, openProject } from './open-project'
import {
  countOwnProjects,
  findOwnProject,
  insertProject,
  listOwnProjects,
  updateProject,
} from './projects.queries'

type NewProject = z.output<typeof newProjectSchema>
type Reader = Pick<SignedIn, 'accountId' | 'role'>
type ProjectRow = NonNullable<ReturnType<typeof findOwnProject>>

/** A row as somebody sees it: the role that counts for them, not the stored one. */
export function shownProject({ memberRole, ...project }: ProjectRow, reader: Reader): Project {
  return { ...project, myRole: effectiveMember(reader.role, memberRole) ?? 'reader' }
}

/** Projects of whoever asks; an organisation in common gives no access. */
export function listProjects(
  db: Db,
  reader: Reader,
  query: z.output<typeof projectsQuerySchema>,
): z.output<typeof projectsPageSchema> {
  const rows = listOwnProjects(db, reader.accountId, query)
  return {
    items: rows.map((row) => shownProject(row, reader)),
    page: query.page,
    pageSize: PAGE_SIZE,
    total: countOwnProjects(db, reader.accountId, query),
  }
}

/** @throws NotFoundError */
export function readProject(db: Db, reader: Reader, projectId: string): Project {
  const row = findOwnProject(db, reader.accountId, projectId)
  if (!row) throw noProject(projectId)
  return shownProject(row, reader)
}

/** Makes a project that whoever makes it leads. */
export function createProject(work: ProjectWork, actor: SignedIn, input: NewProject): Project {
  return change(work, actor, (deed) => {
    const id = makeProject(deed, input)
    recordAudit(deed.tx, deed.by, deed.at, {
      action: 'project.created',
      subjectType: 'project',
      subjectId: id,
      subjectName: input.name,
      projectId: id,
      toVersion: 1,
    })
    return readProject(deed.tx, actor, id)
  })
}

/** A project with its first lead; the caller writes the audit trail. */
export function makeProject(
  { tx, by, at }: Deed,
  input: NewProject,
  id = randomUUID() as string,
): string {
  insertProject(tx, {
    id,
    ...input,
    createdAt: at,
    createdBy: by.accountId,
    updatedAt: at,
    updatedBy: by.accountId,
  })
  insertMember(tx, { projectId: id, accountId: by.accountId, role: 'lead', addedAt: at })
  return id
}

/** @throws ConflictError for an older version, or while the project is archived. */
export function changeProject(
  work: ProjectWork,
  actor: SignedIn,
  projectId: string,
  { version, ...input }: z.output<typeof projectChangeSchema>,
): Project {
  return change(work, actor, ({ tx, by, at }) => {
    const before = openProject(tx, projectId)
    assertVersion(before, version)
    updateProject(tx, projectId, {
      ...input,
      version: version + 1,
      updatedAt: at,
      updatedBy: by.accountId,
    })
    recordAudit(tx, by, at, {
      action: 'project.changed',
      subjectType: 'project',
      subjectId: projectId,
      subjectName: input.name ?? before.name,
      projectId,
      fromVersion: version,
      toVersion: version + 1,
      detail: { fields: changedFields(before, input) },
    })
    return readProject(tx, actor, projectId)
  })
}
