import { ConflictError, NotFoundError } from '../../errors'
import type { Db } from '../../db/client'
import { findProject } from './projects.queries'

/** The one answer for what is not there and for what somebody may not know of. */
export function noProject(projectId: string): NotFoundError {
  return new NotFoundError(`project: "${projectId}" does not exist, or not for you`)
}

/**
 * The project, where its contents may change.
 *
 * @throws NotFoundError, or ConflictError while it is archived.
 */
export function openProject(db: Db, projectId: string) {
  const project = findProject(db, projectId)
  if (!project) throw noProject(projectId)
  if (project.archivedAt !== null) {
    throw new ConflictError(`The project "${project.name}" is archived; restore it first.`)
  }
  return project
}

/**
 * Refuses a change that was made on an older version.
 *
 * @throws ConflictError
 */
export function assertVersion(
  kept: { readonly version: number; readonly name: string },
  madeOn: number,
): void {
  if (kept.version === madeOn) return
  throw new ConflictError(
    `"${kept.name}" was changed meanwhile: version ${kept.version} is there, ` +
      `yours was made on ${madeOn}. Load it again, then repeat your change.`,
  )
}

/** Fields of a change that differ from what is there, for the audit trail. */
export function changedFields<Row extends object>(
  before: Row,
  after: Partial<Row>,
): readonly string[] {
  return Object.entries(after)
    .filter(([field, value]) => value !== undefined && before[field as keyof Row] !== value)
    .map(([field]) => field)
}
