import type { Project } from '../../../shared/schemas/project'
import { ConflictError } from '../../errors'
import type { Db } from '../../db/client'
import type { FileStore } from '../../files/file-store'
import type { SignedIn } from '../../http/operation'
import { recordAudit } from '../audit/record-audit'
import { listFileIds } from '../files/files.queries'
import { change, type Deed, type ProjectWork } from './deed'
import { noProject } from './open-project'
import { deleteProject, findProject, updateProject } from './projects.queries'
import { readProject } from './projects.service'

/**
 * Says why a project must not be deleted, or null. Modules that keep what must outlive a project bring
 * one each.
 */
export type DeletionBar = (db: Db, projectId: string) => string | null

export interface DeletionParts {
  readonly files: FileStore
  readonly bars: readonly DeletionBar[]
}

/** Puts a project away: it can be read and restored, and nothing in it can change. */
export function archiveProject(work: ProjectWork, actor: SignedIn, projectId: string): Project {
  return change(work, actor, (deed) => {
    const project = findProject(deed.tx, projectId)
    if (!project) throw noProject(projectId)
    if (project.archivedAt === null) setArchived(deed, project, deed.at)
    return readProject(deed.tx, actor, projectId)
  })
}

export function restoreProject(work: ProjectWork, actor: SignedIn, projectId: string): Project {
  return change(work, actor, (deed) => {
    const project = findProject(deed.tx, projectId)
    if (!project) throw noProject(projectId)
    if (project.archivedAt !== null) setArchived(deed, project, null)
    return readProject(deed.tx, actor, projectId)
  })
}

type Row = NonNullable<ReturnType<typeof findProject>>

function setArchived({ tx, by, at }: Deed, project: Row, archivedAt: number | null): void {
  updateProject(tx, project.id, { archivedAt, updatedAt: at, updatedBy: by.accountId })
  recordAudit(tx, by, at, {
    action: archivedAt === null ? 'project.restored' : 'project.archived',
    subjectType: 'project',
    subjectId: project.id,
    subjectName: project.name,
    projectId: project.id,
    fromVersion: project.version,
    toVersion: project.version,
  })
}

/**
 * Deletes an archived project for good, with its members, gauges, lines, scenarios and files; the
 * audit trail stays. Rows go first: bytes without a row are swept later, rows without bytes would lie.
 *
 * @throws ConflictError while it is not archived, or where something in it must outlive it.
 */
export async function deleteProjectForGood(
  work: ProjectWork,
  actor: SignedIn,
  projectId: string,
  { files, bars }: DeletionParts,
): Promise<void> {
  const fileIds = change(work, actor, ({ tx, by, at }) => {
    const project = findProject(tx, projectId)
    if (!project) throw noProject(projectId)
    if (project.archivedAt === null) {
      throw new ConflictError(
        `The project "${project.name}" must be archived before it is deleted.`,
      )
    }
    const reason = bars.map((bar) => bar(tx, projectId)).find((text) => text !== null)
    if (reason) throw new ConflictError(reason)
    const ids = listFileIds(tx, projectId)
    recordAudit(tx, by, at, {
      action: 'project.deleted',
      subjectType: 'project',
      subjectId: projectId,
      subjectName: project.name,
      projectId,
      fromVersion: project.version,
      detail: { files: ids.length },
    })
    deleteProject(tx, projectId)
    return ids
  })
  await Promise.all(fileIds.map((id) => files.remove(id)))
}
