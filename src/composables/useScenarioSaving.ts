import { computed, onScopeDispose, shallowReadonly, shallowRef, watch, type Ref } from 'vue'
import type { Scenario } from '@shared/schemas/project'
import { ApiError } from '@/api/request'
import { currentInConflict, type ScenarioSave } from '@/api/scenarios'
import type { Collision } from '@/scenario/merge-states'
import { isSameState, stateOf, type ScenarioState } from '@/scenario/scenario-state'

/** Rest after the last change before it is saved [ms]. */
const REST = 1000

/** Wait before the next attempt while nothing answers [ms]. */
const RETRY = 5000

/**
 * - `saved`: the server has it. `waiting`: it will be sent in a moment. `saving`: it is on its way.
 * - `faulty`: something in it cannot be computed, so it is not sent.
 * - `unreachable`: nothing answered; it is tried again. `refused`: the server said no.
 * - `conflict`: somebody else saved; a person decides.
 */
export type SavingState =
  'saved' | 'waiting' | 'saving' | 'faulty' | 'unreachable' | 'refused' | 'conflict'

/** What is there now beside my version, which may go on changing until a person decides. */
export interface MetCollision extends Collision {
  readonly current: Scenario
}

export interface SavingParts {
  /** What the server had when the page was opened. */
  readonly initial: Scenario
  readonly state: Readonly<Ref<ScenarioState>>
  /** False while the state cannot be computed. */
  readonly isSavable: Readonly<Ref<boolean>>
  readonly save: (save: ScenarioSave) => Promise<Scenario>
  readonly whenSaved: (scenario: Scenario) => void
}

/**
 * Saves a scenario by itself, one save at a time, each on the version that the last one gave. A newer
 * version is never overwritten: both are kept for a person to decide.
 */
export function useScenarioSaving(parts: SavingParts) {
  const memory = savingMemory(parts)
  const actions = savingActions(parts, memory)
  const { base, problem, collision, isDirty } = memory

  watch([parts.state, parts.isSavable], () => {
    if (isDirty.value) actions.saveSoon()
  })
  const whenOnline = () => void actions.saveNow()
  window.addEventListener('online', whenOnline)
  onScopeDispose(() => {
    clearTimeout(memory.timer)
    window.removeEventListener('online', whenOnline)
  })

  return {
    base: shallowReadonly(base),
    problem: shallowReadonly(problem),
    collision: computed(() => collision.value && { ...collision.value, mine: parts.state.value }),
    isDirty,
    standing: computed(() => standingOf(parts, memory)),
    saveNow: actions.saveNow,
    meet: actions.meet,
    goOnFrom: actions.goOnFrom,
  }
}

export type ScenarioSaving = ReturnType<typeof useScenarioSaving>

function savingMemory({ initial, state }: SavingParts) {
  const savedState = shallowRef<ScenarioState>(stateOf(initial))
  return {
    base: shallowRef<Scenario>(initial),
    savedState,
    problem: shallowRef<ApiError | null>(null),
    collision: shallowRef<Omit<MetCollision, 'mine'> | null>(null),
    isSaving: shallowRef(false),
    isDirty: computed(() => !isSameState(state.value, savedState.value)),
    timer: undefined as ReturnType<typeof setTimeout> | undefined,
  }
}

type Memory = ReturnType<typeof savingMemory>

function standingOf({ isSavable }: SavingParts, memory: Memory): SavingState {
  const { collision, isSaving, problem, isDirty } = memory
  if (collision.value) return 'conflict'
  if (isSaving.value) return 'saving'
  if (problem.value) return isPassing(problem.value) ? 'unreachable' : 'refused'
  if (!isDirty.value) return 'saved'
  return isSavable.value ? 'waiting' : 'faulty'
}

function savingActions(parts: SavingParts, memory: Memory) {
  const { base, savedState, problem, collision, isSaving, isDirty } = memory

  function saveSoon(rest = REST): void {
    clearTimeout(memory.timer)
    memory.timer = setTimeout(() => void saveNow(), rest)
  }

  async function saveNow(): Promise<void> {
    clearTimeout(memory.timer)
    if (isSaving.value || collision.value || !isDirty.value || !parts.isSavable.value) return
    const sent = parts.state.value
    isSaving.value = true
    problem.value = null
    try {
      take(await parts.save({ ...sent, version: base.value.version }), sent)
    } catch (error) {
      refuse(error, sent)
    } finally {
      isSaving.value = false
    }
    if (problem.value === null && isDirty.value) saveSoon()
  }

  function take(scenario: Scenario, sent: ScenarioState): void {
    base.value = scenario
    savedState.value = sent
    parts.whenSaved(scenario)
  }

  function refuse(error: unknown, sent: ScenarioState): void {
    if (!(error instanceof ApiError)) throw error
    const current = currentInConflict(error)
    if (current) return meet(current, sent, savedState.value)
    problem.value = error
    if (isPassing(error)) saveSoon(RETRY)
  }

  /** Somebody else's version stands beside mine; where both say the same, there is nothing to ask. */
  function meet(current: Scenario, mine: ScenarioState, before: ScenarioState | null): void {
    const theirs = stateOf(current)
    if (isSameState(mine, theirs)) take(current, mine)
    else collision.value = { theirs, base: before, current }
  }

  /** The version that saves go on from, once a person has decided or restored. */
  function goOnFrom(current: Scenario): void {
    base.value = current
    savedState.value = stateOf(current)
    collision.value = null
    problem.value = null
    parts.whenSaved(current)
  }

  return { saveSoon, saveNow, meet, goOnFrom }
}

/** No answer, or a server out of order: the same save may succeed later. */
function isPassing(error: ApiError): boolean {
  return error.isOffline || (error.status ?? 0) >= 500 || error.status === 429
}
