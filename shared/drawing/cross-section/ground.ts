import { areaPath, linePath, segmentsPath } from '../path-data'
import type { Point } from '../scene'
import { addPath, type Composition } from './composition'
import { groundPoints, groundYAt } from './section-frame'

/** Distance between the groups of hatching, and between the strokes of one [px]. */
const GROUP = 34
const STROKE = 5
const STROKES = 3
const LENGTH = 8

/** The strip of ground in its true slope, with the hatching that marks earth. */
export function drawGround(drawing: Composition): void {
  const { frame } = drawing
  const top = groundPoints(frame, 0, frame.width)
  const corners = [
    { x: frame.width, y: frame.height },
    { x: 0, y: frame.height },
  ]
  addPath(drawing, 'ground', 'ground', areaPath([...top, ...corners]))
  addPath(drawing, 'ground-hatch', 'groundHatch', segmentsPath(hatching(drawing)))
  addPath(drawing, 'ground-line', 'groundLine', linePath(top))
}

function hatching(drawing: Composition): [Point, Point][] {
  const { frame } = drawing
  const strokes: [Point, Point][] = []
  for (let x = GROUP / 2; x < frame.width - 4; x += GROUP) {
    for (let index = 0; index < STROKES; index++) {
      const from = x + index * STROKE
      if (from > frame.width || isCut(drawing, from)) continue
      const y = groundYAt(frame, from)
      if (y < 0 || y + LENGTH > frame.height) continue
      strokes.push([
        { x: from, y },
        { x: Math.max(0, from - LENGTH), y: y + LENGTH },
      ])
    }
  }
  return strokes
}

/** True inside the gap that a cut leaves. */
export function isCut(drawing: Composition, px: number): boolean {
  const { cut } = drawing.frame.axis
  return cut !== null && px > cut.fromPx - 6 && px < cut.toPx + 6
}
