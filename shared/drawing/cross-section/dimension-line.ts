import { boxAround } from '../label-placer'
import { segmentsPath } from '../path-data'
import type { Point } from '../scene'
import { addPath, type Composition } from './composition'

/** Half the length of the stroke that ends a dimension [px]. */
const TICK = 3.5

/** A dimension line with an oblique stroke at each end. */
export function dimensionLine(from: Point, to: Point): readonly (readonly [Point, Point])[] {
  const stroke = ({ x, y }: Point): readonly [Point, Point] => [
    { x: x - TICK, y: y + TICK },
    { x: x + TICK, y: y - TICK },
  ]
  return [[from, to], stroke(from), stroke(to)]
}

/** Shorter than this a dimension has no room for its strokes [px]. */
const SHORTEST = 3

/** Adds a dimension that labels keep clear of. */
export function addDimension(drawing: Composition, id: string, from: Point, to: Point): void {
  if (Math.hypot(to.x - from.x, to.y - from.y) < SHORTEST) return
  addPath(drawing, id, 'dimension', segmentsPath(dimensionLine(from, to)))
  drawing.placer.avoid(boxAround(from, to, 3))
}
