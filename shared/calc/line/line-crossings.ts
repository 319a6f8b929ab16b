import type { Station } from '../../schemas/line'

/** Two stretches between stations that cross, each by its first station. */
export interface LineCrossing {
  readonly first: number
  readonly second: number
}

interface Segment {
  readonly index: number
  readonly ax: number
  readonly ay: number
  readonly bx: number
  readonly by: number
  readonly left: number
  readonly right: number
}

/**
 * The first place at which a line crosses itself in the grid; null where it does not, or where x and y
 * are not known. Stretches that only touch at their ends are no crossing: a ring may close.
 */
export function lineCrossing(stations: readonly Station[]): LineCrossing | null {
  const segments = segmentsOf(stations).sort((a, b) => a.left - b.left)
  for (let i = 0; i < segments.length; i += 1) {
    const one = segments[i]!
    for (let k = i + 1; k < segments.length && segments[k]!.left <= one.right; k += 1) {
      const other = segments[k]!
      if (!doCross(one, other)) continue
      const [first, second] = [one.index, other.index].sort((a, b) => a - b)
      return { first: first!, second: second! }
    }
  }
  return null
}

function segmentsOf(stations: readonly Station[]): Segment[] {
  return stations.slice(1).flatMap((next, index) => {
    const { x: ax, y: ay } = stations[index]!
    const { x: bx, y: by } = next
    if (ax === null || ay === null || bx === null || by === null) return []
    return [{ index, ax, ay, bx, by, left: Math.min(ax, bx), right: Math.max(ax, bx) }]
  })
}

/** True where each segment has the ends of the other on both of its sides. */
function doCross(a: Segment, b: Segment): boolean {
  return (
    side(a, b.ax, b.ay) * side(a, b.bx, b.by) < 0 && side(b, a.ax, a.ay) * side(b, a.bx, a.by) < 0
  )
}

function side({ ax, ay, bx, by }: Segment, x: number, y: number): number {
  return Math.sign((bx - ax) * (y - ay) - (by - ay) * (x - ax))
}
