import { locatedStations, nearestOn, type GridPoint } from '../../calc/line/line-path'
import type { Station } from '../../schemas/line'
import type { Point, View } from '../scene'

/** Which part of the grid a plan shows: what lies in its middle, and its scale. */
export interface PlanWindow {
  readonly centre: GridPoint
  /** Scale [px/m]. */
  readonly scale: number
}

/** Axes of a plan: the line runs down the page, so that the water lies on the left. */
export interface PlanFrame extends PlanWindow {
  readonly font: number
  readonly toPoint: (place: GridPoint) => Point
  readonly toGrid: (point: Point) => GridPoint
  /** Chainage nearest to a point of the drawing, and how far away the line is [px]. */
  readonly nearest: (point: Point) => { readonly chainage: number; readonly distance: number }
  /** Turn of the grid on the page: how far its y lies clockwise from upwards [rad]. */
  readonly turn: number
}

/** Scales between which a plan can be zoomed, in shares of the one that shows all of it. */
export const ZOOM_RANGE = { least: 0.5, most: 60 } as const

/** Room around the line for words [px]. */
const MARGIN = 46

interface FrameInput {
  readonly view: View
  readonly stations: readonly Station[]
  /** Other lines that should be seen as well. */
  readonly others?: readonly (readonly Station[])[]
  /** Null: all of the line. */
  readonly window: PlanWindow | null
}

/** Fixes turn, scale and place of a plan. The stations need two places in the grid or more. */
export function planFrame({ view, stations, others = [], window }: FrameInput): PlanFrame {
  const path = locatedStations(stations)
  const along = directionOf(path[0]!, path[path.length - 1]!)
  const right = { x: -along.y, y: along.x }
  const all = [...path, ...others.flatMap(locatedStations)]
  const { centre, scale } = window ?? fitted(all, { along, right, view })
  const toPoint = ({ x, y }: GridPoint): Point => {
    const [dx, dy] = [x - centre.x, y - centre.y]
    return {
      x: view.width / 2 + scale * (dx * right.x + dy * right.y),
      y: view.height / 2 + scale * (dx * along.x + dy * along.y),
    }
  }
  const toGrid = (point: Point): GridPoint => {
    const a = (point.x - view.width / 2) / scale
    const b = (point.y - view.height / 2) / scale
    return {
      x: centre.x + a * right.x + b * along.x,
      y: centre.y + a * right.y + b * along.y,
    }
  }
  return {
    centre,
    scale,
    font: view.width >= 520 ? 12.5 : 11.5,
    toPoint,
    toGrid,
    nearest: (point) => {
      const { chainage, distance } = nearestOn(path, toGrid(point))
      return { chainage, distance: distance * scale }
    },
    turn: Math.atan2(right.y, -along.y),
  }
}

/** True where x and y of two stations or more are known, at two different places. */
export function hasPlan(stations: readonly Station[]): boolean {
  const [first, ...rest] = locatedStations(stations)
  return first !== undefined && rest.some(({ x, y }) => Math.hypot(x - first.x, y - first.y) > 0.01)
}

function directionOf(first: GridPoint, last: GridPoint): GridPoint {
  const [dx, dy] = [last.x - first.x, last.y - first.y]
  const length = Math.hypot(dx, dy)
  // A ring ends where it begins: its grid stays upright.
  return length < 1e-9 ? { x: 0, y: -1 } : { x: dx / length, y: dy / length }
}

interface Axes {
  readonly along: GridPoint
  readonly right: GridPoint
  readonly view: View
}

function fitted(points: readonly GridPoint[], { along, right, view }: Axes): PlanWindow {
  const across = points.map(({ x, y }) => x * right.x + y * right.y)
  const down = points.map(({ x, y }) => x * along.x + y * along.y)
  const [left, top] = [Math.min(...across), Math.min(...down)]
  const [width, height] = [Math.max(...across) - left, Math.max(...down) - top]
  const scale = Math.min(
    Math.max(20, view.width - 2 * MARGIN) / Math.max(width, 1),
    Math.max(20, view.height - 2 * MARGIN) / Math.max(height, 1),
  )
  const a = left + width / 2
  const b = top + height / 2
  return {
    centre: { x: a * right.x + b * along.x, y: a * right.y + b * along.y },
    scale,
  }
}
