import type { z } from 'zod'
import type {
  newScenarioSchema,
  Scenario,
  scenarioConflictSchema,
  scenarioSaveSchema,
  scenariosPageSchema,
  scenarioVersionContentSchema,
  scenarioVersionSchema,
  scenarioVersionsSchema,
} from '@shared/schemas/project'
import { linePath, type LineRef } from './lines'
import { queryOf, type ListQuery } from './list-query'
import { getJson, sendJson, type ApiError } from './request'

export type ScenariosPage = z.output<typeof scenariosPageSchema>
export type NewScenario = z.input<typeof newScenarioSchema>
export type ScenarioSave = z.input<typeof scenarioSaveSchema>
export type ScenarioVersion = z.output<typeof scenarioVersionSchema>
export type ScenarioVersionContent = z.output<typeof scenarioVersionContentSchema>

/** Where a scenario is: its project, its line and itself. */
export interface ScenarioRef extends LineRef {
  readonly scenarioId: string
}

const path = (line: LineRef) => `${linePath(line)}/scenarios`
const one = (scenario: ScenarioRef) =>
  `${path(scenario)}/${encodeURIComponent(scenario.scenarioId)}`

export async function fetchScenarios(
  line: LineRef,
  query: ListQuery,
  signal?: AbortSignal,
): Promise<ScenariosPage> {
  return (await getJson(path(line) + queryOf(query), signal)) as ScenariosPage
}

/** Address of the table as a file; the browser downloads it itself. */
export function scenariosFile(line: LineRef, query: ListQuery): string {
  return `${path(line)}.csv${queryOf({ ...query, page: undefined })}`
}

export async function fetchScenario(
  scenario: ScenarioRef,
  signal?: AbortSignal,
): Promise<Scenario> {
  return (await getJson(one(scenario), signal)) as Scenario
}

export async function createScenario(line: LineRef, scenario: NewScenario): Promise<Scenario> {
  return (await sendJson('POST', path(line), scenario)) as Scenario
}

export async function saveScenario(scenario: ScenarioRef, save: ScenarioSave): Promise<Scenario> {
  return (await sendJson('PUT', one(scenario), save)) as Scenario
}

/** What is there now, where a save was refused because somebody else had saved. */
export function currentInConflict(error: ApiError): Scenario | null {
  if (error.code !== 'conflict') return null
  const { current } = error.problem as unknown as Partial<z.output<typeof scenarioConflictSchema>>
  return current ?? null
}

export async function duplicateScenario(scenario: ScenarioRef, name: string): Promise<Scenario> {
  return (await sendJson('POST', `${one(scenario)}/duplicates`, { name })) as Scenario
}

export async function archiveScenario(scenario: ScenarioRef): Promise<Scenario> {
  return (await sendJson('POST', `${one(scenario)}/archive`)) as Scenario
}

export async function restoreScenario(scenario: ScenarioRef): Promise<Scenario> {
  return (await sendJson('POST', `${one(scenario)}/restoration`)) as Scenario
}

export async function fetchVersions(
  scenario: ScenarioRef,
  signal?: AbortSignal,
): Promise<ScenarioVersion[]> {
  const answer = await getJson(`${one(scenario)}/versions`, signal)
  return (answer as z.output<typeof scenarioVersionsSchema>).versions
}

export async function fetchVersion(
  scenario: ScenarioRef,
  version: number,
  signal?: AbortSignal,
): Promise<ScenarioVersionContent> {
  return (await getJson(`${one(scenario)}/versions/${version}`, signal)) as ScenarioVersionContent
}

export async function restoreVersion(scenario: ScenarioRef, version: number): Promise<Scenario> {
  return (await sendJson('POST', `${one(scenario)}/versions/${version}/restoration`)) as Scenario
}
