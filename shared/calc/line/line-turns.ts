import type { Station } from '../../schemas/line'
import type { LineMark } from '../../schemas/mark'

/** A change of direction at a station. */
export interface LineTurn {
  readonly chainage: number
  /** Turn, positive to the left when walking up the chainage [rad]. */
  readonly angle: number
}

/** Turns smaller than this are survey noise: 5° [rad]. */
export const SMALLEST_TURN = (5 * Math.PI) / 180

/** Chainages closer than this are one place [m]. */
const SAME_PLACE = 1e-6

/**
 * Turns of a surveyed line of 5° and more, in order of chainage. Where x and y tell the direction they
 * count; elsewhere the marks of turns do.
 *
 * The water is on the right: a turn to the left turns away from the water and opens the skirt.
 *
 * @param marks Marks of the line, in any order.
 */
export function lineTurns(
  stations: readonly Station[],
  marks: readonly LineMark[] = [],
): readonly LineTurn[] {
  const surveyed = stations.slice(1, -1).flatMap((station, i) => {
    const before = direction(stations[i]!, station)
    const after = direction(station, stations[i + 2]!)
    if (before === null || after === null) return []
    return [{ chainage: station.chainage, angle: wrap(after - before) }]
  })
  const marked = marks.flatMap(({ kind, chainage, angle }) =>
    kind === 'turn' && angle !== null && !isDirectionKnown(stations, chainage)
      ? [{ chainage, angle }]
      : [],
  )
  const turns = [...surveyed, ...marked].filter(({ angle }) => Math.abs(angle) >= SMALLEST_TURN)
  return marked.length === 0 ? turns : turns.sort((a, b) => a.chainage - b.chainage)
}

/** True where x and y of the stations around a chainage say which way the line goes there. */
export function isDirectionKnown(stations: readonly Station[], chainage: number): boolean {
  const before = stations.filter((station) => station.chainage < chainage - SAME_PLACE).at(-1)
  const here = stations.find((station) => Math.abs(station.chainage - chainage) <= SAME_PLACE)
  const after = stations.find((station) => station.chainage > chainage + SAME_PLACE)
  if (!before || !after) return true
  if (!here) return direction(before, after) !== null
  return direction(before, here) !== null && direction(here, after) !== null
}

function direction(from: Station, to: Station): number | null {
  if (from.x === null || from.y === null || to.x === null || to.y === null) return null
  return Math.atan2(to.y - from.y, to.x - from.x)
}

/** An angle between −π and π. */
function wrap(angle: number): number {
  return angle - 2 * Math.PI * Math.round(angle / (2 * Math.PI))
}
