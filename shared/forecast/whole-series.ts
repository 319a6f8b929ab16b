import type { TimeSeries } from '../calc/series/time-series'
import type { Forecast, ForecastBand } from '../schemas/forecast'
import { bandSeries } from './forecast-series'
import { newestObserved, observedShift, shiftedReadings } from './observed-shift'

/**
 * The water through time as it is now known: what was observed, and from the newest observed level on
 * the forecast, shifted with it. Moments in seconds since 1970, levels in m in the datum of the line.
 * A gap in what was observed stays one: the forecast of those hours does not fill it.
 */
export function wholeSeries(
  { readings, observed }: Pick<Forecast, 'readings' | 'observed'>,
  band: ForecastBand = 'expected',
): TimeSeries {
  const newest = newestObserved(observed)
  if (!newest) return bandSeries(readings, band)
  const seen = observed
    .filter(({ time }) => time <= newest.time)
    .map(({ time, level }) => ({ time: time / 1000, value: level }))
  const moved = shiftedReadings(readings, observedShift(readings, observed))
  return [...seen, ...bandSeries(moved, band).filter(({ time }) => time > newest.time / 1000)]
}
