import type { SectionEvaluation } from '../checks/evaluate-section'
import type {
  Adrift,
  PictureGuess,
  PictureLevel,
  PicturePart,
} from '../drawing/demonstration/demonstration-input'
import type { CourseScene, Topic } from './course'
import { limit, quantity, said } from './messages'
import { pictureBars, type PictureBars } from './picture-bars'
import type { SceneFacts } from './scene-facts'
import { airPressureNow, sectionOf, type DemoSetting } from './setting'
import { balanceAt } from './balance'
import { windOn } from './answers'
import { EDGE_FACTORS } from '../checks/what-decides'

/** What a picture is made from. */
export interface PictureOf {
  readonly scene: CourseScene
  readonly setting: DemoSetting
  readonly evaluation: SectionEvaluation
  readonly facts: SceneFacts
  /** Guess of the room, SI; null: none yet. */
  readonly guess: number | null
  /** The answer may be seen. */
  readonly isShown: boolean
}

/** What the drawing shows of a scene, beside case, evaluation, outline and view. */
export interface ScenePicture extends PictureBars {
  readonly room: { readonly skirtLength: number; readonly depth: number }
  readonly parts: readonly PicturePart[]
  readonly levels: readonly PictureLevel[]
  readonly guess: PictureGuess | null
  readonly wind: number
  readonly adrift: Adrift | null
  readonly collapse: number | null
}

const PARTS: Readonly<Record<Topic, readonly PicturePart[]>> = {
  push: ['push', 'face'],
  floats: [],
  unroll: ['push', 'onSkirt'],
  grip: ['push', 'onSkirt', 'uplift'],
  creep: ['onSkirt', 'uplift'],
  grounds: ['push', 'onSkirt', 'uplift'],
  night: [],
  puncture: [],
  wind: [],
  pond: ['push', 'onSkirt', 'uplift'],
  leave: [],
}

/** The picture of a scene at one moment. */
export function scenePicture(of: PictureOf): ScenePicture {
  const { scene, setting } = of
  const { values, hasStone } = setting
  const isBlown = scene.topic === 'wind' && values.depth === 0
  const extra: PicturePart[] = []
  if (hasStone) extra.push('stone')
  if (values.crease > 0) extra.push('crease')
  if (isBlown && of.isShown) extra.push('bags')
  return {
    ...pictureBars(of),
    room: { skirtLength: scene.start.tube.skirtLength, depth: setting.tube.diameter },
    parts: [...PARTS[scene.topic], ...extra],
    levels: levelsOf(of),
    guess: guessOf(of),
    wind: isBlown && values.gust > 0 ? windOn(setting, values.gust).force : 0,
    adrift: adriftOf(of),
    collapse: collapseOf(of),
  }
}

function levelsOf({ scene, facts, isShown }: PictureOf): readonly PictureLevel[] {
  if (!isShown) return []
  if (scene.topic === 'grounds') {
    return facts.onGrounds.map(({ id, holdsTo }) => ({
      id,
      depth: holdsTo,
      line: 'holdsToLine',
      text: 'label',
      message: said(`draw.on.${id}`, { depth: limit(holdsTo) }),
    }))
  }
  if (scene.topic === 'floats' && facts.lost !== null) return [goneLevel(facts.lost)]
  if (scene.topic !== 'leave' || facts.leave === null || facts.leave < 0) return []
  return [
    {
      id: 'holds-to',
      depth: facts.holdsTo,
      line: 'holdsToLine',
      text: 'labelHolds',
      message: said('draw.holdsTo', { depth: limit(facts.holdsTo) }),
    },
    {
      id: 'leave',
      depth: facts.leave,
      line: 'leave',
      text: 'labelNarrow',
      message: said('draw.leave', { depth: limit(facts.leave) }),
    },
  ]
}

function goneLevel(lost: number): PictureLevel {
  const depth = quantity(lost, 'smallLength')
  const message = said('draw.gone', { depth })
  return { id: 'gone', depth: lost, line: 'leave', text: 'labelFails', message }
}

/** The guess in words, as it stands on drawing and stage. */
export function guessMessage({ guess: { kind, decimals } }: CourseScene, value: number) {
  return said('guess.mark', { guess: quantity(value, kind, decimals) })
}

function guessOf({ scene, setting, guess }: PictureOf): PictureGuess | null {
  const { place } = scene.guess
  if (guess === null || place === 'chart') return null
  return { place, value: onPicture(scene, setting, guess), message: guessMessage(scene, guess) }
}

/** A guess in the unit of the bar that it is marked on. */
function onPicture({ topic }: CourseScene, setting: DemoSetting, guess: number): number {
  switch (topic) {
    case 'push':
    case 'unroll':
      return guess * sectionOf(setting).gravity
    case 'creep':
      return (1 - guess) * balanceAt(setting, { edgeFactor: EDGE_FACTORS.sealed }).grip
    case 'wind':
      return windOn(setting, guess).force
    default:
      return guess
  }
}

/** How far a lost tube is carried while the water rises by one of its radii [diameters]. */
const CARRIED = 2

/** A tube without its skirt: on the ground, then afloat with the water that lifts it. */
function adriftOf({ setting, facts }: PictureOf): Adrift | null {
  const { values, tube } = setting
  if (values.skirtLength > 0) return null
  const { lost, floating } = facts
  if (lost === null || values.depth <= lost) return { lift: 0, drift: 0, turn: 0 }
  const radius = tube.diameter / 2
  const drift = CARRIED * tube.diameter * ((values.depth - lost) / radius) ** 1.5
  const lift = floating === null ? 0 : Math.max(0, values.depth - floating)
  return { lift, drift, turn: drift / radius }
}

/** How much of a tube that no longer stands is gone: 0 at the pressure at which it gave way. */
function collapseOf({ scene, setting, evaluation, facts }: PictureOf): number | null {
  const { leastPressure } = facts
  if (scene.topic !== 'puncture' || evaluation.loadedShape.solved) return null
  if (leastPressure === null || evaluation.loadedShape.reason !== 'gives-way') return null
  return Math.min(1, Math.max(0, 1 - airPressureNow(setting.values) / leastPressure))
}
