import { SECTION_RANGES } from '../schemas/section-ranges'
import { floatingDepth, holdsToOf, leaveOf, lostDepth, sceneAnswer } from './answers'
import { balanceAt, evaluateAt, firstValue } from './balance'
import type { CourseScene } from './course'
import { groundOf, WET_GRASS } from './grounds'
import type { DemoSetting, DemoValue } from './setting'

/** What does not change while a scene's own figures move: worked out once, not for every frame. */
export interface SceneFacts {
  readonly answer: number | null
  /** Depths at which a bare tube is lost and at which it floats [m]. */
  readonly lost: number | null
  readonly floating: number | null
  /** Least air pressure at which the tube stands in this water [Pa]. */
  readonly leastPressure: number | null
  /** Depth to which the section holds, and the leave level [m]. */
  readonly holdsTo: number
  readonly leave: number | null
  /** The same on the grounds that are compared [m]. */
  readonly onGrounds: readonly { readonly id: string; readonly holdsTo: number }[]
  /** Push and grip at depths from 0 to one diameter. */
  readonly curve: readonly {
    readonly depth: number
    readonly push: number
    readonly grip: number
  }[]
}

/** Figures that the script moves; facts do not depend on them. */
export function movedValues({ legs }: CourseScene): readonly DemoValue[] {
  return legs.map(({ value }) => value)
}

/** A text that is the same as long as the facts are. */
export function factsKey(scene: CourseScene, { tube, ground, values }: DemoSetting): string {
  const moved = movedValues(scene)
  const still = Object.entries(values).filter(([name]) => !moved.includes(name as DemoValue))
  const isBare = values.skirtLength === 0
  return JSON.stringify([scene.id, scene.topic, tube, ground, still, isBare])
}

/** Works the facts of a scene out; what its topic does not show is left empty. */
export function sceneFacts(scene: CourseScene, setting: DemoSetting): SceneFacts {
  const { topic } = scene
  const isBare = setting.values.skirtLength === 0
  return {
    answer: sceneAnswer(scene, setting),
    lost: isBare ? lostDepth(setting) : null,
    floating: isBare ? floatingDepth(setting) : null,
    leastPressure: topic === 'puncture' ? leastPressure(setting) : null,
    holdsTo: topic === 'leave' || topic === 'grip' ? holdsToOf(setting).depth : 0,
    leave: topic === 'leave' ? leaveOf(setting).depth : null,
    onGrounds: topic === 'grounds' ? onGrounds(setting) : [],
    curve: topic === 'grip' ? curveOf(setting) : [],
  }
}

function onGrounds(setting: DemoSetting): SceneFacts['onGrounds'] {
  return [groundOf('turf'), groundOf('asphalt'), WET_GRASS].map((ground) => ({
    id: ground.id,
    holdsTo: holdsToOf({ ...setting, ground }).depth,
  }))
}

/** Points of the curves of push and grip. */
const POINTS = 70

function curveOf(setting: DemoSetting): SceneFacts['curve'] {
  const { diameter } = setting.tube
  return Array.from({ length: POINTS + 1 }, (_, index) => {
    const depth = (index * diameter) / POINTS
    return { depth, ...balanceAt(setting, { depth }) }
  })
}

/** Pressures that are looked at [Pa]. */
const PRESSURE_STEP = 100
const GREATEST_PRESSURE = 20_000

function leastPressure(setting: DemoSetting): number | null {
  const { filledAt } = setting.values
  const { min } = SECTION_RANGES['barrier.airPressure']
  return firstValue(
    (airPressure) =>
      evaluateAt(setting, { airPressure: Math.max(min, airPressure), temperature: filledAt })
        .loadedShape.solved,
    GREATEST_PRESSURE,
    PRESSURE_STEP,
  )
}
