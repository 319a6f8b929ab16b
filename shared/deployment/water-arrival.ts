import { LONGEST_STEP, valueAt, type TimeSeries } from '../calc/series/time-series'

/**
 * When the water stands at or above a ground level for the first time, straight between readings.
 * Nothing is known in a gap: where the water stands above the ground at its end and did not at its
 * beginning, it may have come at once, so that the beginning counts.
 *
 * @param series Levels by rising time [m, s].
 * @param ground Lowest ground of a section [m], in the datum of the levels.
 * @param from Moment from which on the water counts [s]; what fell again before it does not.
 * @returns Seconds since 1970; null where the water does not come within the series.
 */
export function waterArrival(series: TimeSeries, ground: number, from = -Infinity): number | null {
  const there = valueAt(series, from)
  if (there !== null && there >= ground) return from
  let known: { readonly time: number; readonly value: number } | null = null
  let isCut = false
  for (const { time, value } of series) {
    if (value === null) {
      isCut = true
      continue
    }
    if (time >= from && value >= ground) {
      if (!known) return time
      const isAcross = isCut || time - known.time > LONGEST_STEP || known.value >= ground
      return Math.max(from, isAcross ? known.time : crossing(known, { time, value }, ground))
    }
    known = { time, value }
    isCut = false
  }
  return null
}

interface Level {
  readonly time: number
  readonly value: number
}

function crossing(a: Level, b: Level, ground: number): number {
  return a.time + ((ground - a.value) / (b.value - a.value)) * (b.time - a.time)
}
