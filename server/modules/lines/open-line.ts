import type { Db } from '../../db/client'
import { ConflictError, NotFoundError } from '../../errors'
import { openProject } from '../projects/open-project'
import { findLine, listStations } from './lines.queries'

export interface LinePlace {
  readonly projectId: string
  readonly lineId: string
}

/** @throws NotFoundError for a line that is not in the project. */
export function lineAt(db: Db, { projectId, lineId }: LinePlace) {
  const line = findLine(db, projectId, lineId)
  if (!line) throw new NotFoundError(`line: "${lineId}" does not exist in this project`)
  return { ...line, stations: listStations(db, lineId) }
}

/**
 * The line, where it and its scenarios may change.
 *
 * @throws NotFoundError, or ConflictError while the line or its project is archived.
 */
export function openLine(db: Db, place: LinePlace) {
  openProject(db, place.projectId)
  const line = lineAt(db, place)
  if (line.archivedAt !== null) {
    throw new ConflictError(`The line "${line.name}" is archived; restore it first.`)
  }
  return line
}
