import type { TimeSeries } from '../calc/series/time-series'
import type { ForecastBand, ForecastReading } from '../schemas/forecast'

/**
 * One band of the forecast as a series, moments in seconds. Where an issue gives no low or high level
 * the expected one stands in; where there is no expected one there is a gap.
 */
export function bandSeries(readings: readonly ForecastReading[], band: ForecastBand): TimeSeries {
  return readings.map((reading) => ({
    time: reading.time / 1000,
    value: reading.expected === null ? null : (reading[band] ?? reading.expected),
  }))
}
