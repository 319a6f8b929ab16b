import type { Db } from '../../db/client'
import { ConflictError, NotFoundError } from '../../errors'
import { type LinePlace, openLine } from '../lines/open-line'
import type { Scenario } from '../../../shared/schemas/project'
import { findScenario } from './scenarios.queries'

export interface ScenarioPlace extends LinePlace {
  readonly scenarioId: string
}

/** @throws NotFoundError for a scenario that is not on the line. */
export function scenarioAt(db: Db, { lineId, scenarioId }: ScenarioPlace): Scenario {
  const scenario = findScenario(db, lineId, scenarioId)
  if (!scenario) throw new NotFoundError(`scenario: "${scenarioId}" does not exist on this line`)
  return scenario
}

/**
 * The scenario with its line, where both may change.
 *
 * @throws NotFoundError, or ConflictError while it, its line or its project is archived; the conflict
 * of an archived scenario shows the scenario.
 */
export function openScenario(db: Db, place: ScenarioPlace) {
  const line = openLine(db, place)
  const scenario = scenarioAt(db, place)
  if (scenario.archivedAt !== null) {
    const message = `The scenario "${scenario.name}" is archived; restore it first.`
    throw new ConflictError(message, scenario)
  }
  return { line, scenario }
}
