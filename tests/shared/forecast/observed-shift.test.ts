import { describe, expect, it } from 'vitest'
import { gapsOf, valueAt } from '../../../shared/calc/series/time-series'
import { forecastCrest } from '../../../shared/forecast/crest'
import { addedToReading, stageAtGauge } from '../../../shared/forecast/gauge-level'
import { observedShift, shiftedReadings } from '../../../shared/forecast/observed-shift'
import { rateOfRiseAt } from '../../../shared/forecast/rate-of-rise'
import { wholeSeries } from '../../../shared/forecast/whole-series'

const HOUR = 3_600_000
const start = Date.UTC(2031, 2, 3, 22)
const reading = (hour: number, expected: number | null, margin = 0.12) => ({
  time: start + hour * HOUR,
  expected,
  low: expected === null ? null : expected - margin,
  high: expected === null ? null : expected + margin,
})
const seen = (hour: number, level: number | null) => ({ time: start + hour * HOUR, level })

const readings = [reading(0, 2.34), reading(1, 2.44), reading(2, 2.54), reading(3, 2.5)]

describe('an observed level', () => {
  it('shifts every later hour and the band by observed − forecast', () => {
    // Half an hour after the start the forecast is 2.39: 2.44 observed is 0.05 above it.
    const shift = observedShift(readings, [seen(0.5, 2.44)])
    expect(shift!.shift).toBeCloseTo(0.05, 12)
    const moved = shiftedReadings(readings, shift)
    expect(moved[0]).toEqual(readings[0])
    expect(moved[2]!.expected).toBeCloseTo(2.59, 12)
    expect(moved[2]!.low).toBeCloseTo(2.47, 12)
    expect(moved[2]!.high).toBeCloseTo(2.71, 12)
  })

  it('counts by the newest that is known', () => {
    const shift = observedShift(readings, [seen(0, 2.3), seen(1, 2.46), seen(1.5, null)])
    expect(shift).toEqual({ at: start + HOUR, shift: 2.46 - 2.44 })
  })

  it('shifts nothing where the forecast says nothing for its moment', () => {
    expect(observedShift(readings, [seen(-2, 2.1)])).toBeNull()
    expect(
      observedShift([reading(0, 2), reading(1, null), reading(2, 2)], [seen(1, 2.3)]),
    ).toBeNull()
    expect(observedShift(readings, [])).toBeNull()
  })

  it('goes over into the shifted forecast, and its gaps stay gaps', () => {
    const observed = [seen(-4, 2.1), seen(-3, null), seen(-2, 2.2), seen(0.5, 2.44)]
    const whole = wholeSeries({ readings, observed })
    expect(whole.map(({ time }) => time)).toEqual(
      [-4, -3, -2, 0.5, 1, 2, 3].map((hour) => (start + hour * HOUR) / 1000),
    )
    expect(whole[4]!.value).toBeCloseTo(2.49, 12)
    expect(gapsOf(whole)).toHaveLength(1)
    expect(valueAt(whole, (start - 3.5 * HOUR) / 1000)).toBeNull()
  })

  it('moves the crest', () => {
    const crest = forecastCrest({ readings, observed: [seen(0.5, 2.44)] })!
    expect(crest.time).toBe(start + 2 * HOUR)
    expect(crest.expected).toBeCloseTo(2.59, 12)
    expect(crest.high).toBeCloseTo(2.71, 12)
  })
})

describe('a crest', () => {
  it('is the first of the highest levels, and reached where the water falls after it', () => {
    const flat = [reading(0, 2), reading(1, 3), reading(2, 3), reading(3, 2)]
    const crest = forecastCrest({ readings: flat, observed: [] })!
    expect([crest.time, crest.isReached]).toEqual([start + HOUR, true])
  })

  it('is not reached where the forecast ends while the water still rises', () => {
    const rising = readings.slice(0, 3)
    expect(forecastCrest({ readings: rising, observed: [] })!.isReached).toBe(false)
  })

  it('has no band where the issue has none, and is not there without a level', () => {
    const bare = readings.map((row) => ({ ...row, low: null, high: null }))
    expect(forecastCrest({ readings: bare, observed: [] })).toMatchObject({ low: null, high: null })
    expect(forecastCrest({ readings: [reading(0, null)], observed: [] })).toBeNull()
  })

  it('is the observed level where the water only falls from there', () => {
    const crest = forecastCrest({ readings, observed: [seen(2.5, 2.9)] })!
    expect([crest.time, crest.expected]).toEqual([start + 2.5 * HOUR, 2.9])
  })
})

describe('a gauge', () => {
  // Zero 0.60, correction −0.04: a stage of 2.86 is 3.46 at the gauge and 3.42 at the line, by hand.
  const lock = { zero: 0.6, correction: -0.04 }

  it('makes a stage, or a level at the gauge, a level at the line', () => {
    expect(2.86 + addedToReading(lock, 'stage')).toBeCloseTo(3.42, 12)
    expect(3.46 + addedToReading(lock, 'gaugeLevel')).toBeCloseTo(3.42, 12)
    expect(3.42 + addedToReading(lock, 'siteLevel')).toBe(3.42)
  })

  it('shows a level at the line as its stage', () => {
    expect(stageAtGauge(lock, 3.42)).toBeCloseTo(2.86, 12)
  })
})

describe('the rate of rise at a level', () => {
  const series = [
    { time: 0, value: 2 },
    { time: 3600, value: 2.36 },
    { time: 7200, value: 2.2 },
    { time: 10_800, value: 2.92 },
    { time: 36_000, value: 3.5 },
  ]

  it('is the steepest of its rises through it', () => {
    expect(rateOfRiseAt(series, 2.3)).toBeCloseTo(0.72 / 3600, 12)
    expect(rateOfRiseAt(series, 2.1)).toBeCloseTo(0.36 / 3600, 12)
  })

  it('is none where the water does not come, nor across a gap', () => {
    expect(rateOfRiseAt(series, 4)).toBeNull()
    expect(rateOfRiseAt(series, 3.2)).toBeNull()
  })
})
