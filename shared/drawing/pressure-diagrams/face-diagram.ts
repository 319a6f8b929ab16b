import { dynamicDepth } from '../../calc/moving-water/current-thrust'
import { waveThrust } from '../../calc/moving-water/wave-thrust'
import { sectionGeometry } from '../../calc/section/section-geometry'
import { areaPath, linePath, segmentsPath } from '../path-data'
import type { SceneItem } from '../scene'
import {
  arrows,
  BELOW,
  label,
  middles,
  path,
  quantityText,
  TOP,
  type Loaded,
  type PressureDiagramInput,
} from './diagram-items'

/** Pressure on the face from the ground up: still water, current, waves. */
export function facePressures({ section, result }: PressureDiagramInput): readonly Loaded[] {
  const { water, gravity, barrier } = section
  const { depth, unitWeight } = sectionGeometry(section)
  const current = unitWeight * dynamicDepth(water.currentSpeed, water.dragCoefficient, gravity)
  const crest = result.loadedShape.solved ? result.loadedShape.crest : barrier.diameter
  const period = water.wavePeriod ?? 1
  const attack = { height: water.waveHeight, period, depth, crest, unitWeight, gravity }
  const waves = waveThrust(attack)
  const foot = { at: 0, pressure: unitWeight * depth + current + waves.groundPressure }
  const surface = { at: depth, pressure: current + waves.surfacePressure }
  if (waves.wettedAbove === 0) return [foot, surface]
  const crown = { at: depth + waves.wettedAbove, pressure: waves.crestPressure }
  return [foot, surface, { at: depth, pressure: waves.surfacePressure }, crown]
}

interface Axes {
  readonly ground: number
  readonly wall: number
  readonly x: (pressure: number) => number
  readonly y: (at: number) => number
}

function axesOf(
  { section, view }: PressureDiagramInput,
  face: readonly Loaded[],
  greatest: number,
) {
  const ground = view.height - BELOW
  const wall = 0.38 * view.width
  const top = Math.max(section.water.depth, ...face.map(({ at }) => at), 1e-6)
  const perMetre = (ground - TOP) / top
  const perPascal = (0.2 * view.width) / greatest
  return {
    ground,
    wall,
    x: (pressure: number) => wall - pressure * perPascal,
    y: (at: number) => ground - at * perMetre,
  }
}

/** What presses on the face, against height, with its resultant. */
export function faceItems(
  input: PressureDiagramInput,
  face: readonly Loaded[],
  greatest: number,
): readonly SceneItem[] {
  const axes = axesOf(input, face, greatest)
  const { ground, wall, x, y } = axes
  const outline = face.map(({ at, pressure }) => ({ x: x(pressure), y: y(at) }))
  const [foot, crown] = [face[0]!, face.at(-1)!]
  const area = [{ x: wall, y: ground }, ...outline, { x: wall, y: y(crown.at) }]
  const upright = { x: wall, y: TOP - 12 }
  return [
    path('face-area', 'waterOverlay', areaPath(area)),
    path('face-line', 'envelope', linePath(outline)),
    ...arrows('face-arrows', 'pressure', faceArrows(face, axes)),
    path('wall', 'axis', segmentsPath([[upright, { x: wall, y: ground }]])),
    path(
      'ground',
      'groundLine',
      segmentsPath([
        [
          { x: 16, y: ground },
          { x: wall + 14, y: ground },
        ],
      ]),
    ),
    label('face-pressure', quantityText('pressure', 'pressure', foot.pressure, 'pressure'), {
      x: x(foot.pressure),
      y: ground + 15,
      anchor: 'middle',
      role: 'labelWater',
    }),
    label('face-name', { key: 'sheet.diagram.face' }, { x: wall, y: ground + 15, anchor: 'end' }),
    ...resultantItems(input, axes, greatest),
  ]
}

function resultantItems(
  { result }: PressureDiagramInput,
  { x, y }: Axes,
  greatest: number,
): readonly SceneItem[] {
  const { total, arm } = result.thrust
  if (arm === null || total <= 0) return []
  const at = y(arm)
  const to = { x: x(greatest) - 14, y: at }
  return [
    ...arrows('thrust', 'force', [{ from: { x: 20, y: at }, to }]),
    label('thrust-text', quantityText('thrust', 'force', total, 'forcePerLength'), {
      x: 20,
      y: at - 10,
      role: 'labelForce',
      weight: 600,
    }),
    label('thrust-arm', quantityText('at', 'height', arm, 'length'), { x: 20, y: at + 19 }),
  ]
}

function faceArrows(face: readonly Loaded[], { x, y, wall }: Axes) {
  const [foot, surface] = [face[0]!, face[1]!]
  return middles(0, 1, 7)
    .map((share) => {
      const at = foot.at + share * (surface.at - foot.at)
      const pressure = foot.pressure + share * (surface.pressure - foot.pressure)
      return { from: { x: x(pressure), y: y(at) }, to: { x: wall, y: y(at) } }
    })
    .filter(({ from }) => wall - from.x > 3)
}
