import { EVENT_BANDS } from '../../../shared/checks/line-event/line-event-input'
import { forecastCrest } from '../../../shared/forecast/crest'
import type { Forecast, ForecastListItem } from '../../../shared/schemas/forecast'
import { flood } from '../../support/flood'

/** The first midnight of the flood: Monday, 3 March 2031 [s]. */
export const MIDNIGHT = Date.UTC(2031, 2, 3) / 1000

const HOUR = 3_600_000
const START = MIDNIGHT * 1000

/** The forecast issued at 21:45, its flood cut into readings. */
export function forecast(change: Partial<Forecast> = {}): Forecast {
  const bands = flood(MIDNIGHT)
  const readings = bands.expected.map(({ time }, i) => {
    const [low, expected, high] = EVENT_BANDS.map((band) => bands[band][i]!.value)
    return { time: time * 1000, low: low!, expected: expected!, high: high! }
  })
  return {
    id: 'f',
    gaugeId: 'g',
    origin: 'typed',
    issuedAt: START + 21.75 * HOUR,
    note: '',
    call: null,
    gauge: { name: 'Lock', zero: 0.6, correction: -0.04 },
    readings,
    observed: [],
    shift: null,
    crest: forecastCrest({ readings, observed: [] }),
    createdAt: START + 22 * HOUR,
    createdBy: { id: 'account-1', name: 'Engineer' },
    ...change,
  }
}

export function forecastRow(change: Partial<Forecast> = {}): ForecastListItem {
  const { readings, observed, call: _c, gauge: _g, ...row } = forecast(change)
  return { ...row, readingCount: readings.length, observedCount: observed.length }
}

/** What a scenario keeps of the forecast that it rests on. */
export const RESTING = {
  gaugeId: 'g',
  forecastId: 'f',
  issuedAt: START + 21.75 * HOUR,
  band: 'expected',
  shiftedAt: null,
} as const
