import { boxAround } from '../label-placer'
import { linePath } from '../path-data'
import type { Arrow, Point } from '../scene'
import { addArrows, addPath, drawingText, quietLabel, type Composition } from './composition'
import { pressureLength } from './forces'
import { levelY } from './section-frame'

/** Highest a wave may be in this depth: the share at which it breaks. */
const BREAKING = 0.78

/** Nothing is drawn closer to the top edge [px]. */
const TOP_EDGE = 4

/** Current, waves and floating debris, where there are any. */
export function drawExtras(drawing: Composition): void {
  if (drawing.input.case.water.depth <= 0) return
  drawWaves(drawing)
  drawCurrent(drawing)
  drawDebris(drawing)
}

/** Height that the waves take from the freeboard [m]. */
export function waveAllowance({ input }: Composition): number {
  const { waveHeight, depth } = input.case.water
  return Math.min(waveHeight, BREAKING * depth)
}

/**
 * The wave in front of the face, at its crest there: reflected, it rises by its whole height. Length
 * in shallow water, T √(g h), to scale.
 */
function drawWaves(drawing: Composition): void {
  const { frame, input, body } = drawing
  const { waveHeight, wavePeriod, depth } = input.case.water
  if (waveHeight <= 0) return
  const rise = frame.scale * waveAllowance(drawing)
  const still = levelY(frame, depth)
  const length = Math.max(
    24,
    frame.scale * (wavePeriod ?? 1) * Math.sqrt(input.case.gravity * depth),
  )
  const from = body.top.x - (input.case.barrier.diameter * frame.scale) / 2
  const step = Math.max(4, length / 24)
  const points: Point[] = []
  for (let x = from; x > 0; x -= step) {
    const y = still - rise * Math.cos((2 * Math.PI * (from - x)) / length)
    points.push({ x, y: Math.max(TOP_EDGE, Math.min(y, frame.groundY)) })
  }
  addPath(drawing, 'wave', 'wave', linePath(points))
  for (let index = 0; index + 2 < points.length; index += 2) {
    drawing.placer.avoid(boxAround(points[index]!, points[index + 2]!, 1))
  }
}

function drawCurrent(drawing: Composition): void {
  const arrows = currentArrows(drawing)
  addArrows(drawing, 'current', 'flow', arrows)
  for (const { from, to } of arrows) drawing.placer.reserve(boxAround(from, to, 4))
}

function currentArrows(drawing: Composition): readonly Arrow[] {
  const { frame, input } = drawing
  const { currentSpeed, depth } = input.case.water
  if (currentSpeed <= 0) return []
  const length = frame.layout.name === 'narrow' ? 34 : 52
  const x = frame.layout.gutterLeft + 10
  const surface = levelY(frame, depth)
  const height = frame.groundY - surface
  return [0.3, 0.42].map((share) => {
    const y = surface + height * share
    return { from: { x, y }, to: { x: x + length, y } }
  })
}

/** A log that floats against the tube, and its force. */
function drawDebris(drawing: Composition): void {
  const { input } = drawing
  if (input.evaluation.thrust.debris <= 0) return
  const log = floatingLog(drawing)
  const { centre, radius } = log
  drawing.shapes.push(
    { kind: 'circle', id: 'debris', role: 'debris', cx: centre.x, cy: centre.y, r: radius },
    {
      kind: 'circle',
      id: 'debris-ring',
      role: 'debris',
      cx: centre.x,
      cy: centre.y,
      r: radius / 2,
    },
  )
  addArrows(drawing, 'debris-force', 'force', [debrisArrow(drawing, log)])
  drawing.placer.reserve(
    boxAround(
      { x: centre.x - radius, y: centre.y - radius },
      { x: centre.x + radius, y: centre.y + radius },
    ),
  )
}

/** Room between the log and the wet edge of the drawing [px]. */
const WET_EDGE = 22

/** The middle of the log lies this share of its radius below the surface. */
const SUNK = 0.4

interface Log {
  readonly centre: Point
  readonly radius: number
}

function floatingLog({ frame, input, body }: Composition): Log {
  const { depth } = input.case.water
  const radius = (frame.scale * Math.min(input.case.debris.draught, depth)) / 2
  const surface = levelY(frame, depth)
  const mostByTube = 0.25 * frame.scale * input.case.barrier.diameter
  const mostByView = (surface - TOP_EDGE) / (1 - SUNK)
  const shown = Math.max(4, Math.min(radius, mostByTube, mostByView))
  const left = Math.min(...body.wetFace.slice(1).map(({ x }) => x), body.centre.x)
  const face = Math.max(left, body.centre.x - frame.scale * input.case.barrier.diameter * 0.55)
  const x = Math.max(shown + WET_EDGE, face - shown - 3)
  return { centre: { x, y: surface + shown * SUNK }, radius: shown }
}

function debrisArrow({ frame, input }: Composition, { centre, radius }: Log): Arrow {
  const y = levelY(frame, input.case.water.depth)
  const to = { x: centre.x - radius - 3, y }
  const length = frame.forceScale * input.evaluation.thrust.debris
  const shift = Math.max(0, length + 4 - to.x)
  return { from: { x: to.x - length + shift, y }, to: { x: to.x + shift, y } }
}

/** What moves and floats, in words. */
export function labelExtras(drawing: Composition): void {
  if (drawing.input.case.water.depth <= 0) return
  labelWaves(drawing)
  labelCurrent(drawing)
  labelDebris(drawing)
}

function labelWaves(drawing: Composition): void {
  const { input, frame, placer } = drawing
  const { waveHeight, depth } = input.case.water
  if (waveHeight <= 0) return
  const message = drawingText('waves', { height: { value: waveHeight, kind: 'length' } })
  const y = levelY(frame, depth + waveAllowance(drawing)) - 7
  const x = frame.axis.toPx(0)
  placer.place(quietLabel(drawing, 'waves-value', message, 'labelWater'), [
    { x: x - 60, y, anchor: 'end' },
    { x: x - 60, y: y - 16, anchor: 'end' },
    { x: x - 160, y, anchor: 'end' },
    { x: frame.layout.gutterLeft, y: y - 16, anchor: 'start' },
  ])
}

function labelCurrent(drawing: Composition): void {
  const { input, placer } = drawing
  const last = currentArrows(drawing)[0]
  if (!last) return
  const speed = { value: input.case.water.currentSpeed, kind: 'speed' } as const
  const label = quietLabel(
    drawing,
    'current-value',
    drawingText('current', { speed }),
    'labelWater',
  )
  placer.placeSurely(label, [
    { x: last.to.x + 8, y: last.to.y + 8, anchor: 'start' },
    { x: last.from.x, y: last.to.y - 10, anchor: 'start' },
    { x: last.from.x, y: last.to.y + 34, anchor: 'start' },
  ])
}

function labelDebris(drawing: Composition): void {
  const { input, placer, frame } = drawing
  const { debris } = input.evaluation.thrust
  if (debris <= 0) return
  const { to } = debrisArrow(drawing, floatingLog(drawing))
  const message = drawingText('debris', { force: { value: debris, kind: 'forcePerLength' } })
  const inset = pressureLength(drawing, frame.groundY) / 2
  placer.place(quietLabel(drawing, 'debris-value', message, 'labelForce'), [
    { x: to.x, y: to.y - 12, anchor: 'end' },
    { x: to.x - inset, y: to.y - 28, anchor: 'end' },
    { x: to.x, y: to.y + 22, anchor: 'end' },
  ])
}
