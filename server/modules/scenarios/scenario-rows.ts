import { randomUUID } from 'node:crypto'
import { OutOfRangeError } from '../../../shared/errors'
import type { HoldingProfiles } from '../../../shared/checks/line-check'
import { scenarioSummary } from '../../../shared/checks/scenario-summary'
import type { Survey } from '../../../shared/schemas/line-faults'
import type { ScenarioContent, ScenarioSummary } from '../../../shared/schemas/scenario'
import { scenarioFaults } from '../../../shared/schemas/scenario-faults'
import type { Deed } from '../projects/deed'
import { insertScenario, listScenarioIds, updateScenario, findScenario } from './scenarios.queries'
import { insertVersion } from './versions.queries'

/** What somebody writes of a scenario; all figures beside it are computed here. */
export interface ScenarioText {
  readonly name: string
  readonly note: string
  readonly content: ScenarioContent
}

/** @throws OutOfRangeError that names every field that cannot be computed on the line. */
export function assertComputable(content: ScenarioContent, survey: Survey): void {
  const faults = scenarioFaults(content, survey)
  if (faults.length > 0) throw new OutOfRangeError(faults)
}

/** Columns that carry the answer; lists sort by the copies. */
function answerColumns(summary: ScenarioSummary) {
  const { waterLevel, verdict, holdsToLevel } = summary
  return { summary, waterLevel, verdict, holdsToLevel }
}

/** Writes a scenario with its first version; the caller writes the audit trail. */
export function makeScenario(
  { tx, by, at }: Deed,
  line: Survey & { readonly id: string },
  text: ScenarioText,
  id = randomUUID() as string,
): string {
  const { accountId } = by
  const answer = answerColumns(scenarioSummary(line, text.content))
  const { name, note, content } = text
  const kept = { createdAt: at, createdBy: accountId, updatedAt: at, updatedBy: accountId }
  insertScenario(tx, { id, lineId: line.id, name, note, content, ...answer, ...kept })
  const { summary } = answer
  const saved = { savedAt: at, savedBy: accountId }
  insertVersion(tx, { scenarioId: id, version: 1, name, note, content, summary, ...saved })
  return id
}

/** Writes the next version of a scenario. */
export function writeVersion(
  { tx, by, at }: Deed,
  line: Survey,
  scenario: { readonly id: string; readonly version: number },
  { name, note, content }: ScenarioText,
): void {
  const version = scenario.version + 1
  const answer = answerColumns(scenarioSummary(line, content))
  const changed = { updatedAt: at, updatedBy: by.accountId }
  updateScenario(tx, scenario.id, { name, note, content, version, ...answer, ...changed })
  const { summary } = answer
  const saved = { savedAt: at, savedBy: by.accountId }
  insertVersion(tx, { scenarioId: scenario.id, version, name, note, content, summary, ...saved })
}

/** What a new survey did to the answers of a line. */
export interface Recomputed {
  readonly scenarios: number
  /** Those whose answer is another one now. */
  readonly changed: readonly string[]
}

/**
 * Computes all scenarios of a line again after its survey changed. Their contents and versions stay,
 * and so does what older versions answered on the survey of their time.
 */
export function recomputeScenarios(
  { tx }: Deed,
  line: Survey & { readonly id: string },
): Recomputed {
  const profiles: HoldingProfiles = new Map()
  const ids = listScenarioIds(tx, line.id)
  const changed = ids.filter((id) => {
    const scenario = findScenario(tx, line.id, id)!
    const summary = scenarioSummary(line, scenario.content, profiles)
    if (JSON.stringify(summary) === JSON.stringify(scenario.summary)) return false
    updateScenario(tx, id, answerColumns(summary))
    return true
  })
  return { scenarios: ids.length, changed }
}
