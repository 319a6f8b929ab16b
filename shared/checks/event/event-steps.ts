import type { Stretch, TimeSeries } from '../../calc/series/time-series'
import { stretchesOf } from '../../calc/series/time-series'

/** Steps of one gap-free stretch. */
export interface StretchSteps {
  readonly stretch: Stretch
  /** Moments, rising; the first and the last are those of the stretch [s]. */
  readonly times: Float64Array
}

/**
 * Moments at which an event is computed: every reading, no more than a step between two of them, and
 * where the water comes to the ground or leaves it.
 *
 * @param step Longest step [s], above 0.
 */
export function eventSteps(
  water: TimeSeries,
  step: number,
  groundLevel: number,
): readonly StretchSteps[] {
  return stretchesOf(water).map((stretch) => ({
    stretch,
    times: timesOf(stretch, step, groundLevel),
  }))
}

/** Moments that an event would take, without listing them. */
export function countSteps(water: TimeSeries, step: number): number {
  return stretchesOf(water).reduce((sum, stretch) => {
    const span = stretch[stretch.length - 1]!.time - stretch[0]!.time
    return sum + stretch.length + span / step
  }, 0)
}

function timesOf(stretch: Stretch, step: number, groundLevel: number): Float64Array {
  const times = [stretch[0]!.time]
  for (let i = 1; i < stretch.length; i += 1) {
    const [a, b] = [stretch[i - 1]!, stretch[i]!]
    const pieces = Math.max(1, Math.ceil((b.time - a.time) / step - 1e-9))
    const between = Array.from(
      { length: pieces },
      (_, n) => a.time + ((n + 1) * (b.time - a.time)) / pieces,
    )
    between[pieces - 1] = b.time
    const share = (groundLevel - a.value) / (b.value - a.value)
    if (share > 0 && share < 1) insert(between, a.time + share * (b.time - a.time))
    times.push(...between)
  }
  return Float64Array.from(times)
}

function insert(times: number[], time: number): void {
  const at = times.findIndex((other) => other >= time)
  if (times[at] !== time) times.splice(at, 0, time)
}
