import type { Station } from '../../schemas/line'

/** A point of the local grid [m]. */
export interface GridPoint {
  readonly x: number
  readonly y: number
}

/** A point of a line whose place in the grid is known. */
export interface LocatedPoint extends GridPoint {
  readonly chainage: number
}

/** Stations with x and y; fewer than two make no plan. */
export function locatedStations(stations: readonly Station[]): readonly LocatedPoint[] {
  return stations.flatMap(({ chainage, x, y }) =>
    x === null || y === null ? [] : [{ chainage, x, y }],
  )
}

/**
 * The place of a chainage in the grid, straight between stations that have one; at the ends the
 * nearest that has.
 *
 * @param path Two points or more, in order of chainage.
 */
export function pointAt(path: readonly LocatedPoint[], chainage: number): GridPoint {
  const first = path[0]!
  if (chainage <= first.chainage) return first
  for (let i = 1; i < path.length; i += 1) {
    const [a, b] = [path[i - 1]!, path[i]!]
    if (chainage > b.chainage) continue
    const share = (chainage - a.chainage) / (b.chainage - a.chainage)
    return { x: a.x + share * (b.x - a.x), y: a.y + share * (b.y - a.y) }
  }
  return path[path.length - 1]!
}

/** The stretch of a path between two chainages, with every located station in between. */
export function pathBetween(
  path: readonly LocatedPoint[],
  from: number,
  to: number,
): readonly LocatedPoint[] {
  const inside = path.filter(({ chainage }) => chainage > from && chainage < to)
  return [
    { chainage: from, ...pointAt(path, from) },
    ...inside,
    { chainage: to, ...pointAt(path, to) },
  ].map(({ chainage, x, y }) => ({ chainage, x, y }))
}

/** The chainage of a path that lies nearest to a point, and how far that is [m]. */
export function nearestOn(
  path: readonly LocatedPoint[],
  { x, y }: GridPoint,
): { readonly chainage: number; readonly distance: number } {
  let best = { chainage: path[0]!.chainage, distance: Infinity }
  for (let i = 1; i < path.length; i += 1) {
    const [a, b] = [path[i - 1]!, path[i]!]
    const [dx, dy] = [b.x - a.x, b.y - a.y]
    const square = dx * dx + dy * dy
    const along = square === 0 ? 0 : ((x - a.x) * dx + (y - a.y) * dy) / square
    const share = Math.min(1, Math.max(0, along))
    const distance = Math.hypot(a.x + share * dx - x, a.y + share * dy - y)
    if (distance < best.distance) {
      best = { chainage: a.chainage + share * (b.chainage - a.chainage), distance }
    }
  }
  return best
}

/**
 * A path moved to one side, positive to the left when walking up the chainage, which is the dry side.
 * At a vertex both directions are averaged, so that neighbours meet.
 */
export function offsetPath(path: readonly GridPoint[], offset: number): readonly GridPoint[] {
  return path.map((point, i) => {
    const before = normalOf(path[i - 1] ?? null, point)
    const after = normalOf(point, path[i + 1] ?? null)
    const normal = averaged(before, after)
    return { x: point.x + offset * normal.x, y: point.y + offset * normal.y }
  })
}

/** Unit vector to the left of a stretch; null where there is none. */
function normalOf(a: GridPoint | null, b: GridPoint | null): GridPoint | null {
  if (!a || !b) return null
  const length = Math.hypot(b.x - a.x, b.y - a.y)
  return length === 0 ? null : { x: -(b.y - a.y) / length, y: (b.x - a.x) / length }
}

function averaged(a: GridPoint | null, b: GridPoint | null): GridPoint {
  const [x, y] = [(a?.x ?? 0) + (b?.x ?? 0), (a?.y ?? 0) + (b?.y ?? 0)]
  const length = Math.hypot(x, y)
  // A line that turns back on itself has no side there.
  return length < 1e-9 ? { x: 0, y: 0 } : { x: x / length, y: y / length }
}
