import { describe, expect, it } from 'vitest'
import { waterArrival } from '../../../shared/deployment/water-arrival'

const HOUR = 3600
const series = (...levels: readonly (readonly [hour: number, level: number | null])[]) =>
  levels.map(([hour, value]) => ({ time: hour * HOUR, value }))

describe('the hour at which the water comes', () => {
  const rising = series([0, 2], [1, 2.5], [2, 3.5])

  it('is straight between readings', () => {
    expect(waterArrival(rising, 3)).toBeCloseTo(1.5 * HOUR, 6)
    expect(waterArrival(rising, 2.5)).toBeCloseTo(1 * HOUR, 6)
  })

  it('is not within a series that stays below', () => {
    expect(waterArrival(rising, 3.6)).toBeNull()
    expect(waterArrival([], 3)).toBeNull()
  })

  it('is the moment that is asked for where the water stands there already', () => {
    expect(waterArrival(rising, 2.2, 1.2 * HOUR)).toBe(1.2 * HOUR)
    expect(waterArrival(rising, 1.5)).toBe(0)
  })

  it('leaves aside what fell again before', () => {
    const twice = series([0, 2], [1, 3.2], [2, 2], [3, 3.2])
    expect(waterArrival(twice, 3, 1.9 * HOUR)).toBeCloseTo((2 + 1 / 1.2) * HOUR, 6)
  })

  it('is the beginning of a gap at whose end the water stands there', () => {
    expect(waterArrival(series([0, 2], [1, null], [2, 3.5]), 3)).toBe(0)
    expect(waterArrival(series([0, 2], [4, 3.5]), 3)).toBe(0)
    expect(waterArrival(series([0, 2], [4, 3.5]), 3, 2 * HOUR)).toBe(2 * HOUR)
  })
})
