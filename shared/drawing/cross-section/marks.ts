import { spreadColumn, type Label, type Spot } from '../label-placer'
import { areaPath, linePath, segmentsPath } from '../path-data'
import { niceAbove } from '../nice-ticks'
import type { Point, ShapeRole, TextRole } from '../scene'
import { addPath, drawingText, quietLabel, valueLabel, type Composition } from './composition'
import { faceX } from './forces'
import { GREATEST_DEPTH, levelY } from './section-frame'
import { levelMarkX } from './water'
import type { Quantity } from '../../units'

/** The staff at the wet edge: its place, its width and the least height of a block [px]. */
const STAFF_X = 10
const STAFF_WIDTH = 6
const LEAST_BLOCK = 9

/** A graduated staff on which marks can be read, from the ground to the greatest depth. */
export function drawStaff(drawing: Composition): void {
  const { frame, input } = drawing
  const top = GREATEST_DEPTH * input.case.barrier.diameter
  const block = niceAbove(LEAST_BLOCK / frame.scale)
  const blocks: string[] = []
  for (let index = 0; index * block < top - 1e-9; index += 2) {
    const from = levelY(frame, index * block)
    const to = levelY(frame, Math.min(top, (index + 1) * block))
    blocks.push(areaPath(column(from, to)))
  }
  addPath(drawing, 'staff-frame', 'staffFrame', areaPath(column(frame.groundY, levelY(frame, top))))
  addPath(drawing, 'staff', 'staff', blocks.join(''))
  drawing.placer.reserve({
    left: STAFF_X,
    right: STAFF_X + STAFF_WIDTH,
    top: levelY(frame, top),
    bottom: frame.groundY,
  })
}

function column(from: number, to: number): readonly Point[] {
  return [
    { x: STAFF_X, y: from },
    { x: STAFF_X + STAFF_WIDTH, y: from },
    { x: STAFF_X + STAFF_WIDTH, y: to },
    { x: STAFF_X, y: to },
  ]
}

interface Mark {
  readonly name: 'low' | 'expected' | 'high' | 'holdsTo' | 'leave'
  readonly depth: number
  readonly line: ShapeRole
  readonly text: TextRole
}

const KINDS: readonly Omit<Mark, 'depth'>[] = [
  { name: 'holdsTo', line: 'holdsTo', text: 'label' },
  { name: 'leave', line: 'leave', text: 'label' },
  { name: 'high', line: 'forecast', text: 'label' },
  { name: 'expected', line: 'forecast', text: 'label' },
  { name: 'low', line: 'forecast', text: 'label' },
]

/** Marks that lie inside the drawing, from the highest to the lowest. */
function marksOf({ input, frame }: Composition): readonly Mark[] {
  const greatest = GREATEST_DEPTH * input.case.barrier.diameter
  const isNarrow = frame.layout.name === 'narrow'
  return KINDS.flatMap((kind): Mark[] => {
    const depth = input.marks?.[kind.name]
    if (depth === null || depth === undefined || depth < 0 || depth > greatest) return []
    if (isNarrow && kind.line === 'forecast') return []
    return [{ ...kind, depth }]
  }).sort((a, b) => b.depth - a.depth)
}

/** Where the texts of the column begin, and the least distance of their base lines. */
const TEXT_X = 32
const LINE_GAP = 4

/** Marks of the forecast, holds-to and leave level, and the level of the water now. */
export function drawMarks(drawing: Composition): void {
  labelLevel(drawing)
  const marks = marksOf(drawing)
  const heights = columnHeights(drawing, marks)
  const rise = riseOf(drawing, marks, heights)
  marks.forEach((mark, index) => drawMark(drawing, mark, heights[index]! - rise))
}

/** How far all texts of the column rise together, so that each has room [px]; 0: no rise gives it. */
function riseOf(drawing: Composition, marks: readonly Mark[], heights: readonly number[]): number {
  const hasRoom = (rise: number): boolean =>
    marks.every((mark, index) =>
      drawing.placer.hasRoom(markLabel(drawing, mark), textSpot(heights[index]! - rise)),
    )
  return MOVES.find(hasRoom) ?? 0
}

function textSpot(y: number): Spot {
  return { x: TEXT_X, y, anchor: 'start' }
}

