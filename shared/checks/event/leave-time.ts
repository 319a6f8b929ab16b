import { firstReaching, valueWithin, type Stretch } from '../../calc/series/time-series'
import { leaveLevel, type LeaveState } from '../leave-level'

/** How far below the level that matters the rise is looked at [m]. Common practice, no source. */
const LAST_RISE = 0.1

/** What a leave time rests on. */
export interface LeaveTimeInput {
  readonly stretches: readonly Stretch[]
  readonly groundLevel: number
  /** Depths from and to which all checks hold [m]; `from` null: nothing holds. */
  readonly holdsFrom: number | null
  readonly holdsTo: number
  readonly timeToClear: number
}

/** When everybody leaves. */
export interface LeaveTime {
  readonly state: LeaveState
  /** Level at which everybody leaves [m]; null where nothing holds. */
  readonly level: number | null
  /** What it lies below the level that holds [m]. */
  readonly margin: number
  /** First moment at which the water reaches it [s]; null: it does not, or there is no leave level. */
  readonly time: number | null
}

/**
 * Leave level from the rise of this very water, and the moment at which it gets there. The rise is
 * the largest within the time to clear the area, as the water passes the last 0.10 m below the level
 * that holds, or below the crest where the crest is lower.
 */
export function leaveTime(input: LeaveTimeInput): LeaveTime {
  const { stretches, groundLevel, holdsFrom, holdsTo, timeToClear } = input
  const crest = highestOf(stretches)
  const reference = Math.min(groundLevel + holdsTo, crest)
  const rise = riseBelow(stretches, reference, timeToClear)
  const { depth, margin, state } = leaveLevel({
    holdsToDepth: holdsFrom === null ? 0 : holdsTo,
    holdsFrom,
    depth: Math.max(0, crest - groundLevel),
    rateOfRise: timeToClear > 0 ? rise / timeToClear : null,
    timeToClear,
  })
  if (depth === null) return { state, level: null, margin, time: null }
  const level = groundLevel + depth
  const times = stretches.flatMap((stretch) => firstReaching(stretch, level) ?? [])
  return { state, level, margin, time: times[0] ?? null }
}

function highestOf(stretches: readonly Stretch[]): number {
  let highest = -Infinity
  for (const stretch of stretches) {
    for (const { value } of stretch) highest = Math.max(highest, value)
  }
  return highest
}

/** Largest rise within a time that ends on the last 0.10 m below a level [m]; 0 where it only falls. */
function riseBelow(stretches: readonly Stretch[], level: number, within: number): number {
  let largest = 0
  for (const stretch of stretches) {
    const [first, last] = [stretch[0]!, stretch[stretch.length - 1]!]
    const ends = stretch.flatMap(({ time }) => [time, time + within])
    for (const end of [...ends, ...crossingsOf(stretch, level)]) {
      if (end <= first.time || end > last.time) continue
      const value = valueWithin(stretch, end)
      if (value > level + 1e-9 || value < level - LAST_RISE) continue
      const start = Math.max(first.time, end - within)
      const rise = value - valueWithin(stretch, start)
      largest = Math.max(largest, (rise * within) / (end - start))
    }
  }
  return largest
}

/** Moments at which a stretch rises through a level. */
function crossingsOf(stretch: Stretch, level: number): readonly number[] {
  return stretch.slice(1).flatMap((b, i) => {
    const a = stretch[i]!
    if (!(a.value < level && b.value >= level)) return []
    return [a.time + ((level - a.value) / (b.value - a.value)) * (b.time - a.time)]
  })
}
