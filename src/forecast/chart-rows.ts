import { LONGEST_STEP, type TimeSeries } from '@shared/calc/series/time-series'
import { newestObserved } from '@shared/forecast/observed-shift'
import { wholeSeries } from '@shared/forecast/whole-series'
import type { Forecast } from '@shared/schemas/forecast'

/** One moment of chart and table. */
export interface ChartRow {
  /** ms since 1970 */
  readonly time: number
  readonly isObserved: boolean
  readonly level: number | null
  readonly low: number | null
  readonly high: number | null
}

type Levels = Pick<Forecast, 'readings' | 'observed'>

/** What chart and table show: observed levels, then the forecast as they shift it. */
export function chartRows(levels: Levels): readonly ChartRow[] {
  const seenUntil = newestObserved(levels.observed)?.time ?? -Infinity
  const expected = wholeSeries(levels)
  const [low, high] = [wholeSeries(levels, 'low'), wholeSeries(levels, 'high')]
  const banded = new Set(
    levels.readings.filter((row) => row.low !== null || row.high !== null).map(({ time }) => time),
  )
  return expected.map(({ time, value }, i) => {
    const moment = time * 1000
    const hasBand = moment > seenUntil && banded.has(moment)
    return {
      time: moment,
      isObserved: moment <= seenUntil,
      level: value,
      low: hasBand ? low[i]!.value : null,
      high: hasBand ? high[i]!.value : null,
    }
  })
}

/** A point of a curve; y null lifts the pen. */
export interface ChartPoint {
  readonly x: number
  readonly y: number | null
}

/** A series as points of a curve, broken at its gaps. */
export function curveOf(series: TimeSeries): readonly ChartPoint[] {
  return series.flatMap(({ time, value }, i): ChartPoint[] => {
    const before = series[i - 1]
    const point = { x: time * 1000, y: value }
    const isCut = before !== undefined && time - before.time > LONGEST_STEP
    return isCut ? [{ x: before.time * 1000 + 1, y: null }, point] : [point]
  })
}

/** Curves of a chart: what was observed, and the forecast that goes on from it. */
export function curvesOf(rows: readonly ChartRow[]) {
  const firstAhead = rows.findIndex(({ isObserved }) => !isObserved)
  const seen = firstAhead < 0 ? rows : rows.slice(0, firstAhead)
  // The forecast begins where the observed levels end, so that there is no hole between them.
  const ahead = firstAhead < 0 ? [] : rows.slice(Math.max(0, firstAhead - 1))
  const series = (of: readonly ChartRow[], pick: (row: ChartRow) => number | null) =>
    curveOf(of.map((row) => ({ time: row.time / 1000, value: pick(row) })))
  return {
    observed: series(seen, ({ level }) => level),
    expected: series(ahead, ({ level }) => level),
    low: series(ahead, ({ low }) => low),
    high: series(ahead, ({ high }) => high),
  }
}

const HOUR = 3_600_000

/** Distance of the marks on the axis of time [ms]: whole parts of a day. */
export function tickStep(from: number, to: number, most: number): number {
  const steps = [1, 2, 3, 6, 12, 24, 48, 168].map((hours) => hours * HOUR)
  return steps.find((step) => (to - from) / step <= most) ?? 336 * HOUR
}

/** Marks at multiples of a step, as the clock of a time zone shows them; offset in ms. */
export function timeTicks(from: number, to: number, step: number, offset: number): number[] {
  const first = Math.ceil((from + offset) / step) * step - offset
  const count = Math.max(0, Math.floor((to - first) / step) + 1)
  return Array.from({ length: count }, (_, i) => first + i * step)
}
