import { stretchesOf, type TimeSeries } from '../calc/series/time-series'

/**
 * Rate at which the water rises through a level [m/s]: the steepest of its rises through it, straight
 * between readings.
 *
 * @param series moments in s, levels in m.
 * @returns null where it never rises through the level; nothing is read across a gap.
 */
export function rateOfRiseAt(series: TimeSeries, level: number): number | null {
  let steepest: number | null = null
  for (const stretch of stretchesOf(series)) {
    for (let i = 1; i < stretch.length; i += 1) {
      const [a, b] = [stretch[i - 1]!, stretch[i]!]
      if (!(a.value < level && b.value >= level)) continue
      const rate = (b.value - a.value) / (b.time - a.time)
      if (steepest === null || rate > steepest) steepest = rate
    }
  }
  return steepest
}
