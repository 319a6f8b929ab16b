import type { QuantityKind } from '@shared/units'
import type { ScenarioContent, SizeRun } from '@shared/schemas/scenario'
import { isSameValue } from './same-value'
import type { ScenarioState } from './scenario-state'

/** How the value of a field is put into words. */
export type FieldForm =
  QuantityKind | 'text' | 'basis' | 'upliftModel' | 'sizes' | 'suitable' | 'event' | 'plan'

/** One thing that two versions of a scenario can differ in. */
export interface ScenarioField {
  /** Path in the state; the assumptions of a surface go by its name. */
  readonly id: string
  readonly labelKey: string
  /** Surface that the field belongs to, if it belongs to one. */
  readonly surface?: string
  readonly form: FieldForm
}

const own = (id: string, labelKey: string, form: FieldForm): ScenarioField => ({
  id,
  labelKey,
  form,
})
const shared = (id: string, field: string, form: FieldForm): ScenarioField =>
  own(id, `quickCheck.field.${field}.label`, form)

/** Fields of every scenario. Where the workbench looks is no difference. */
const FIXED: readonly ScenarioField[] = [
  own('name', 'scenarioPage.field.name', 'text'),
  own('note', 'scenarioPage.field.note', 'text'),
  own('content.waterLevel', 'scenarioPage.field.waterLevel', 'length'),
  own('content.levelLow', 'scenarioPage.field.levelLow', 'length'),
  own('content.levelHigh', 'scenarioPage.field.levelHigh', 'length'),
  own('content.levelNow', 'scenarioPage.field.levelNow', 'length'),
  own('content.dryLevel', 'scenarioPage.field.dryLevel', 'length'),
  own('content.basis', 'quickCheck.barrier.basis', 'basis'),
  shared('content.requiredFreeboard', 'requiredFreeboard', 'length'),
  own('content.sizes', 'scenarioPage.field.sizes', 'sizes'),
  own('content.uplift.model', 'quickCheck.ground.model', 'upliftModel'),
  shared('content.uplift.edgeFactor', 'edgeFactor', 'percent'),
  shared('content.uplift.weighedEdgeFactor', 'weighedEdge', 'percent'),
  shared('content.uplift.diffusivity', 'diffusivity', 'diffusivity'),
  shared('content.uplift.time', 'upliftTime', 'hours'),
  shared('content.fall', 'fall', 'percent'),
  shared('content.rateOfRise', 'rateOfRise', 'rate'),
  shared('content.timeToClear', 'clearTime', 'minutes'),
  own('content.deployment', 'deployment.title', 'plan'),
  own('content.event', 'eventPage.settings.title', 'event'),
  shared('content.water.currentSpeed', 'currentSpeed', 'speed'),
  shared('content.water.dragCoefficient', 'dragCoefficient', 'ratio'),
  shared('content.water.waveHeight', 'waveHeight', 'length'),
  shared('content.water.wavePeriod', 'wavePeriod', 'seconds'),
  shared('content.water.density', 'density', 'density'),
  shared('content.debris.force', 'debrisForce', 'force'),
  shared('content.debris.draught', 'draught', 'length'),
  shared('content.gravity', 'gravity', 'ratio'),
]

const OF_GROUND: readonly ScenarioField[] = [
  shared('friction', 'friction', 'ratio'),
  own('suitable', 'quickCheck.ground.suitable.label', 'suitable'),
  shared('permeability', 'permeability', 'permeability'),
  shared('layerThickness', 'layerThickness', 'length'),
  shared('undrainedStrength', 'undrainedStrength', 'pressure'),
]

/** Every field that any of the states has, in the order in which they are read. */
export function scenarioFields(states: readonly ScenarioState[]): readonly ScenarioField[] {
  const surfaces = new Set(
    states.flatMap(({ content }) => content.grounds.map(({ surface }) => surface)),
  )
  const ofGrounds = [...surfaces].flatMap((surface) =>
    OF_GROUND.map((field) => ({ ...field, id: `grounds.${surface}.${field.id}`, surface })),
  )
  return [...FIXED, ...ofGrounds]
}

/** The value of a field; null where the state has none. */
export function fieldValue(state: ScenarioState, { id, surface }: ScenarioField): unknown {
  if (surface !== undefined) {
    const ground = state.content.grounds.find((candidate) => candidate.surface === surface)
    return ground?.[id.split('.').at(-1) as keyof typeof ground] ?? null
  }
  const read = (node: unknown, key: string) => (node as Record<string, unknown>)[key] ?? null
  return id.split('.').reduce<unknown>(read, state)
}

/** The state with one field taken from another. */
export function withFieldOf(
  state: ScenarioState,
  source: ScenarioState,
  field: ScenarioField,
): ScenarioState {
  if (field.surface !== undefined) return withGroundField(state, source, field)
  return withPath(state, field.id.split('.'), fieldValue(source, field)) as ScenarioState
}

function withPath(node: unknown, [key, ...rest]: readonly string[], value: unknown): unknown {
  if (key === undefined) return value
  const object = node as Record<string, unknown>
  return { ...object, [key]: withPath(object[key], rest, value) }
}

/** A surface that only one side knows is taken or dropped as a whole. */
function withGroundField(
  state: ScenarioState,
  source: ScenarioState,
  { id, surface }: ScenarioField,
): ScenarioState {
  const find = ({ content }: ScenarioState) =>
    content.grounds.find((ground) => ground.surface === surface)
  const [mine, theirs] = [find(state), find(source)]
  const others = state.content.grounds.filter((ground) => ground.surface !== surface)
  const key = id.split('.').at(-1) as keyof ScenarioContent['grounds'][number]
  const grounds =
    mine && theirs
      ? state.content.grounds.map((ground) =>
          ground.surface === surface ? { ...ground, [key]: theirs[key] } : ground,
        )
      : theirs
        ? [...others, theirs]
        : others
  return { ...state, content: { ...state.content, grounds } }
}

/** Fields in which two states differ. */
export function differingFields(a: ScenarioState, b: ScenarioState): readonly ScenarioField[] {
  return scenarioFields([a, b]).filter(
    (field) => !isSameValue(fieldValue(a, field), fieldValue(b, field)),
  )
}

/** Sizes in order of chainage, for reading. */
export function sizesInOrder(sizes: readonly SizeRun[]): readonly SizeRun[] {
  return [...sizes].sort((a, b) => a.from - b.from)
}
