import type { Point } from '../scene'
import type { ChartFrame } from './chart-frame'
import type { FactorPoint } from './factor-chart-input'

/** The pieces of a curve that lie between the axis and the cap [px], cut exactly at both. */
export function curvePieces(
  frame: ChartFrame,
  points: readonly FactorPoint[],
): readonly (readonly Point[])[] {
  const pieces: Point[][] = []
  let piece: Point[] = []
  const finish = () => {
    if (piece.length > 1) pieces.push(piece)
    piece = []
  }
  points.forEach((point, index) => {
    const { factor } = point
    if (factor === null) return finish()
    const before = points[index - 1]
    const isInside = factor >= 0 && factor <= frame.cap
    if (before && before.factor !== null) {
      const from = { depth: before.depth, factor: before.factor }
      const edge = edgeBetween(frame, from, { depth: point.depth, factor })
      if (edge) piece.push(edge)
      if (edge && !isInside) finish()
    }
    if (isInside) piece.push({ x: frame.toX(point.depth), y: frame.toY(factor) })
  })
  finish()
  return pieces
}

interface Step {
  readonly depth: number
  readonly factor: number
}

/** Where a step of the curve passes the cap or the axis; null: it stays on one side. */
function edgeBetween(frame: ChartFrame, from: Step, to: Step): Point | null {
  for (const edge of [frame.cap, 0]) {
    if (from.factor > edge === to.factor > edge) continue
    if (from.factor === edge || to.factor === edge) continue
    const share = (edge - from.factor) / (to.factor - from.factor)
    return { x: frame.toX(from.depth + share * (to.depth - from.depth)), y: frame.toY(edge) }
  }
  return null
}

/** The factor at a depth, between the points; null where the curve has a gap or has ended. */
export function factorAt(points: readonly FactorPoint[], depth: number): number | null {
  for (let index = 0; index + 1 < points.length; index++) {
    const from = points[index]!
    const to = points[index + 1]!
    if (depth < from.depth || depth > to.depth) continue
    if (from.factor === null || to.factor === null) return null
    const span = to.depth - from.depth
    return span === 0
      ? from.factor
      : from.factor + ((to.factor - from.factor) * (depth - from.depth)) / span
  }
  return null
}
