import type { z } from 'zod'
import { type Fault, OutOfRangeError, showValue } from '../../../shared/errors'
import { lineFaults, lineWarnings, type Survey } from '../../../shared/schemas/line-faults'
import { markFaults } from '../../../shared/schemas/mark'
import { PAGE_SIZE } from '../../../shared/schemas/paging'
import type {
  Line,
  lineChangeSchema,
  linesPageSchema,
  linesQuerySchema,
  newLineSchema,
} from '../../../shared/schemas/project'
import type { Db } from '../../db/client'
import { isImage } from '../../files/media-type'
import { listGrounds } from '../catalogue/catalogue.queries'
import { findFile } from '../files/files.queries'
import { change, type Deed, type Doer, noteChange, type ProjectWork } from '../projects/deed'
import { assertVersion, changedFields, openProject } from '../projects/open-project'
import { recomputeScenarios } from '../scenarios/scenario-rows'
import { copyLine, makeLine } from './line-rows'
import { countLines, listLines, replaceStations, updateLine } from './lines.queries'
import { lineAt, type LinePlace, openLine } from './open-line'

type NewLine = z.output<typeof newLineSchema>
type LineChange = z.output<typeof lineChangeSchema>

export function readLines(
  db: Db,
  projectId: string,
  query: z.output<typeof linesQuerySchema>,
): z.output<typeof linesPageSchema> {
  return {
    items: listLines(db, projectId, query),
    page: query.page,
    pageSize: PAGE_SIZE,
    total: countLines(db, projectId, query),
  }
}

/** A line with its survey, and with what looks like a slip in it. */
export function readLine(db: Db, place: LinePlace): Line {
  const line = lineAt(db, place)
  const known = listGrounds(db).map(({ id }) => id)
  return { ...line, warnings: [...lineWarnings(line.stations, known, line.sectionLength)] }
}

type Whole = Survey & Pick<Line, 'marks' | 'ends' | 'background'>

/** @throws OutOfRangeError for a survey, a mark or a picture that cannot be used. */
function assertSurvey(db: Db, projectId: string, line: Whole): void {
  const surveyed = lineFaults(line)
  if (surveyed.length > 0) throw new OutOfRangeError(surveyed)
  const faults = [...markFaults(line), ...pictureFaults(db, projectId, line.background)]
  if (faults.length > 0) throw new OutOfRangeError(faults)
}

function pictureFaults(db: Db, projectId: string, background: Line['background']): Fault[] {
  if (background === null) return []
  const file = findFile(db, projectId, background.fileId)
  if (file && isImage(file.mediaType)) return []
  const [path, value] = ['background.fileId', background.fileId]
  const allowed = 'a picture among the files of the project'
  const message = `${path}: ${showValue(value)} is not allowed; it must be ${allowed}`
  return [{ path, value, allowed, unit: '–', message }]
}

const subject = (id: string, name: string) => ({
  subjectType: 'line',
  subjectId: id,
  subjectName: name,
})

/** @throws OutOfRangeError for a survey that cannot be used. */
export function createLine(
  work: ProjectWork,
  actor: Doer,
  projectId: string,
  input: NewLine,
): Line {
  return change(work, actor, (deed) => {
    openProject(deed.tx, projectId)
    assertSurvey(deed.tx, projectId, input)
    const lineId = makeLine(deed, projectId, input)
    noteChange(deed, projectId, {
      ...subject(lineId, input.name),
      action: 'line.created',
      toVersion: 1,
      detail: { stations: input.stations.length },
    })
    return readLine(deed.tx, { projectId, lineId })
  })
}

/**
 * Changes a line. Stations replace all that were there; a changed survey computes the line's
 * scenarios again.
 *
 * @throws ConflictError for an older version, OutOfRangeError for a survey that cannot be used.
 */
export function changeLine(
  work: ProjectWork,
  actor: Doer,
  place: LinePlace,
  { version, ...input }: LineChange,
): Line {
  return change(work, actor, (deed) => {
    const before = openLine(deed.tx, place)
    assertVersion(before, version)
    const { stations, ...fields } = input
    const survey = { ...before, ...input }
    assertSurvey(deed.tx, place.projectId, survey)
    const isNewSurvey = JSON.stringify(surveyOf(before)) !== JSON.stringify(surveyOf(survey))
    const { at, by } = deed
    const changed = { version: version + 1, updatedAt: at, updatedBy: by.accountId }
    updateLine(deed.tx, place.lineId, { ...fields, ...changed })
    if (stations && isNewSurvey) replaceStations(deed.tx, place.lineId, stations)
    noteChange(deed, place.projectId, {
      ...subject(place.lineId, survey.name),
      action: 'line.changed',
      fromVersion: version,
      toVersion: version + 1,
      detail: {
        fields: [
          ...changedFields(before, fields),
          ...(isNewSurvey && stations ? ['stations'] : []),
        ],
        ...(isNewSurvey ? { recomputed: recomputeScenarios(deed, survey) } : {}),
      },
    })
    return readLine(deed.tx, place)
  })
}

const surveyOf = ({ stations, sectionLength, marks }: Survey) => ({
  stations,
  sectionLength,
  turns: marks?.filter(({ kind }) => kind === 'turn'),
})

/** A copy of the line in the same project, with its survey and its scenarios as they stand. */
export function duplicateLine(
  work: ProjectWork,
  actor: Doer,
  place: LinePlace,
  name: string,
): Line {
  return change(work, actor, (deed) => {
    openProject(deed.tx, place.projectId)
    const lineId = copyLine(deed, place, { projectId: place.projectId, name })
    noteChange(deed, place.projectId, {
      ...subject(lineId, name),
      action: 'line.duplicated',
      toVersion: 1,
      detail: { from: place.lineId },
    })
    return readLine(deed.tx, { ...place, lineId })
  })
}

export function archiveLine(work: ProjectWork, actor: Doer, place: LinePlace): Line {
  return change(work, actor, (deed) => setArchived(deed, place, deed.at))
}

export function restoreLine(work: ProjectWork, actor: Doer, place: LinePlace): Line {
  return change(work, actor, (deed) => setArchived(deed, place, null))
}

function setArchived(deed: Deed, place: LinePlace, archivedAt: number | null): Line {
  const { tx, by, at } = deed
  openProject(tx, place.projectId)
  const line = lineAt(tx, place)
  if ((line.archivedAt === null) === (archivedAt === null)) return readLine(tx, place)
  updateLine(tx, line.id, { archivedAt, updatedAt: at, updatedBy: by.accountId })
  noteChange(deed, place.projectId, {
    ...subject(line.id, line.name),
    action: archivedAt === null ? 'line.restored' : 'line.archived',
    fromVersion: line.version,
    toVersion: line.version,
  })
  return readLine(tx, place)
}
