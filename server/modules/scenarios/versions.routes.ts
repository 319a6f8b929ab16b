import type { Request } from 'express'
import {
  scenarioSchema,
  scenarioVersionContentSchema,
  scenarioVersionsSchema,
} from '../../../shared/schemas/project'
import { defineOperation, type Operation } from '../../http/operation'
import { pathPart } from '../../http/parse-input'
import type { ProjectWork } from '../projects/deed'
import type { ScenarioPlace } from './open-scenario'
import { readVersion, readVersions, restoreOlderVersion } from './versions.service'

/** History of a scenario, below its own address. */
export function versionsOperations(
  work: ProjectWork,
  scenarioPath: string,
  placeOf: (req: Request) => ScenarioPlace,
): readonly Operation[] {
  return [
    defineOperation({
      method: 'get',
      path: `${scenarioPath}/versions`,
      id: 'listScenarioVersions',
      summary: 'Every saved state of a scenario, the newest first',
      rule: 'read-project',
      response: scenarioVersionsSchema,
      problems: [],
      handle: ({ req }) => readVersions(work.db, placeOf(req)),
    }),
    defineOperation({
      method: 'get',
      path: `${scenarioPath}/versions/:version`,
      id: 'readScenarioVersion',
      summary: 'One saved state of a scenario',
      rule: 'read-project',
      response: scenarioVersionContentSchema,
      problems: [],
      handle: ({ req }) => readVersion(work.db, placeOf(req), pathPart(req, 'version')),
    }),
    defineOperation({
      method: 'post',
      path: `${scenarioPath}/versions/:version/restoration`,
      id: 'restoreScenarioVersion',
      summary: 'Make a new version of an older one',
      rule: 'edit-project',
      response: scenarioSchema,
      problems: ['conflict'],
      handle: ({ req, actor }) =>
        restoreOlderVersion(work, actor, placeOf(req), pathPart(req, 'version')),
    }),
  ]
}
