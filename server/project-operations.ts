import type { Operation } from './http/operation'
import { depotsOperations } from './modules/depots/depots.routes'
import { deskOperations } from './modules/desk/desk.routes'
import { filesOperations } from './modules/files/files.routes'
import type { FileWork } from './modules/files/files.service'
import { gaugesOperations } from './modules/gauges/gauges.routes'
import { linesOperations } from './modules/lines/lines.routes'
import { membersOperations } from './modules/members/members.routes'
import { projectsOperations } from './modules/projects/projects.routes'
import type { DeletionBar } from './modules/projects/put-away-project.service'
import { issuedSheetsBar } from './modules/sheets/issued-sheets-bar'
import { scenariosOperations } from './modules/scenarios/scenarios.routes'

/** Modules that keep what must outlive its project say so here. */
const DELETION_BARS: readonly DeletionBar[] = [issuedSheetsBar]

/** Every route of desk and projects. */
export function projectOperations(work: FileWork): readonly Operation[] {
  return [
    ...deskOperations(work.db),
    ...projectsOperations(work, { files: work.store, bars: DELETION_BARS }),
    ...membersOperations(work),
    ...gaugesOperations(work),
    ...linesOperations(work),
    ...scenariosOperations(work),
    ...filesOperations(work),
    ...depotsOperations(work),
  ]
}
