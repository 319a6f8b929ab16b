import { randomUUID } from 'node:crypto'
import type { z } from 'zod'
import type { newLineSchema } from '../../../shared/schemas/project'
import type { Deed } from '../projects/deed'
import { makeScenario } from '../scenarios/scenario-rows'
import { listScenarioContents } from '../scenarios/scenarios.queries'
import { insertLine, replaceStations } from './lines.queries'
import { lineAt, type LinePlace } from './open-line'

type LineText = z.output<typeof newLineSchema>

/** Writes a line with its survey; the caller has checked it and writes the audit trail. */
export function makeLine(
  { tx, by, at }: Deed,
  projectId: string,
  { stations, ...line }: LineText,
  id = randomUUID() as string,
): string {
  const { accountId } = by
  const kept = { createdAt: at, createdBy: accountId, updatedAt: at, updatedBy: accountId }
  const { name, note, sectionLength, marks, ends, background } = line
  const row = { id, projectId, name, note, sectionLength, marks: [...marks], ends, background }
  insertLine(tx, { ...row, ...kept })
  replaceStations(tx, id, stations)
  return id
}

/** Copies a line and those of its scenarios that are in use, each with its present state alone. */
export function copyLine(
  deed: Deed,
  from: LinePlace,
  to: { readonly projectId: string; readonly name: string },
): string {
  const line = lineAt(deed.tx, from)
  // A picture belongs to the project whose file it is.
  const background = to.projectId === from.projectId ? line.background : null
  const id = makeLine(deed, to.projectId, { ...line, background, name: to.name })
  for (const text of listScenarioContents(deed.tx, line.id)) {
    // A forecast belongs to a gauge of the other project.
    const forecast = to.projectId === from.projectId ? (text.content.forecast ?? null) : null
    makeScenario(deed, { ...line, id }, { ...text, content: { ...text.content, forecast } })
  }
  return id
}
