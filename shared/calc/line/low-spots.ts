import type { Station } from '../../schemas/line'

/** A place of a line from which the ground rises to both sides. */
export interface LowSpot {
  readonly chainage: number
  readonly groundLevel: number
}

/** Hollows shallower than this are survey noise [m]. */
const LEAST_HOLLOW = 0.03

/**
 * Low spots of the ground in order of chainage: water comes there first, and stays there last. A level
 * hollow is named at its first station; the ends of a line are none.
 */
export function lowSpots(stations: readonly Station[]): readonly LowSpot[] {
  return stations.flatMap((station, i) => {
    const before = stations[i - 1]
    if (!before || before.groundLevel <= station.groundLevel) return []
    const isHollow =
      riseFrom(stations, i, -1) >= LEAST_HOLLOW && riseFrom(stations, i, 1) >= LEAST_HOLLOW
    return isHollow ? [{ chainage: station.chainage, groundLevel: station.groundLevel }] : []
  })
}

/** How far the ground rises from a station one way before it falls below it [m]. */
function riseFrom(stations: readonly Station[], start: number, step: 1 | -1): number {
  const { groundLevel } = stations[start]!
  let highest = groundLevel
  for (let i = start + step; i >= 0 && i < stations.length; i += step) {
    const next = stations[i]!.groundLevel
    if (next < groundLevel) break
    highest = Math.max(highest, next)
  }
  return highest - groundLevel
}
