/** A value at a moment; null where there was none. */
export interface Reading {
  /** Moment [s since 1970-01-01 UTC, or since any one moment]. */
  readonly time: number
  readonly value: number | null
}

/** Readings by rising time; straight between two, except across a gap. */
export type TimeSeries = readonly Reading[]

/** A reading that is there. */
export interface KnownReading extends Reading {
  readonly value: number
}

/** Readings without a gap between them, two or more. */
export type Stretch = readonly KnownReading[]

/** Time from one moment to another [s]. */
export interface Span {
  readonly from: number
  readonly to: number
}

/** Readings further apart than this have a gap between them: 3 h [s]. */
export const LONGEST_STEP = 3 * 3600

/**
 * Cuts a series at its gaps: a null, or a step over 3 h. Within a gap nothing is known and nothing is
 * computed; a reading alone between two gaps is no stretch.
 */
export function stretchesOf(series: TimeSeries): readonly Stretch[] {
  const stretches: KnownReading[][] = [[]]
  for (const { time, value } of series) {
    const open = stretches[stretches.length - 1]!
    const before = open[open.length - 1]
    const isCut = value === null || (before !== undefined && time - before.time > LONGEST_STEP)
    if (isCut && open.length > 0) stretches.push([])
    if (value !== null) stretches[stretches.length - 1]!.push({ time, value })
  }
  return stretches.filter(({ length }) => length > 1)
}

/** Spans between the stretches of a series, and before and after them where its readings are null. */
export function gapsOf(series: TimeSeries): readonly Span[] {
  const stretches = stretchesOf(series)
  const [first, last] = [series[0], series[series.length - 1]]
  if (!first || !last) return []
  const ends = [first.time, ...stretches.map((stretch) => stretch[stretch.length - 1]!.time)]
  const starts = [...stretches.map((stretch) => stretch[0]!.time), last.time]
  return ends.map((from, i) => ({ from, to: starts[i]! })).filter(({ from, to }) => to > from)
}

/**
 * Value of a stretch at a moment, straight between its readings; before the first and after the last
 * one, that one.
 */
export function valueWithin(stretch: readonly KnownReading[], time: number): number {
  const after = firstAfter(stretch, time)
  if (after === 0) return stretch[0]!.value
  const a = stretch[after - 1]!
  const b = stretch[after]
  if (!b) return a.value
  return a.value + ((b.value - a.value) * (time - a.time)) / (b.time - a.time)
}

/** Value of a series at a moment; null outside it and in its gaps. */
export function valueAt(series: TimeSeries, time: number): number | null {
  const after = firstAfter(series, time)
  const a = series[after - 1]
  if (!a || a.value === null) return null
  if (a.time === time) return a.value
  const b = series[after]
  if (!b || b.value === null || b.time - a.time > LONGEST_STEP) return null
  return a.value + ((b.value - a.value) * (time - a.time)) / (b.time - a.time)
}

/** Index of the first reading after a moment; the length where there is none. */
function firstAfter(series: TimeSeries, time: number): number {
  let [low, high] = [0, series.length]
  while (low < high) {
    const middle = (low + high) >> 1
    if (series[middle]!.time <= time) low = middle + 1
    else high = middle
  }
  return low
}

/** First moment at which a stretch stands at or above a value, straight between readings; null: never. */
export function firstReaching(stretch: Stretch, value: number): number | null {
  for (let i = 0; i < stretch.length; i += 1) {
    const b = stretch[i]!
    if (b.value < value) continue
    const a = stretch[i - 1]
    if (!a) return b.time
    return a.time + ((value - a.value) / (b.value - a.value)) * (b.time - a.time)
  }
  return null
}
