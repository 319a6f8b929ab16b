import { valueAt } from '../calc/series/time-series'
import type { ForecastReading, ObservedReading, ObservedShift } from '../schemas/forecast'
import { bandSeries } from './forecast-series'

/** The newest observed level that is known; undefined: there is none. */
export function newestObserved(
  observed: readonly ObservedReading[],
): { readonly time: number; readonly level: number } | undefined {
  for (let i = observed.length - 1; i >= 0; i -= 1) {
    const { time, level } = observed[i]!
    if (level !== null) return { time, level }
  }
  return undefined
}

/**
 * How far the newest observed level lies above the forecast for its moment: every later hour, and
 * the band, moves by as much.
 *
 * @param readings by rising time, levels in m, moments in ms since 1970.
 * @returns null where nothing is observed, or the forecast says nothing for that moment.
 * @see Method page, "Event": observed − forecast.
 */
export function observedShift(
  readings: readonly ForecastReading[],
  observed: readonly ObservedReading[],
): ObservedShift | null {
  const newest = newestObserved(observed)
  if (!newest) return null
  const forecast = valueAt(bandSeries(readings, 'expected'), newest.time / 1000)
  return forecast === null ? null : { at: newest.time, shift: newest.level - forecast }
}

/** The hours after the observed level, moved with it; earlier hours stay as they were issued. */
export function shiftedReadings(
  readings: readonly ForecastReading[],
  shift: ObservedShift | null,
): readonly ForecastReading[] {
  if (!shift) return readings
  const moved = (level: number | null) => (level === null ? null : level + shift.shift)
  return readings.map((reading) => {
    if (reading.time <= shift.at) return reading
    const { time, expected, low, high } = reading
    return { time, expected: moved(expected), low: moved(low), high: moved(high) }
  })
}
