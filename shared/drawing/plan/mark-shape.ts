import type { MarkKind } from '../../schemas/mark'
import { areaPath, circlePath } from '../path-data'
import type { Point } from '../scene'

/** Half the size of a mark [px]. */
const HALF = 6

/** The shape of a kind of mark around a point, to be filled; every kind has its own. */
export function markShape(kind: MarkKind, { x, y }: Point): string {
  if (kind === 'well') return disc(x, y, HALF) + hole(x, y, HALF / 2)
  if (kind === 'gully') return box(x, y, HALF, HALF) + hole(x, y, HALF / 2.4)
  if (kind === 'pipe' || kind === 'outfall') return disc(x, y, HALF)
  if (kind === 'gate') return box(x - 4, y, 2, HALF) + box(x + 4, y, 2, HALF)
  if (kind === 'kerb') return box(x, y, HALF + 2, 2)
  if (kind === 'turn') return areaPath([at(x, y, 0, -7), at(x, y, 7, 6), at(x, y, -7, 6)])
  if (kind === 'pump') {
    return areaPath([at(x, y, 0, -8), at(x, y, 8, 0), at(x, y, 0, 8), at(x, y, -8, 0)])
  }
  return box(x, y, HALF, 2) + box(x, y, 2, HALF)
}

function at(x: number, y: number, dx: number, dy: number): Point {
  return { x: x + dx, y: y + dy }
}

function disc(cx: number, cy: number, r: number): string {
  return circlePath({ kind: 'circle', id: '', role: 'staff', cx, cy, r })
}

/** The other way round, so that it is left out of what lies around it. */
function hole(x: number, y: number, half: number): string {
  return areaPath([
    at(x, y, -half, -half),
    at(x, y, -half, half),
    at(x, y, half, half),
    at(x, y, half, -half),
  ])
}

function box(x: number, y: number, w: number, h: number): string {
  return areaPath([at(x, y, -w, -h), at(x, y, w, -h), at(x, y, w, h), at(x, y, -w, h)])
}
