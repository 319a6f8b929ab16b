import type { ForecastReading, ObservedReading } from '../../shared/schemas/forecast'

const HOUR = 3_600_000

/** Midnight before the flood, 3 March 2031. Ferry Quay keeps UTC. */
const MIDNIGHT = Date.UTC(2031, 2, 3)

/** Forecast issue that the scenarios of Ferry Quay rest on. */
export const LOCK_ISSUE = {
  id: 'demo-forecast-lock-2145',
  issuedAt: MIDNIGHT + 21.75 * HOUR,
} as const

/** The event's own "now", 22:00, by which it is told what must start when. */
export const FERRY_QUAY_NOW = MIDNIGHT + 22 * HOUR

/** Hours since midnight, and level in QD [m]. */
type Knot = readonly [hour: number, level: number]

const OBSERVED: readonly Knot[] = [
  [0, 1.62],
  [6, 1.7],
  [12, 1.86],
  [15, 1.98],
  [18, 2.12],
  [20, 2.22],
  [21, 2.28],
  [22, 2.34],
]

const FORECAST: readonly Knot[] = [
  [22, 2.34],
  [23, 2.43],
  [24, 2.54],
  [25, 2.68],
  [26, 2.84],
  [27, 3.0],
  [28, 3.16],
  [29, 3.29],
  [30, 3.38],
  [30.5, 3.41],
  [31, 3.42],
  [31.5, 3.42],
  [32, 3.4],
  [33, 3.34],
  [34, 3.25],
  [36, 3.06],
  [38, 2.9],
  [40, 2.76],
  [42, 2.63],
  [46, 2.43],
  [52, 2.2],
  [60, 1.98],
  [72, 1.8],
]

/** The gauge sent nothing from 13:00 to 14:30. */
const SILENT = { from: 13, to: 14.5 }

/** From 01:00 on the forecast has a band of ±0.12 m. */
const BAND = { from: 25, margin: 0.12 }

const toMillimetre = (level: number): number => Number(level.toFixed(3))

/** Half-hourly levels, straight between the knots. */
function halfHourly(knots: readonly Knot[]): readonly Knot[] {
  return knots.slice(0, -1).flatMap(([from, level], i) => {
    const [to, next] = knots[i + 1]!
    const steps = Math.round((to - from) * 2)
    const last = i === knots.length - 2 ? steps : steps - 1
    return Array.from({ length: last + 1 }, (_, step): Knot => {
      const share = step / steps
      return [from + step / 2, toMillimetre(level + (next - level) * share)]
    })
  })
}

/** What the gauge showed until 22:00, as levels at Ferry Quay. */
export const FERRY_QUAY_OBSERVED: readonly ObservedReading[] = halfHourly(OBSERVED).map(
  ([hour, level]) => ({
    time: MIDNIGHT + hour * HOUR,
    level: hour >= SILENT.from && hour <= SILENT.to ? null : level,
  }),
)

/** The forecast of 21:45, as levels at Ferry Quay. */
export const FERRY_QUAY_READINGS: readonly ForecastReading[] = halfHourly(FORECAST).map(
  ([hour, expected]) => {
    const { from, margin } = BAND
    const hasBand = hour >= from
    return {
      time: MIDNIGHT + hour * HOUR,
      expected,
      low: hasBand ? toMillimetre(expected - margin) : null,
      high: hasBand ? toMillimetre(expected + margin) : null,
    }
  },
)
