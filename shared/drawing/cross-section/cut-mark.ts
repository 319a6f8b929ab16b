import { areaPath, linePath, reversed } from '../path-data'
import type { Point } from '../scene'
import { addPath, type Composition } from './composition'
import { groundYAt, levelY } from './section-frame'

/** Zigzag of a cut: how far its teeth go, and how far apart they sit [px]. */
const TOOTH = 5
const PITCH = 30

/** The cut ends above the legend [px]. */
const ABOVE_FOOT = 28

/** The cut begins this far above water and ground [px]. */
const RISE = 16

/** A long skirt is cut: a gap through everything between two broken lines. */
export function drawCut(drawing: Composition): void {
  const { frame, placer, input } = drawing
  const { cut } = frame.axis
  if (!cut) return
  const surface = levelY(frame, input.case.water.depth)
  const top = Math.max(0, Math.min(surface, groundYAt(frame, cut.fromPx)) - RISE)
  const bottom = frame.height - ABOVE_FOOT
  const left = brokenLine(cut.fromPx, top, bottom)
  const right = brokenLine(cut.toPx, top, bottom)
  addPath(drawing, 'cut-gap', 'cutGap', areaPath([...left, ...reversed(right)]))
  addPath(drawing, 'cut-line', 'cutLine', linePath(left) + linePath(right))
  placer.reserve({ left: cut.fromPx - TOOTH, right: cut.toPx + TOOTH, top, bottom })
}

function brokenLine(x: number, top: number, bottom: number): readonly Point[] {
  const points: Point[] = [{ x, y: top }]
  for (let y = top; y + PITCH <= bottom; y += PITCH) {
    const middle = y + PITCH / 2
    points.push({ x, y: middle - 6 }, { x: x - TOOTH, y: middle - 2 })
    points.push({ x: x + TOOTH, y: middle + 2 }, { x, y: middle + 6 })
  }
  return [...points, { x, y: bottom }]
}
