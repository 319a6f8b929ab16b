import type { Station } from '../../schemas/line'

/** A change of direction at a station. */
export interface LineTurn {
  readonly chainage: number
  /** Turn, positive to the left when walking up the chainage [rad]. */
  readonly angle: number
}

/** Turns smaller than this are survey noise: 5° [rad]. */
export const SMALLEST_TURN = (5 * Math.PI) / 180

/**
 * Turns of a surveyed line of 5° and more. Stations without x and y give none.
 *
 * The water is on the right: a turn to the left turns away from the water and opens the skirt.
 */
export function lineTurns(stations: readonly Station[]): readonly LineTurn[] {
  return stations.slice(1, -1).flatMap((station, i) => {
    const before = direction(stations[i]!, station)
    const after = direction(station, stations[i + 2]!)
    if (before === null || after === null) return []
    const angle = wrap(after - before)
    return Math.abs(angle) >= SMALLEST_TURN ? [{ chainage: station.chainage, angle }] : []
  })
}

function direction(from: Station, to: Station): number | null {
  if (from.x === null || from.y === null || to.x === null || to.y === null) return null
  return Math.atan2(to.y - from.y, to.x - from.x)
}

/** An angle between −π and π. */
function wrap(angle: number): number {
  return angle - 2 * Math.PI * Math.round(angle / (2 * Math.PI))
}
