import { valueAt, type TimeSeries } from '../../calc/series/time-series'
import { eventSteps } from '../event/event-steps'
import { EVENT_BANDS, type BandSeries } from './line-event-input'

/** Water at a moment: what is expected and its band [m]; null in a gap. */
export interface WaterAtMoment {
  readonly time: number
  readonly low: number | null
  readonly expected: number | null
  readonly high: number | null
}

/** Every moment of an event, by rising time, with the water of all bands. */
export function eventTimes(water: BandSeries, step: number): readonly WaterAtMoment[] {
  return eventSteps(water.expected, step, -Infinity).flatMap(({ times }) =>
    [...times].map((time) => waterAt(water, time)),
  )
}

/** The water of all bands at a moment [s]. */
export function waterAt(water: BandSeries, time: number): WaterAtMoment {
  const [low, expected, high] = EVENT_BANDS.map((band) => valueAt(water[band], time))
  return { time, low: low!, expected: expected!, high: high! }
}

/** The moment at which the water is highest, the first where it stands; null: nothing is known. */
export function crestMoment(series: TimeSeries): { time: number; level: number } | null {
  return series.reduce<{ time: number; level: number } | null>((found, { time, value }) => {
    if (value === null || (found && found.level >= value)) return found
    return { time, level: value }
  }, null)
}
