import { traceAt } from '@shared/checks/line-event/line-at-moment'
import type { WaterAtMoment } from '@shared/checks/line-event/event-times'
import type { SectionThroughTime } from '@shared/checks/line-event/line-event-answer'
import { LONGEST_STEP } from '@shared/calc/series/time-series'

/** What the charts show of one moment; null: nothing is known, or nothing acts. */
export interface ChartRow extends WaterAtMoment {
  readonly depth: number | null
  readonly sliding: number | null
  readonly skirt: number | null
  readonly freeboard: number | null
}

/** Factors above this say no more than that nothing is near. */
export const HIGHEST_FACTOR = 5

/** One row for each moment of a section, and an empty one in each gap. */
export function chartRows(
  { shown }: SectionThroughTime,
  times: readonly WaterAtMoment[],
): readonly ChartRow[] {
  return times.flatMap((water, i) => {
    const before = times[i - 1]
    const moment = shown ? traceAt(shown.trace, water.time) : null
    const isWet = moment !== null && moment.depth > 0
    const row: ChartRow = {
      ...water,
      depth: moment?.depth ?? null,
      sliding: isWet ? moment.sliding : null,
      skirt: isWet ? moment.skirt : null,
      freeboard: moment?.freeboard ?? null,
    }
    const isAfterGap = before !== undefined && water.time - before.time > LONGEST_STEP
    return isAfterGap ? [emptyRow((before.time + water.time) / 2), row] : [row]
  })
}

function emptyRow(time: number): ChartRow {
  const nothing = { low: null, expected: null, high: null, depth: null }
  return { time, ...nothing, sliding: null, skirt: null, freeboard: null }
}

/** Points of one column; what is above the bound is left out. */
export function pointsOf(
  rows: readonly ChartRow[],
  read: (row: ChartRow) => number | null,
  bound = Infinity,
): { x: number; y: number | null }[] {
  return rows.map((row) => {
    const y = read(row)
    return { x: row.time, y: y === null || y > bound ? null : y }
  })
}
