import { stretchesOf, type TimeSeries } from '../../calc/series/time-series'
import type { EventSettings } from '../../schemas/event-settings'
import type { ForecastBand } from '../../schemas/forecast'
import type { ScenarioContent } from '../../schemas/scenario'
import type { LineEventSettings } from './line-event-input'

/** Settings of a scenario that has none yet. */
export const NO_EVENT_SETTINGS: EventSettings = {
  asAt: null,
  groundBefore: 'soaked',
  filledAt: null,
  air: [],
}

/** Longest step of an event [s]: a quarter of an hour. */
const QUARTER = 900

/** Longest step that still shows a tide [s]. */
const LONGEST = 3 * 3600

/** Steps of one event at most: a thousand, where the readings are no closer. */
const MOST = 1000

/**
 * How a scenario is taken through its forecast: the air of its night in seconds and °C, its time to
 * clear, and steps of a quarter of an hour, or longer where that would be more than a thousand.
 *
 * @param water What is expected; moments in s.
 */
export function settingsOf(content: ScenarioContent, water: TimeSeries): LineEventSettings {
  const { groundBefore, filledAt, air } = content.event ?? NO_EVENT_SETTINGS
  const temperature = air.map(({ time, temperature: value }) => ({ time: time / 1000, value }))
  const [first] = temperature
  return {
    step: stepFor(water),
    timeToClear: content.timeToClear,
    groundBefore,
    air: first ? { filledAt: filledAt ?? first.value, temperature } : null,
    pond: null,
  }
}

function stepFor(water: TimeSeries): number {
  const span = stretchesOf(water).reduce(
    (sum, stretch) => sum + stretch[stretch.length - 1]!.time - stretch[0]!.time,
    0,
  )
  return Math.min(LONGEST, Math.max(QUARTER, Math.ceil(span / MOST)))
}

/** Every band of a forecast, read by one function. */
export function bandsFrom<Series>(read: (band: ForecastBand) => Series) {
  return { low: read('low'), expected: read('expected'), high: read('high') }
}
