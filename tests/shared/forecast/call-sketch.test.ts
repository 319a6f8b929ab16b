import { describe, expect, it } from 'vitest'
import { gapsOf, stretchesOf, valueAt } from '../../../shared/calc/series/time-series'
import { OutOfRangeError } from '../../../shared/errors'
import { sketchedReadings } from '../../../shared/forecast/call-sketch'
import { bandSeries } from '../../../shared/forecast/forecast-series'
import type { ForecastCall } from '../../../shared/schemas/forecast'

const HOUR = 3_600_000
const at = Date.UTC(2031, 2, 3, 22)

/** 2.34 m now, 3.42 m nine hours later, ±0.12, 12 h above 2.79 m. */
const call: ForecastCall = {
  levelNow: 2.34,
  at,
  crest: 3.42,
  margin: 0.12,
  crestAt: at + 9 * HOUR,
  hoursAbove: 12,
  lowestGround: 2.79,
}

const seriesOf = (change: Partial<ForecastCall> = {}) =>
  bandSeries(sketchedReadings({ ...call, ...change }), 'expected')

/** Time for which a series stands above a level [h], straight between its readings. */
function hoursAbove(series: ReturnType<typeof seriesOf>, level: number): number {
  const [stretch] = stretchesOf(series)
  return stretch!.slice(1).reduce((sum, b, i) => {
    const a = stretch![i]!
    const [low, high] = [Math.min(a.value, b.value), Math.max(a.value, b.value)]
    const share = high === low ? Number(low > level) : (high - level) / (high - low)
    return sum + (Math.min(1, Math.max(0, share)) * (b.time - a.time)) / 3600
  }, 0)
}

describe('a sketch from a call', () => {
  it('goes from the level now to the crest on half a cosine', () => {
    const series = seriesOf()
    const level = (hours: number) => valueAt(series, (at + hours * HOUR) / 1000)
    // (1 − cos πs)/2 is 0, 1/4, 1/2, 3/4 and 1 at s = 0, 1/3, 1/2, 2/3 and 1: cos 60° = 1/2.
    expect(level(0)).toBe(2.34)
    expect(level(3)).toBeCloseTo(2.34 + 1.08 / 4, 9)
    expect(level(4.5)).toBeCloseTo(2.34 + 1.08 / 2, 9)
    expect(level(6)).toBeCloseTo(2.34 + (1.08 * 3) / 4, 9)
    expect(level(9)).toBeCloseTo(3.42, 12)
  })

  it('stands above the lowest ground for the hours given', () => {
    expect(hoursAbove(seriesOf(), 2.79)).toBeCloseTo(12, 6)
    expect(hoursAbove(seriesOf({ hoursAbove: 30 }), 2.79)).toBeCloseTo(30, 6)
  })

  it('is a plain mirror where no hours are given', () => {
    const series = seriesOf({ hoursAbove: null })
    for (const hours of [1, 4, 8]) {
      const before = valueAt(series, (at + (9 - hours) * HOUR) / 1000)!
      expect(valueAt(series, (at + (9 + hours) * HOUR) / 1000)).toBeCloseTo(before, 9)
    }
  })

  it('ends at the ground where the water stands above it already', () => {
    const series = seriesOf({ lowestGround: 2.2, hoursAbove: 20 })
    expect(series.at(-1)).toEqual({ time: (at + 20 * HOUR) / 1000, value: 2.2 })
    expect(hoursAbove(series, 2.2)).toBeCloseTo(20, 9)
  })

  it('carries the margin on both sides, and no band without one', () => {
    for (const { expected, low, high } of sketchedReadings(call)) {
      expect(high! - expected!).toBeCloseTo(0.12, 12)
      expect(expected! - low!).toBeCloseTo(0.12, 12)
    }
    const bare = sketchedReadings({ ...call, margin: null })
    expect(bare.every(({ low, high }) => low === null && high === null)).toBe(true)
  })

  it('goes by quarters of an hour, without a gap, by rising time', () => {
    const series = seriesOf()
    expect(gapsOf(series)).toEqual([])
    expect(series.slice(1).every(({ time }, i) => time > series[i]!.time)).toBe(true)
    expect(series.slice(1).every(({ time }, i) => time - series[i]!.time <= 900)).toBe(true)
  })

  it.each([
    ['a crest below the level now', { crest: 2.3 }, 'call.crest'],
    ['a crest before now', { crestAt: at - HOUR }, 'call.crestAt'],
    ['a crest in a month', { crestAt: at + 720 * HOUR }, 'call.crestAt'],
    ['fewer hours above than the rise alone', { hoursAbove: 3 }, 'call.hoursAbove'],
    ['hours above ground that stays dry', { lowestGround: 3.5 }, 'call.hoursAbove'],
    ['hours above a ground that is not given', { lowestGround: null }, 'call.hoursAbove'],
    ['a margin in centimetres', { margin: 120 }, 'call.margin'],
    ['an empty field', { levelNow: Number.NaN }, 'call.levelNow'],
  ])('refuses %s', (_case, change, path) => {
    try {
      sketchedReadings({ ...call, ...change })
      expect.unreachable()
    } catch (error) {
      expect(error).toBeInstanceOf(OutOfRangeError)
      expect((error as OutOfRangeError).faults.map((fault) => fault.path)).toContain(path)
    }
  })
})
