import type { ForecastReading, ObservedReading } from '@shared/schemas/forecast'
import { LONGEST_STEP } from '@shared/calc/series/time-series'
import { FOOT } from '@shared/units'

/** Units in which levels of a file may be. */
export const LEVEL_UNITS = ['m', 'cm', 'mm', 'ft'] as const
export type LevelUnit = (typeof LEVEL_UNITS)[number]

const IN_METRES: Readonly<Record<LevelUnit, number>> = { m: 1, cm: 0.01, mm: 0.001, ft: FOOT }

/** A level in metres, to a hundredth of a millimetre. */
export function inMetres(value: number, unit: LevelUnit): number {
  return Number((value * IN_METRES[unit]).toFixed(5))
}

/** What a column or a series of a file is. */
export const LEVEL_ROLES = ['expected', 'low', 'high', 'observed'] as const
export type LevelRole = (typeof LEVEL_ROLES)[number]

/** Levels of one moment, as far as the file has them. */
export interface LevelRow extends Readonly<Partial<Record<LevelRole, number | null>>> {
  /** ms since 1970 */
  readonly time: number
}

export interface FileReadings {
  readonly readings: readonly ForecastReading[]
  readonly observed: readonly ObservedReading[]
}

/** What looks odd in readings, and may be right. */
export interface ReadingsWarning {
  readonly kind: 'gap' | 'rising'
  /** Gaps, where there are some. */
  readonly count: number
}

/**
 * Rows by rising time as forecast and observed levels. A row with neither an expected level nor an
 * observed one is a gap of the forecast, where the file has one, else of what was observed.
 */
export function readingsOf(rows: readonly LevelRow[], roles: readonly LevelRole[]): FileReadings {
  const seen = roles.includes('observed')
  const foreseen = roles.includes('expected')
  const observed = seen ? withoutEdges(rows, 'observed') : []
  const ahead = foreseen ? withoutEdges(rows, 'expected') : []
  return {
    observed: observed.map(({ time, observed: level = null }) => ({ time, level })),
    readings: ahead.map(({ time, expected = null, low = null, high = null }) => ({
      ...{ time, expected, low, high },
    })),
  }
}

/** Rows from the first to the last that has a level of a role: one table may hold both series. */
function withoutEdges(rows: readonly LevelRow[], role: LevelRole): readonly LevelRow[] {
  const has = (row: LevelRow) => (row[role] ?? null) !== null
  const first = rows.findIndex(has)
  const last = rows.findLastIndex(has)
  return first < 0 ? [] : rows.slice(first, last + 1)
}

/** Gaps within, and a forecast that ends while it still rises. */
export function readingsWarnings({ readings }: FileReadings): readonly ReadingsWarning[] {
  const gaps = readings.filter(({ time, expected }, i) => {
    const before = readings[i - 1]
    if (!before) return false
    const isFirstNull = expected === null && before.expected !== null
    return isFirstNull || time - before.time > LONGEST_STEP * 1000
  }).length
  const known = readings.flatMap(({ expected }) => expected ?? [])
  const last = known[known.length - 1]
  const isRising = known.length > 1 && known.slice(0, -1).every((level) => level < last!)
  return [
    ...(gaps > 0 ? [{ kind: 'gap' as const, count: gaps }] : []),
    ...(isRising ? [{ kind: 'rising' as const, count: 0 }] : []),
  ]
}
