import type { Scenario } from '@shared/schemas/project'
import type { ScenarioContent } from '@shared/schemas/scenario'
import { isSameValue } from './same-value'

/** Everything of a scenario that a person changes; it is saved as a whole. */
export interface ScenarioState {
  readonly name: string
  readonly note: string
  readonly content: ScenarioContent
}

/** The state in an answer of the server. */
export function stateOf({ name, note, content }: ScenarioState): ScenarioState {
  return { name, note, content }
}

/** A state and the version that it was made on. */
export interface VersionedState {
  readonly version: number
  readonly state: ScenarioState
}

export function versionedState(
  scenario: Pick<Scenario, 'version'> & ScenarioState,
): VersionedState {
  return { version: scenario.version, state: stateOf(scenario) }
}

export function isSameState(a: ScenarioState, b: ScenarioState): boolean {
  return isSameValue(a, b)
}
