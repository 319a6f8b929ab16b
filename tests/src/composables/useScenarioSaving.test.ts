// @vitest-environment jsdom
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest'
import { effectScope, shallowRef, type EffectScope } from 'vue'
import type { Scenario } from '../../../shared/schemas/project'
import { scenarioSummary } from '../../../shared/checks/scenario-summary'
import { ApiError } from '../../../src/api/request'
import type { ScenarioSave } from '../../../src/api/scenarios'
import { useScenarioSaving } from '../../../src/composables/useScenarioSaving'
import { useStepHistory } from '../../../src/composables/useStepHistory'
import { stateOf, type ScenarioState } from '../../../src/scenario/scenario-state'
import { LOW_ROAD_SURVEY, lowRoadContent } from '../../support/ferry-quay'

const content = lowRoadContent()
const person = { id: 'a', name: 'Engineer A' }
const kept: Scenario = {
  id: 's',
  lineId: 'l',
  name: 'Tonight',
  note: '',
  content,
  summary: scenarioSummary(LOW_ROAD_SURVEY, content),
  createdAt: 0,
  createdBy: person,
  updatedAt: 0,
  updatedBy: person,
  archivedAt: null,
  version: 1,
}
const offline = () => new ApiError('no answer', null)
const conflict = (current: Scenario) =>
  new ApiError('409', 409, { code: 'conflict', message: 'newer', fields: [], current })

let scope: EffectScope
beforeEach(() => {
  vi.useFakeTimers()
  scope = effectScope()
})
afterEach(() => {
  scope.stop()
  vi.useRealTimers()
})

/** A server that answers each save with the next version, unless it is told otherwise. */
function start() {
  const state = shallowRef<ScenarioState>(stateOf(kept))
  const isSavable = shallowRef(true)
  const sent: ScenarioSave[] = []
  const answers: (() => Promise<Scenario>)[] = []
  const save = (input: ScenarioSave): Promise<Scenario> => {
    sent.push(input)
    const answer = answers.shift()
    if (answer) return answer()
    return Promise.resolve({ ...kept, ...state.value, version: input.version + 1 } as Scenario)
  }
  const saving = scope.run(() =>
    useScenarioSaving({ initial: kept, state, isSavable, save, whenSaved: vi.fn() }),
  )!
  const level = (waterLevel: number) => {
    state.value = { ...state.value, content: { ...state.value.content, waterLevel } }
  }
  return { saving, state, isSavable, sent, answers, level }
}
const rest = (ms = 1000) => vi.advanceTimersByTimeAsync(ms)

describe('a scenario that saves itself', () => {
  it('waits until the typing rests, then sends the last state once, on the version that it knows', async () => {
    const { saving, sent, level } = start()
    level(3.3)
    await rest(500)
    level(3.31)
    await rest(900)
    expect(sent).toEqual([])
    expect(saving.standing.value).toBe('waiting')
    await rest(200)
    expect(sent.map(({ version, content: { waterLevel } }) => [version, waterLevel])).toEqual([
      [1, 3.31],
    ])
    expect(saving.standing.value).toBe('saved')
    level(3.32)
    await rest()
    expect(sent.at(-1)).toMatchObject({ version: 2 })
  })

  it('never has two saves on their way, and sends what came meanwhile', async () => {
    const { saving, sent, answers, level } = start()
    let answer: (scenario: Scenario) => void = () => undefined
    answers.push(() => new Promise((resolve) => (answer = resolve)))
    level(3.3)
    await rest()
    expect(saving.standing.value).toBe('saving')
    level(3.4)
    await rest(3000)
    expect(sent).toHaveLength(1)
    answer({ ...kept, version: 2 })
    await rest()
    expect(sent.at(-1)).toMatchObject({ version: 2, content: { waterLevel: 3.4 } })
  })

  it('keeps trying while nothing answers, and at once when the network is back', async () => {
    const { saving, sent, answers, level } = start()
    answers.push(
      () => Promise.reject(offline()),
      () => Promise.reject(offline()),
    )
    level(3.3)
    await rest()
    expect(saving.standing.value).toBe('unreachable')
    await rest(5000)
    expect(sent).toHaveLength(2)
    window.dispatchEvent(new Event('online'))
    await rest(0)
    expect(sent).toHaveLength(3)
    expect(saving.standing.value).toBe('saved')
  })

  it('sends nothing that cannot be computed, and goes on once it can', async () => {
    const { saving, isSavable, sent, level } = start()
    isSavable.value = false
    level(3.3)
    await rest(3000)
    expect(sent).toEqual([])
    expect(saving.standing.value).toBe('faulty')
    isSavable.value = true
    await rest()
    expect(sent).toHaveLength(1)
  })

  it('says what the server refused, and tries no more by itself', async () => {
    const { saving, sent, answers, level } = start()
    const problem = { code: 'conflict' as const, message: 'The line is archived.', fields: [] }
    answers.push(() => Promise.reject(new ApiError('409', 409, problem)))
    level(3.3)
    await rest(20_000)
    expect(sent).toHaveLength(1)
    expect(saving.standing.value).toBe('refused')
    expect(saving.problem.value?.message).toBe('The line is archived.')
  })
})

describe('a newer version on the server', () => {
  const theirs: Scenario = { ...kept, version: 5, content: { ...content, waterLevel: 3.9 } }

  it('is never overwritten: both stand beside each other until a person decides', async () => {
    const { saving, state, sent, answers, level } = start()
    answers.push(() => Promise.reject(conflict(theirs)))
    level(3.3)
    await rest()
    level(3.35)
    await rest(20_000)
    expect(sent).toHaveLength(1)
    expect(saving.standing.value).toBe('conflict')
    expect(saving.collision.value).toMatchObject({
      mine: { content: { waterLevel: 3.35 } },
      theirs: { content: { waterLevel: 3.9 } },
      base: { content: { waterLevel: 3.42 } },
    })
    saving.goOnFrom(theirs)
    await saving.saveNow()
    expect(sent.at(-1)).toMatchObject({ version: 5, content: { waterLevel: 3.35 } })
    expect(state.value.content.waterLevel).toBe(3.35)
  })

  it('asks nothing where both say the same', async () => {
    const { saving, answers, level } = start()
    answers.push(() => Promise.reject(conflict(theirs)))
    level(3.9)
    await rest()
    expect(saving.standing.value).toBe('saved')
    expect(saving.base.value.version).toBe(5)
  })
})

describe('steps', () => {
  it('are taken back and done again; changes of one kind soon after each other are one', () => {
    let now = 0
    const history = useStepHistory({ water: 1, name: 'a' }, () => now)
    history.change({ water: 2, name: 'a' }, 'water')
    now += 200
    history.change({ water: 3, name: 'a' }, 'water')
    now += 200
    history.change({ water: 3, name: 'b' }, 'name')
    now += 5000
    history.change({ water: 3, name: 'c' }, 'name')
    history.undo()
    expect(history.present.value).toEqual({ water: 3, name: 'b' })
    history.undo()
    history.undo()
    expect(history.present.value).toEqual({ water: 1, name: 'a' })
    expect(history.canUndo.value).toBe(false)
    history.redo()
    expect(history.present.value).toEqual({ water: 3, name: 'a' })
    history.change({ water: 9, name: 'a' }, 'water')
    expect(history.canRedo.value).toBe(false)
  })
})