/** The level of the water, where the level of the ground is known; on a phone the depth without it. */
function labelLevel(drawing: Composition): void {
  const { input, frame, placer } = drawing
  const { depth } = input.case.water
  const y = levelY(frame, depth) - 6
  const mark = levelMarkX(drawing)
  const spots: readonly Spot[] = [
    { x: mark + 12, y, anchor: 'start' },
    { x: mark - 12, y, anchor: 'end' },
    { x: mark - 12, y: y - frame.layout.grip - 6, anchor: 'middle' },
  ]
  const isNarrow = frame.layout.name === 'narrow'
  const values = heightValues(drawing, depth)
  if (values.level) {
    const name = isNarrow ? 'level' : 'levelNow'
    placer.placeSurely(
      valueLabel(drawing, 'level-value', 'labelWater', drawingText(name, values)),
      spots,
    )
  } else if (isNarrow) {
    const label = valueLabel(drawing, 'depth-value', 'labelWater', drawingText('depth', values))
    placer.placeSurely(label, spots)
  }
}

function heightValues(
  { input }: Composition,
  depth: number,
  rounding?: 'down',
): Record<string, Quantity | string> {
  const round = rounding ? { rounding } : {}
  const shown: Quantity = { value: depth, kind: 'length', ...round }
  const { level } = input
  if (!level) return { depth: shown }
  return {
    depth: shown,
    level: { value: level.ground + depth, kind: 'length', ...round },
    datum: level.datum,
  }
}

/** Base lines of the texts: spread above the surface, and what has no room there below it. */
function columnHeights(drawing: Composition, marks: readonly Mark[]): readonly number[] {
  const { frame, input } = drawing
  const gap = frame.layout.small + LINE_GAP
  const surface = levelY(frame, input.case.water.depth)
  const top = frame.layout.top + frame.layout.small
  const lowest = surface - 5
  const room = Math.max(0, Math.floor((lowest - top) / gap) + 1)
  const aboveCount = Math.min(
    room,
    marks.filter(({ depth }) => levelY(frame, depth) < surface).length,
  )
  const baseline = ({ depth }: Mark) => levelY(frame, depth) + frame.layout.small * 0.35
  const above = spreadColumn(marks.slice(0, aboveCount).map(baseline), gap, { top, bottom: lowest })
  const below = spreadColumn(marks.slice(aboveCount).map(baseline), gap, {
    top: surface + frame.layout.small + 4,
    bottom: frame.height - 44,
  })
  return [...above, ...below]
}

/** One by one only downwards, so that the texts keep the order of their marks [px]. */
const MOVES = [0, 6, 12, 18, 24, 30, 36, 42, 48] as const

function drawMark(drawing: Composition, mark: Mark, baseline: number): void {
  const { frame, placer } = drawing
  const y = levelY(frame, mark.depth)
  const middle = baseline - frame.layout.small * 0.35
  const label = markLabel(drawing, mark)
  const start = STAFF_X + STAFF_WIDTH
  addPath(
    drawing,
    `mark-${mark.name}`,
    mark.line,
    linePath([
      { x: start, y },
      { x: start + 5, y },
      { x: TEXT_X - 8, y: middle },
      { x: TEXT_X - 4, y: middle },
    ]),
  )
  const spots = MOVES.map((move) => textSpot(baseline + move))
  placer.placeOverLines(label, spots)
  if (mark.name !== 'holdsTo' || frame.layout.name === 'narrow') return
  const from = TEXT_X + placer.width(label) + 8
  const to = faceX(drawing, y) - 6
  const parts = to <= from ? [] : placer.freeParts(y, from, to)
  if (parts.length === 0) return
  const lines = parts.map(([left, right]): [Point, Point] => [
    { x: left, y },
    { x: right, y },
  ])
  addPath(drawing, 'mark-line-holdsTo', 'holdsToLine', segmentsPath(lines))
  placer.avoid({ left: from, right: to, top: y - 1, bottom: y + 1 })
}

function markLabel(drawing: Composition, { name, depth, text }: Mark): Label {
  const rounding = name === 'holdsTo' || name === 'leave' ? 'down' : undefined
  const values = heightValues(drawing, depth, rounding)
  const message = drawingText(values.level ? `mark.${name}Level` : `mark.${name}`, values)
  return quietLabel(drawing, `mark-${name}-value`, message, text)
}
