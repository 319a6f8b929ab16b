import type { Request } from 'express'
import {
  duplicateSchema,
  newScenarioSchema,
  scenarioSaveSchema,
  scenarioSchema,
  scenariosPageSchema,
  scenariosQuerySchema,
} from '../../../shared/schemas/project'
import { defineOperation, type Operation } from '../../http/operation'
import { parseBody, parseQuery, pathPart } from '../../http/parse-input'
import type { ProjectWork } from '../projects/deed'
import { saveScenario } from './save-scenario.service'
import { scenariosAsCsv } from './scenarios-csv.service'
import {
  archiveScenario,
  createScenario,
  duplicateScenario,
  readScenario,
  readScenarios,
  restoreScenario,
} from './scenarios.service'
import { versionsOperations } from './versions.routes'

export const SCENARIOS_PATH = '/api/projects/:projectId/lines/:lineId/scenarios'
const ONE = `${SCENARIOS_PATH}/:scenarioId`

const linePlace = (req: Request) => ({
  projectId: pathPart(req, 'projectId'),
  lineId: pathPart(req, 'lineId'),
})
const placeOf = (req: Request) => ({ ...linePlace(req), scenarioId: pathPart(req, 'scenarioId') })

export function scenariosOperations(work: ProjectWork): readonly Operation[] {
  return [
    ...tableOperations(work),
    ...oneOperations(work),
    ...keepingOperations(work),
    ...versionsOperations(work, ONE, placeOf),
  ]
}

function tableOperations(work: ProjectWork): readonly Operation[] {
  return [
    defineOperation({
      method: 'get',
      path: SCENARIOS_PATH,
      id: 'listScenarios',
      summary: 'All scenarios of a line in one table',
      rule: 'read-project',
      query: scenariosQuerySchema,
      response: scenariosPageSchema,
      problems: ['invalid-input', 'out-of-range'],
      handle: ({ req }) =>
        readScenarios(work.db, linePlace(req), parseQuery(scenariosQuerySchema, req)),
    }),
    defineOperation({
      method: 'get',
      path: `${SCENARIOS_PATH}.csv`,
      id: 'exportScenarios',
      summary: 'The table of scenarios as CSV, every page of it',
      rule: 'read-project',
      query: scenariosQuerySchema,
      mediaType: 'text/csv',
      problems: ['invalid-input', 'out-of-range'],
      handle: ({ req, res }) => {
        const csv = scenariosAsCsv(work.db, linePlace(req), parseQuery(scenariosQuerySchema, req))
        res.attachment('scenarios.csv').type('text/csv; charset=utf-8').send(csv)
      },
    }),
    defineOperation({
      method: 'post',
      path: SCENARIOS_PATH,
      id: 'createScenario',
      summary: 'Add a scenario; its figures are computed here',
      rule: 'edit-project',
      request: newScenarioSchema,
      response: scenarioSchema,
      status: 201,
      problems: ['conflict', 'out-of-range'],
      handle: ({ req, actor }) =>
        createScenario(work, actor, linePlace(req), parseBody(newScenarioSchema, req)),
    }),
  ]
}

function oneOperations(work: ProjectWork): readonly Operation[] {
  return [
    defineOperation({
      method: 'get',
      path: ONE,
      id: 'readScenario',
      summary: 'A scenario with all that it assumes',
      rule: 'read-project',
      response: scenarioSchema,
      problems: [],
      handle: ({ req }) => readScenario(work.db, placeOf(req)),
    }),
    defineOperation({
      method: 'put',
      path: ONE,
      id: 'saveScenario',
      summary: 'Save the whole state on the version that it was made on',
      rule: 'edit-project',
      request: scenarioSaveSchema,
      response: scenarioSchema,
      problems: ['conflict', 'out-of-range'],
      handle: ({ req, actor }) =>
        saveScenario(work, actor, placeOf(req), parseBody(scenarioSaveSchema, req)),
    }),
    defineOperation({
      method: 'post',
      path: `${ONE}/duplicates`,
      id: 'duplicateScenario',
      summary: 'A copy beside the scenario, without its history',
      rule: 'edit-project',
      request: duplicateSchema,
      response: scenarioSchema,
      status: 201,
      problems: ['conflict'],
      handle: ({ req, actor }) =>
        duplicateScenario(work, actor, placeOf(req), parseBody(duplicateSchema, req).name),
    }),
  ]
}

function keepingOperations(work: ProjectWork): readonly Operation[] {
  return [
    defineOperation({
      method: 'post',
      path: `${ONE}/archive`,
      id: 'archiveScenario',
      summary: 'Put a scenario away',
      rule: 'edit-project',
      response: scenarioSchema,
      problems: ['conflict'],
      handle: ({ req, actor }) => archiveScenario(work, actor, placeOf(req)),
    }),
    defineOperation({
      method: 'post',
      path: `${ONE}/restoration`,
      id: 'restoreScenario',
      summary: 'Take a scenario up again',
      rule: 'edit-project',
      response: scenarioSchema,
      problems: ['conflict'],
      handle: ({ req, actor }) => restoreScenario(work, actor, placeOf(req)),
    }),
  ]
}
