import type { z } from 'zod'
import type { deskSchema } from '../../../shared/schemas/project'
import type { Db } from '../../db/client'
import type { SignedIn } from '../../http/operation'
import { listRecentProjects } from '../projects/projects.queries'
import { shownProject } from '../projects/projects.service'
import { waitingSheets } from '../sheets/waiting-sheets.service'
import { findLineOfScenario, listChanges } from './desk.queries'

type Desk = z.output<typeof deskSchema>
type Change = ReturnType<typeof listChanges>[number]

/** A desk shows what is at hand; the list of projects shows the rest. */
const MOST_PROJECTS = 20
const MOST_CHANGES = 30

/** My projects, the last changed first, and what changed in them; nothing of others. */
export function readDesk(db: Db, actor: SignedIn): Desk {
  const rows = listRecentProjects(db, actor.accountId, MOST_PROJECTS)
  const changes = rows
    .flatMap(({ id, name }) =>
      listChanges(db, id, MOST_CHANGES).map((entry) => ({ ...entry, project: { id, name } })),
    )
    .sort((a, b) => b.id - a.id)
    .slice(0, MOST_CHANGES)
  return {
    projects: rows.map((row) => shownProject(row, actor)),
    waiting: [...waitingSheets(db, actor)],
    changes: changes.map((entry) => shownChange(db, entry)),
  }
}

function shownChange(db: Db, entry: Change & Pick<Desk['changes'][number], 'project'>) {
  const { at, actorName, action, subjectType, subjectId, subjectName, project } = entry
  const scenarioLine = subjectType === 'scenario' ? findLineOfScenario(db, subjectId) : null
  const lineId = subjectType === 'line' ? subjectId : scenarioLine
  const scenarioId = scenarioLine === null ? null : subjectId
  return { at, actorName, action, subjectType, subjectName, project, lineId, scenarioId }
}
