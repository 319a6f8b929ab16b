import type { z } from 'zod'
import type { Scenario, scenarioSaveSchema } from '../../../shared/schemas/project'
import { ConflictError } from '../../errors'
import type { Db } from '../../db/client'
import { lineAt } from '../lines/open-line'
import { change, type Deed, type Doer, noteChange, type ProjectWork } from '../projects/deed'
import { openScenario, scenarioAt, type ScenarioPlace } from './open-scenario'
import { assertComputable, type ScenarioText, writeVersion } from './scenario-rows'
import { scenarioSubject } from './scenarios.service'
import { findVersion } from './versions.queries'

type Save = z.output<typeof scenarioSaveSchema>

/**
 * Saves the whole state of a scenario as its next version.
 *
 * - A save that was answered, and whose answer was lost on its way, may be repeated: it gets the same
 *   answer, and no second version.
 * - A save of what is there already makes no version.
 *
 * @throws ConflictError with what is there now, where somebody saved meanwhile: nothing is overwritten.
 * @throws OutOfRangeError for a content that cannot be computed on the line.
 */
export function saveScenario(
  work: ProjectWork,
  actor: Doer,
  place: ScenarioPlace,
  save: Save,
): Scenario {
  return change(work, actor, (deed) => {
    const { tx, by } = deed
    lineAt(tx, place)
    const current = scenarioAt(tx, place)
    const answered = earlierAnswer(tx, by, current, save)
    if (answered) return answered
    const { line } = openScenario(tx, place)
    assertNewest(current, save.version)
    if (isSameText(current, save)) return current
    assertComputable(save.content, line)
    writeVersion(deed, line, current, save)
    return noteSaved(deed, place, current, { action: 'scenario.saved' })
  })
}

/** What the same save by the same person on the same version was answered, if there was one. */
function earlierAnswer(db: Db, by: Doer, current: Scenario, save: Save): Scenario | null {
  if (save.version >= current.version) return null
  const made = findVersion(db, current.id, save.version + 1)
  if (made?.savedBy.id !== by.accountId || !isSameText(made, save)) return null
  if (made.version === current.version) return current
  const { name, note, content, summary, version, savedAt, savedBy } = made
  const saved = { name, note, content, summary, version }
  return { ...current, ...saved, updatedAt: savedAt, updatedBy: savedBy }
}

function isSameText(a: ScenarioText, b: ScenarioText): boolean {
  const text = ({ name, note, content }: ScenarioText) => JSON.stringify([name, note, content])
  return text(a) === text(b)
}

function assertNewest(current: Scenario, madeOn: number): void {
  if (current.version === madeOn) return
  throw new ConflictError(
    `${current.updatedBy.name} saved "${current.name}" meanwhile: version ${current.version} is ` +
      `there, yours was made on ${madeOn}. Nothing was overwritten.`,
    current,
  )
}

/**
 * Makes a new version of an older one, computed on the survey of today. What was there stays in the
 * history.
 */
export function restoreVersion(
  work: ProjectWork,
  actor: Doer,
  place: ScenarioPlace,
  text: (db: Db) => ScenarioText & { readonly version: number },
): Scenario {
  return change(work, actor, (deed) => {
    const { line, scenario } = openScenario(deed.tx, place)
    const older = text(deed.tx)
    writeVersion(deed, line, scenario, older)
    return noteSaved(deed, place, scenario, {
      action: 'scenario.version-restored',
      restored: older.version,
    })
  })
}

function noteSaved(
  deed: Deed,
  place: ScenarioPlace,
  before: Scenario,
  { action, ...detail }: { readonly action: string; readonly restored?: number },
): Scenario {
  const after = scenarioAt(deed.tx, place)
  const { verdict, holdsToLevel } = after.summary
  noteChange(deed, place.projectId, {
    ...scenarioSubject(after.id, after.name),
    action,
    fromVersion: before.version,
    toVersion: after.version,
    detail: {
      ...detail,
      lineId: place.lineId,
      fields: changedParts(before, after),
      verdict,
      holdsToLevel,
    },
  })
  return after
}

/** Parts of a scenario that differ, by name. */
function changedParts(before: Scenario, after: Scenario): readonly string[] {
  const parts = ({ name, note, content }: Scenario) => ({ name, note, ...content })
  const old: Record<string, unknown> = parts(before)
  return Object.entries(parts(after))
    .filter(([part, value]) => JSON.stringify(value) !== JSON.stringify(old[part]))
    .map(([part]) => part)
}
