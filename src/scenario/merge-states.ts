import { isSameValue } from './same-value'
import { differingFields, fieldValue, withFieldOf, type ScenarioField } from './scenario-fields'
import type { ScenarioState } from './scenario-state'

export type Side = 'mine' | 'theirs'

/** One field in which my version differs from the one that is there now. */
export interface Disagreement {
  readonly field: ScenarioField
  /** Who changed it since both were the same; `both` asks for a decision. */
  readonly changedBy: Side | 'both'
}

/** Two versions of a scenario that were made on the same one. */
export interface Collision {
  readonly mine: ScenarioState
  readonly theirs: ScenarioState
  /** What both were made on; null where it is not known any more. */
  readonly base: ScenarioState | null
}

/** Every field in which the two sides differ, and whose change it is. */
export function disagreements({ mine, theirs, base }: Collision): readonly Disagreement[] {
  return differingFields(mine, theirs).map((field) => ({
    field,
    changedBy: base ? changedBy(field, { mine, theirs, base }) : 'both',
  }))
}

function changedBy(
  field: ScenarioField,
  { mine, theirs, base }: { mine: ScenarioState; theirs: ScenarioState; base: ScenarioState },
): Disagreement['changedBy'] {
  const before = fieldValue(base, field)
  if (isSameValue(fieldValue(mine, field), before)) return 'theirs'
  return isSameValue(fieldValue(theirs, field), before) ? 'mine' : 'both'
}

/** What stands to reason: a change that only one side made is kept; the rest is left open. */
export function reasonablePicks(
  found: readonly Disagreement[],
): Readonly<Record<string, Side | null>> {
  return Object.fromEntries(
    found.map(({ field, changedBy: side }) => [field.id, side === 'both' ? null : side]),
  )
}

/** My version with the fields that were picked from theirs. */
export function mergedState(
  { mine, theirs }: Collision,
  found: readonly Disagreement[],
  picks: Readonly<Record<string, Side | null>>,
): ScenarioState {
  return found
    .filter(({ field }) => picks[field.id] === 'theirs')
    .reduce((state, { field }) => withFieldOf(state, theirs, field), mine)
}
