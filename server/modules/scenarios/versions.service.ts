import type { z } from 'zod'
import type {
  Scenario,
  scenarioVersionContentSchema,
  scenarioVersionsSchema,
} from '../../../shared/schemas/project'
import type { Db } from '../../db/client'
import { NotFoundError } from '../../errors'
import { lineAt } from '../lines/open-line'
import type { Doer, ProjectWork } from '../projects/deed'
import { scenarioAt, type ScenarioPlace } from './open-scenario'
import { restoreVersion } from './save-scenario.service'
import { findVersion, listVersions } from './versions.queries'

export type VersionContent = z.output<typeof scenarioVersionContentSchema>

/** Every saved state, the newest first, each with what it answered on the survey of its time. */
export function readVersions(
  db: Db,
  place: ScenarioPlace,
): z.output<typeof scenarioVersionsSchema> {
  lineAt(db, place)
  return { versions: listVersions(db, scenarioAt(db, place).id) }
}

/** @throws NotFoundError */
export function readVersion(db: Db, place: ScenarioPlace, version: string): VersionContent {
  lineAt(db, place)
  const scenario = scenarioAt(db, place)
  const found = /^[1-9]\d{0,8}$/.test(version)
    ? findVersion(db, scenario.id, Number(version))
    : undefined
  if (!found) throw new NotFoundError(`version: "${version}" does not exist of this scenario`)
  return found
}

/** Makes a new version of an older one. */
export function restoreOlderVersion(
  work: ProjectWork,
  actor: Doer,
  place: ScenarioPlace,
  version: string,
): Scenario {
  return restoreVersion(work, actor, place, (db) => readVersion(db, place, version))
}
