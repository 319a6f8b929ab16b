import type { SectionEvaluation } from '../checks/evaluate-section'
import { EDGE_FACTORS } from '../checks/what-decides'
import type { PictureBar } from '../drawing/demonstration/demonstration-input'
import { crestSunk, throughOneSection, windOn } from './answers'
import { balanceAt, balanceOf } from './balance'
import type { CourseScene } from './course'
import { quantity, said } from './messages'
import type { SceneFacts } from './scene-facts'
import { sectionOf, type DemoSetting } from './setting'

/** Bars of a picture and their scale. */
export interface PictureBars {
  readonly bars: readonly PictureBar[]
  /** Value of a bar of full length. */
  readonly reach: number
  /** N/m for an arrow of full length. */
  readonly forceReach: number
}

interface BarsOf {
  readonly scene: CourseScene
  readonly setting: DemoSetting
  readonly evaluation: SectionEvaluation
  readonly facts: SceneFacts
}

/** The scale keeps this much room behind the longest bar. */
const ROOM = 1.15

/** The balance of a scene, or the one quantity that it is about. */
export function pictureBars(of: BarsOf): PictureBars {
  switch (of.scene.topic) {
    case 'push':
      return inForces([pushBar(of)], of.scene.guess.max * gravityOf(of))
    case 'unroll':
      return inForces([onSkirtBar(of), pushBar(of)], of.scene.guess.max * gravityOf(of))
    case 'floats':
      return inForces([], weightOf(of))
    case 'night':
      return inOther(of, [sunkBar(of)])
    case 'puncture':
      return inOther(of, [throughBar(of)])
    case 'wind':
      return windBars(of)
    default:
      return inForces([gripBar(of), pushBar(of)], ROOM * greatestGrip(of))
  }
}

function gravityOf({ setting }: BarsOf): number {
  return sectionOf(setting).gravity
}

/** Thrust at a depth of one diameter [N/m]. */
function weightOf({ setting }: BarsOf): number {
  return balanceAt(setting, { depth: setting.tube.diameter }).push
}

/** The greatest grip that the script of a scene meets [N/m]. */
function greatestGrip({ scene, setting, facts }: BarsOf): number {
  const last = scene.legs.at(-1)
  const isDepth = last?.value === 'depth' && facts.answer !== null
  const depth = isDepth ? facts.answer : scene.start.values.depth
  const edgeFactor = scene.topic === 'creep' ? EDGE_FACTORS.sealed : setting.values.edgeFactor
  const { grip, push } = balanceAt(setting, { depth, dryDepth: 0, edgeFactor })
  return Math.max(grip, push, 1)
}

function inForces(bars: readonly PictureBar[], reach: number): PictureBars {
  const longest = Math.max(reach, ...bars.map(({ value }) => value))
  return { bars, reach: longest, forceReach: longest }
}

function inOther(of: BarsOf, bars: readonly PictureBar[]): PictureBars {
  const reach = Math.max(of.scene.guess.max, ...bars.map(({ value }) => value))
  return { bars, reach, forceReach: weightOf(of) }
}

/** A force per metre as the mass that weighs as much. */
function asMass(of: BarsOf, force: number) {
  return { value: quantity(force / gravityOf(of), 'massPerLength', 0) }
}

function pushBar(of: BarsOf): PictureBar {
  const { push } = balanceOf(of.evaluation)
  const message = said('draw.push', asMass(of, push))
  return { id: 'push', role: 'force', text: 'labelForce', value: push, message }
}

function gripBar(of: BarsOf): PictureBar {
  const { grip } = balanceOf(of.evaluation)
  const message = said('draw.grip', asMass(of, grip))
  return { id: 'grip', role: 'friction', text: 'labelGround', value: grip, message }
}

function onSkirtBar(of: BarsOf): PictureBar {
  const { waterOnSkirt } = of.evaluation.vertical
  const value = Math.max(0, waterOnSkirt)
  const message = said('draw.onSkirt', asMass(of, value))
  return { id: 'on-skirt', role: 'pressure', text: 'labelWater', value, message }
}

function sunkBar({ scene, setting }: BarsOf): PictureBar {
  const sunk = crestSunk(setting, scene.start)
  const value = Math.max(0, sunk ?? 0)
  const message =
    sunk === null
      ? said('draw.givesWay')
      : said('draw.sunk', { value: quantity(value, 'smallLength') })
  return { id: 'sunk', role: 'levelMark', text: 'labelBarrier', value, message }
}

function throughBar({ setting, evaluation }: BarsOf): PictureBar {
  const value = evaluation.loadedShape.solved ? 0 : throughOneSection(setting).steady
  const message = said('draw.through', { value: quantity(value, 'flowRate', 0) })
  return { id: 'through', role: 'pressure', text: 'labelWater', value, message }
}

/** Room for guesses of a gust, in times of the grip. */
const WIND_ROOM = 3

function windBars({ setting }: BarsOf): PictureBars {
  const { force, resistance } = windOn(setting, setting.values.gust)
  const reach = Math.max(WIND_ROOM * resistance, force)
  const inNewton = (value: number) => ({ value: quantity(value, 'forceTerm') })
  const bars: readonly PictureBar[] = [
    {
      ...{ id: 'grip', role: 'friction', text: 'labelGround', value: resistance },
      message: said('draw.grip', inNewton(resistance)),
    },
    {
      ...{ id: 'wind', role: 'force', text: 'labelForce', value: force },
      message: said('draw.wind', inNewton(force)),
    },
  ]
  return { bars, reach, forceReach: reach }
}
