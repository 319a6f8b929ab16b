import { sectionGeometry } from '../../calc/section/section-geometry'
import { upliftShare } from '../../calc/uplift/uplift-share'
import type { SectionCase } from '../../schemas/section-case'
import { areaPath, linePath, segmentsPath } from '../path-data'
import type { Point, SceneItem } from '../scene'
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

/** Points of the pressure from below. */
const STEPS = 40
/** Half the thickness left for the skirt between both diagrams [px]. */
const GAP = 6

interface Axes {
  readonly left: number
  readonly right: number
  /** The skirt. */
  readonly middle: number
  readonly perPascal: number
  readonly x: (at: number) => number
}

function axesOf({ section, view }: PressureDiagramInput, greatest: number): Axes {
  const { base } = sectionGeometry(section)
  const [left, right] = [0.47 * view.width, view.width - 16]
  const room = view.height - TOP - BELOW
  return {
    left,
    right,
    middle: TOP + 0.48 * room,
    perPascal: (0.4 * room) / greatest,
    x: (at) => left + (at / Math.max(base, 1e-6)) * (right - left),
  }
}

/** What presses on the skirt and from below, against the place on the base. */
export function baseItems(input: PressureDiagramInput, greatest: number): readonly SceneItem[] {
  const axes = axesOf(input, greatest)
  const { left, right, middle, x } = axes
  const { base } = sectionGeometry(input.section)
  const ends = [
    { x: x(0), y: middle },
    { x: x(base), y: middle },
  ] as const
  return [
    ...onItems(input, axes),
    ...underItems(input, axes, greatest),
    path('skirt', 'skirt', segmentsPath([ends])),
    label(
      'base-name',
      { key: 'sheet.diagram.base' },
      { x: (left + right) / 2, y: input.view.height - BELOW + 15, anchor: 'middle' },
    ),
  ]
}

function onItems({ section, result }: PressureDiagramInput, axes: Axes): readonly SceneItem[] {
  const { middle, perPascal, x } = axes
  const { base, wettedSkirt, unitWeight, depth } = sectionGeometry(section)
  const weld = base - section.barrier.contactWidth
  const [from, to] = [x(weld - wettedSkirt), x(weld)]
  const top = middle - GAP - unitWeight * depth * perPascal
  const area = [
    { x: from, y: top },
    { x: to, y: top },
    { x: to, y: middle - GAP },
    { x: from, y: middle - GAP },
  ]
  const isDeep = middle - GAP - top > 6
  const down = middles(from, to, 9).map((at) => ({
    from: { x: at, y: top },
    to: { x: at, y: middle - 3 },
  }))
  return [
    path('on-area', 'waterOverlay', areaPath(area)),
    path('on-line', 'envelope', linePath(area.slice(0, 2))),
    ...(isDeep ? arrows('on-arrows', 'pressure', down) : []),
    label(
      'on-text',
      quantityText('down', 'pressure', result.vertical.waterOnSkirt, 'forcePerLength'),
      { x: from, y: top - 7, role: 'labelWater', weight: 600 },
    ),
  ]
}

function underItems(
  { section, result }: PressureDiagramInput,
  axes: Axes,
  greatest: number,
): readonly SceneItem[] {
  const { right, middle, perPascal, x } = axes
  const { base } = sectionGeometry(section)
  const line = middle + GAP
  const under = underPoints(section).map(({ at, pressure }) => ({
    x: x(at),
    y: line + pressure * perPascal,
  }))
  const area = [{ x: x(0), y: line }, ...under, { x: x(base), y: line }]
  return [
    path('under-area', 'upliftArea', areaPath(area)),
    path('under-line', 'upliftLine', linePath(under)),
    ...arrows('under-arrows', 'uplift', arrowsUp(under, line)),
    label('under-text', quantityText('up', 'force', result.vertical.uplift, 'forcePerLength'), {
      x: right,
      y: line + 0.86 * greatest * perPascal,
      anchor: 'end',
      role: 'labelUplift',
      weight: 600,
    }),
  ]
}

function arrowsUp(under: readonly Point[], line: number) {
  return under
    .filter((_, i) => i % 4 === 2)
    .filter(({ y }) => y - line > 4)
    .map(({ x, y }) => ({ from: { x, y }, to: { x, y: line - 2 } }))
}

/** Pressure under the base from the wet edge to the dry toe. */
function underPoints(section: SectionCase): readonly Loaded[] {
  const { base, edgeDepth, unitWeight } = sectionGeometry(section)
  const { uplift, water } = section
  const places = Array.from({ length: STEPS + 1 }, (_, i) => (i / STEPS) * base)
  if (uplift.model === 'none' || base === 0) return places.map((at) => ({ at, pressure: 0 }))
  const excess = uplift.edgeFactor * edgeDepth - water.dryDepth
  return places.map((at) => ({
    at,
    pressure: unitWeight * (water.dryDepth + excess * upliftShare(uplift, base, at)),
  }))
}
