import type { Reading } from '../calc/series/time-series'
import type { Forecast, ForecastCrest } from '../schemas/forecast'
import { newestObserved } from './observed-shift'
import { wholeSeries } from './whole-series'

type Levels = Pick<Forecast, 'readings' | 'observed'>

/**
 * Highest level from the newest observed one on: expected with its moment, low and high beside it.
 * The crests of a band may stand at other moments. `isReached` is false where the forecast ends
 * while it still rises.
 *
 * @returns null where nothing is known.
 */
export function forecastCrest(levels: Levels): ForecastCrest | null {
  const from = (newestObserved(levels.observed)?.time ?? -Infinity) / 1000
  const coming = wholeSeries(levels).filter(({ time }) => time >= from)
  const highest = highestOf(coming)
  if (!highest) return null
  const known = coming.filter(({ value }) => value !== null)
  const isAtEnd = highest.time === known[known.length - 1]!.time && known.length > 1
  const hasBand = levels.readings.some(({ low, high }) => low !== null || high !== null)
  const bandCrest = (band: 'low' | 'high') =>
    hasBand ? highestOf(wholeSeries(levels, band).filter(({ time }) => time >= from))!.value : null
  return {
    time: highest.time * 1000,
    expected: highest.value,
    low: bandCrest('low'),
    high: bandCrest('high'),
    isReached: !isAtEnd,
  }
}

/** The first of the highest readings. */
function highestOf(series: readonly Reading[]): { time: number; value: number } | null {
  let highest: { time: number; value: number } | null = null
  for (const { time, value } of series) {
    if (value !== null && (highest === null || value > highest.value)) highest = { time, value }
  }
  return highest
}
