import type { Operation } from './http/operation'
import { depotsOperations } from './modules/depots/depots.routes'
import { deskOperations } from './modules/desk/desk.routes'
import { filesOperations } from './modules/files/files.routes'
import type { FileWork } from './modules/files/files.service'
import { forecastsOperations } from './modules/forecasts/forecasts.routes'
import { gaugesOperations } from './modules/gauges/gauges.routes'
import { linesOperations } from './modules/lines/lines.routes'
import { membersOperations } from './modules/members/members.routes'
import { projectsOperations } from './modules/projects/projects.routes'
import type { DeletionBar } from './modules/projects/put-away-project.service'
import { issuedSheetsBar } from './modules/sheets/issued-sheets-bar'
import { ordersBar } from './modules/orders/orders-bar'
import { scenariosOperations } from './modules/scenarios/scenarios.routes'

/** Modules that keep what must outlive its project say so here. */
const deletionBars = ({ now }: FileWork): readonly DeletionBar[] => [
  issuedSheetsBar,
  ordersBar(now),
]

/** Every route of desk and projects. */
export function projectOperations(work: FileWork): readonly Operation[] {
  return [
    ...deskOperations(work.db),
    ...projectsOperations(work, { files: work.store, bars: deletionBars(work) }),
    ...membersOperations(work),
    ...gaugesOperations(work),
    ...forecastsOperations(work),
    ...linesOperations(work),
    ...scenariosOperations(work),
    ...filesOperations(work),
    ...depotsOperations(work),
  ]
}
