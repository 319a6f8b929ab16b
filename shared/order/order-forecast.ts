import { valueAt, type TimeSeries } from '../calc/series/time-series'
import { forecastCrest } from '../forecast/crest'
import { stageAtGauge } from '../forecast/gauge-level'
import { wholeSeries } from '../forecast/whole-series'
import type { Order } from '../schemas/order'
import type { OrderForecast, OrderGauge } from './order-input'

const HOUR = 3_600_000

/** Rounds look this far ahead at most [h]. */
const MOST_HOURS = 24

/** Hours after the crest that are still printed. */
const AFTER_CREST = 3

/** A level with what the gauge of the crew reads there. */
export function staged(level: number, gauge: OrderGauge | null) {
  return { level, stage: gauge ? stageAtGauge(gauge, level) : null }
}

/** The forecast issue in the figures that an order prints, its levels also as the crew reads them. */
export function orderForecast(
  resting: OrderForecast | null,
  gauge: OrderGauge | null,
): Order['forecast'] {
  if (!resting) return null
  const { forecast, band } = resting
  const crest = forecastCrest(forecast)
  const level = crest && (crest[band] ?? crest.expected)
  return {
    gauge: forecast.gauge.name,
    issuedAt: forecast.issuedAt,
    isSketch: forecast.origin === 'call',
    band,
    crest: level,
    crestAt: crest?.time ?? null,
    low: crest?.low ?? null,
    high: crest?.high ?? null,
    hours: hoursOf(wholeSeries(forecast, band), forecast.issuedAt, crest?.time ?? null).map(
      ({ at, level: expected }) => ({ at, ...staged(expected, gauge) }),
    ),
  }
}

function hoursOf(series: TimeSeries, from: number, crestAt: number | null) {
  const first = Math.ceil(from / HOUR)
  const last = crestAt === null ? first + MOST_HOURS : Math.ceil(crestAt / HOUR) + AFTER_CREST
  const count = Math.max(0, Math.min(MOST_HOURS, last - first + 1))
  return Array.from({ length: count }, (_, i) => (first + i) * HOUR).flatMap((at) => {
    const level = valueAt(series, at / 1000)
    return level === null ? [] : [{ at, level }]
  })
}
