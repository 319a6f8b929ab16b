import type { z } from 'zod'
import { PAGE_SIZE } from '../../../shared/schemas/paging'
import type {
  newScenarioSchema,
  Scenario,
  scenariosPageSchema,
} from '../../../shared/schemas/project'
import type { Db } from '../../db/client'
import { type LinePlace, lineAt, openLine } from '../lines/open-line'
import { change, type Deed, type Doer, noteChange, type ProjectWork } from '../projects/deed'
import { scenarioAt, type ScenarioPlace } from './open-scenario'
import { assertComputable, makeScenario } from './scenario-rows'
import {
  countScenarios,
  listScenarios,
  type ScenariosQuery,
  updateScenario,
} from './scenarios.queries'

/** A page of all scenarios of a line in one table. */
export function readScenarios(
  db: Db,
  place: LinePlace,
  query: ScenariosQuery,
): z.output<typeof scenariosPageSchema> {
  lineAt(db, place)
  return {
    items: listScenarios(db, place.lineId, query),
    page: query.page,
    pageSize: PAGE_SIZE,
    total: countScenarios(db, place.lineId, query),
  }
}

export function readScenario(db: Db, place: ScenarioPlace): Scenario {
  lineAt(db, place)
  return scenarioAt(db, place)
}

export const scenarioSubject = (id: string, name: string) => ({
  subjectType: 'scenario',
  subjectId: id,
  subjectName: name,
})

/** @throws OutOfRangeError for a content that cannot be computed on the line. */
export function createScenario(
  work: ProjectWork,
  actor: Doer,
  place: LinePlace,
  input: z.output<typeof newScenarioSchema>,
): Scenario {
  return change(work, actor, (deed) => {
    const line = openLine(deed.tx, place)
    assertComputable(input.content, line)
    const scenarioId = makeScenario(deed, line, input)
    return noteNew(deed, { ...place, scenarioId }, 'scenario.created')
  })
}

/** A copy beside the scenario: its present state, without its history. */
export function duplicateScenario(
  work: ProjectWork,
  actor: Doer,
  place: ScenarioPlace,
  name: string,
): Scenario {
  return change(work, actor, (deed) => {
    const line = openLine(deed.tx, place)
    const { note, content } = scenarioAt(deed.tx, place)
    const scenarioId = makeScenario(deed, line, { name, note, content })
    const from = place.scenarioId
    return noteNew(deed, { ...place, scenarioId }, 'scenario.duplicated', { from })
  })
}

function noteNew(
  deed: Deed,
  place: ScenarioPlace,
  action: string,
  detail: Readonly<Record<string, unknown>> = {},
): Scenario {
  const made = scenarioAt(deed.tx, place)
  const { verdict, holdsToLevel } = made.summary
  noteChange(deed, place.projectId, {
    ...scenarioSubject(made.id, made.name),
    action,
    toVersion: 1,
    detail: { ...detail, lineId: place.lineId, verdict, holdsToLevel },
  })
  return made
}

export function archiveScenario(work: ProjectWork, actor: Doer, place: ScenarioPlace): Scenario {
  return change(work, actor, (deed) => setArchived(deed, place, deed.at))
}

export function restoreScenario(work: ProjectWork, actor: Doer, place: ScenarioPlace): Scenario {
  return change(work, actor, (deed) => setArchived(deed, place, null))
}

/** Its version counts what it holds, so putting it away leaves the version as it is. */
function setArchived(deed: Deed, place: ScenarioPlace, archivedAt: number | null): Scenario {
  const { tx, by, at } = deed
  openLine(tx, place)
  const scenario = scenarioAt(tx, place)
  if ((scenario.archivedAt === null) === (archivedAt === null)) return scenario
  updateScenario(tx, scenario.id, { archivedAt, updatedAt: at, updatedBy: by.accountId })
  noteChange(deed, place.projectId, {
    ...scenarioSubject(scenario.id, scenario.name),
    action: archivedAt === null ? 'scenario.restored' : 'scenario.archived',
    fromVersion: scenario.version,
    toVersion: scenario.version,
    detail: { lineId: place.lineId },
  })
  return scenarioAt(tx, place)
}
