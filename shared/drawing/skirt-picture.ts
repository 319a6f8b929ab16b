import { areaPath, coordinate, linePath, segmentsPath } from './path-data'
import type { Point, Scene, SceneItem, ShapeRole, TextAnchor, TextRole } from './scene'

/** Size of the picture [px]; it is not to scale, and says which side is which, nothing else. */
const WIDTH = 360
const HEIGHT = 168
const GROUND_Y = 128
const WATER_Y = 72

/** The tube: where it stands and its radius [px]. */
const TUBE = { x: 216, r: 42 } as const

/** Where the skirt begins [px]. */
const SKIRT_X = 52

/** Somebody on the dry side: where they stand and how tall they are [px]. */
const PERSON = { x: 318, height: 62 } as const

const TEXT_SIZE = 14

/**
 * Which way the skirt faces: flat on the ground to the water, the tube at its dry end. Water left, dry
 * side right, as in every drawing.
 */
export function skirtPicture(): Scene {
  return {
    width: WIDTH,
    height: HEIGHT,
    title: { key: 'deploymentOrder.skirt.picture.title' },
    description: [{ key: 'deploymentOrder.skirt.picture.describe' }],
    items: [...shapes(), ...labels()],
  }
}

function path(id: string, role: ShapeRole, d: string): SceneItem {
  return { kind: 'path', id, role, d }
}

function shapes(): readonly SceneItem[] {
  const { x, r } = TUBE
  const centreY = GROUND_Y - r
  const touchX = x - Math.sqrt(r ** 2 - (centreY - WATER_Y) ** 2)
  const [touch, radius] = [`${coordinate(touchX)} ${WATER_Y}`, `${r} ${r}`]
  const water = `M0 ${WATER_Y}L${touch}A${radius} 0 0 0 ${x} ${GROUND_Y}L0 ${GROUND_Y}Z`
  const ground: readonly Point[] = [
    { x: 0, y: GROUND_Y },
    { x: WIDTH, y: GROUND_Y },
    { x: WIDTH, y: HEIGHT },
    { x: 0, y: HEIGHT },
  ]
  const tube = { cx: x, cy: centreY, r }
  return [
    path('water', 'water', water),
    path('water-line', 'waterLine', `M0 ${WATER_Y}L${touch}`),
    path('ground', 'ground', areaPath(ground)),
    path('ground-line', 'groundLine', linePath(ground.slice(0, 2))),
    { kind: 'circle', id: 'tube-fill', role: 'barrierFill', ...tube },
    { kind: 'circle', id: 'tube', role: 'barrier', ...tube },
    path('skirt', 'skirt', `M${SKIRT_X} ${GROUND_Y}L${x} ${GROUND_Y}`),
    ...person(),
  ]
}

/** Head, body, arms and legs. */
function person(): readonly SceneItem[] {
  const { x, height } = PERSON
  const at = (share: number): number => GROUND_Y - share * height
  const limbs = segmentsPath([
    [
      { x, y: at(0.76) },
      { x, y: at(0.4) },
    ],
    [
      { x, y: at(0.4) },
      { x: x - 9, y: at(0) },
    ],
    [
      { x, y: at(0.4) },
      { x: x + 9, y: at(0) },
    ],
    [
      { x, y: at(0.7) },
      { x: x - 12, y: at(0.46) },
    ],
    [
      { x, y: at(0.7) },
      { x: x + 12, y: at(0.46) },
    ],
  ])
  return [
    path('body', 'curve', limbs),
    { kind: 'circle', id: 'head', role: 'nowDot', cx: x, cy: at(0.88), r: 7 },
  ]
}

function labels(): readonly SceneItem[] {
  const label = (key: string, role: TextRole, place: Point, anchor: TextAnchor): SceneItem => ({
    ...{ kind: 'text', id: key, role, ...place, anchor, size: TEXT_SIZE, weight: 600 },
    message: { key: `deploymentOrder.skirt.picture.${key}` },
  })
  const below = GROUND_Y + 25
  return [
    label('water', 'labelWater', { x: 58, y: WATER_Y + 28 }, 'start'),
    label('skirt', 'labelBarrier', { x: SKIRT_X - 4, y: below }, 'start'),
    label('tube', 'labelBarrier', { x: TUBE.x, y: GROUND_Y - TUBE.r + 5 }, 'middle'),
    label('dry', 'labelDry', { x: WIDTH - 10, y: 34 }, 'end'),
  ]
}
