import type { KnownReading, TimeSeries } from '../../calc/series/time-series'

/** So far below the water the pond stays, so that rounding never turns the thrust around [m]. */
const BELOW = 1e-9

/**
 * Water that stands on the dry side at one level, through an event: it is not there before the flood
 * stands as high, and goes with it. Method: a thrust towards the water is not covered.
 *
 * @param dryLevel Level of the scenario [m].
 */
export function standingPond(water: TimeSeries, dryLevel: number): readonly KnownReading[] {
  const known = water.flatMap(({ time, value }) => (value === null ? [] : [{ time, value }]))
  return known.flatMap((b, i) => {
    const at = { time: b.time, value: Math.min(b.value - BELOW, dryLevel) }
    const a = known[i - 1]
    if (!a || a.value < dryLevel === b.value < dryLevel || a.value === b.value) return [at]
    const share = (dryLevel - a.value) / (b.value - a.value)
    const time = a.time + share * (b.time - a.time)
    const isInside = time > a.time && time < b.time
    return isInside ? [{ time, value: dryLevel - BELOW }, at] : [at]
  })
}
