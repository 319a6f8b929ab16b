import { describeRange, isInRange, rangeFault, type AllowedRange, type Fault } from '../../errors'
import type { TimeSeries } from './time-series'

/** Faults that are told one by one; the rest is counted. */
const MOST_TOLD = 20

/** Most readings of one series. */
export const MOST_READINGS = 100_000

/** A series, and how its faults name it. */
export interface NamedSeries {
  readonly series: TimeSeries
  /** Where the readings stand in the case, for example `water.readings`. */
  readonly path: string
  /** Name of the value in a reading, for example `level`. */
  readonly field: string
  /** What the value may be. */
  readonly range: AllowedRange
  /** Fewest readings; 2 if left out. */
  readonly fewest?: number
}

/**
 * Everything that makes a series unusable: too few or too many readings, a time that does not come
 * after the one before it, a value outside what the quantity may be. At most 20 faults are told one
 * by one.
 */
export function seriesFaults({
  series,
  path,
  field,
  range,
  fewest = 2,
}: NamedSeries): readonly Fault[] {
  const count = { min: fewest, max: MOST_READINGS, unit: 'readings' }
  if (!isInRange(series.length, count)) return [rangeFault(`${path}.length`, series.length, count)]
  const faults: Fault[] = []
  let untold = 0
  const tell = (fault: () => Fault): void => {
    if (faults.length < MOST_TOLD) faults.push(fault())
    else untold += 1
  }
  series.forEach(({ time, value }, i) => {
    const before = series[i - 1]?.time
    if (!Number.isFinite(time) || (before !== undefined && !(time > before))) {
      tell(() => lateFault(`${path}[${i}].time`, time, before))
    }
    if (value !== null && !isInRange(value, range)) {
      tell(() => rangeFault(`${path}[${i}].${field}`, value, range))
    }
  })
  if (!series.some(({ value }) => value !== null)) {
    tell(() => noneFault(path, field, range))
  }
  return untold === 0 ? faults : [...faults, moreFault(path, untold)]
}

/** Twice the same moment, or one that goes backwards. */
function lateFault(path: string, time: number, before: number | undefined): Fault {
  const allowed =
    before === undefined ? 'a moment' : `after the reading before it, by rising time (${before} s)`
  const what = time === before ? 'the same moment twice' : String(time)
  const message = `${path}: ${what} is not allowed; it must be ${allowed}`
  return { path, value: time, allowed, unit: 's', message }
}

function noneFault(path: string, field: string, range: AllowedRange): Fault {
  const allowed = `one reading or more with a ${field}, ${describeRange(range)}`
  const message = `${path}: nothing but empty readings is not allowed; it must be ${allowed}`
  return { path, value: null, allowed, unit: range.unit, message }
}

function moreFault(path: string, count: number): Fault {
  const allowed = 'as the readings above'
  const message = `${path}: ${count} further readings are not allowed; they must be ${allowed}`
  return { path, value: count, allowed, unit: '–', message }
}
