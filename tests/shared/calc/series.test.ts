import { describe, expect, it } from 'vitest'
import { seriesFaults, type NamedSeries } from '../../../shared/calc/series/series-faults'
import {
  firstReaching,
  gapsOf,
  stretchesOf,
  valueAt,
  valueWithin,
  type Reading,
} from '../../../shared/calc/series/time-series'

const HOUR = 3600
/** Readings at hours. */
const at = (...readings: readonly (readonly [number, number | null])[]): Reading[] =>
  readings.map(([hour, value]) => ({ time: hour * HOUR, value }))

const tide = at([0, 3], [2, 3.4], [5, 3.1], [6, null], [7, 2.9], [8, 2.7], [11.5, 2.2], [12, 2.1])

describe('a series of readings', () => {
  it('is cut at an empty reading and at a step of more than three hours', () => {
    const hours = stretchesOf(tide).map((stretch) => stretch.map(({ time }) => time / HOUR))
    expect(hours).toEqual([
      [0, 2, 5],
      [7, 8],
      [11.5, 12],
    ])
    expect(gapsOf(tide).map(({ from, to }) => [from / HOUR, to / HOUR])).toEqual([
      [5, 7],
      [8, 11.5],
    ])
  })

  it('knows nothing at its ends where they are empty, and a reading alone is no stretch', () => {
    const ends = at([0, null], [1, null], [2, 3], [3, 3], [7, 4], [11, null])
    expect(stretchesOf(ends)).toHaveLength(1)
    expect(gapsOf(ends)).toEqual([
      { from: 0, to: 2 * HOUR },
      { from: 3 * HOUR, to: 11 * HOUR },
    ])
    expect(gapsOf([])).toEqual([])
    expect(stretchesOf([])).toEqual([])
  })

  it('is straight between two readings and unknown in a gap', () => {
    // By hand: 3.0 + 0.4/4 after half an hour of two.
    expect(valueAt(tide, 0.5 * HOUR)).toBeCloseTo(3.1, 12)
    expect(valueAt(tide, 2 * HOUR)).toBe(3.4)
    // Three hours are still a step.
    expect(valueAt(tide, 3.5 * HOUR)).toBeCloseTo(3.25, 12)
    expect(valueAt(tide, 8 * HOUR)).toBe(2.7)
    expect(valueAt(tide, 12 * HOUR)).toBe(2.1)
    for (const hour of [-1, 5.5, 6, 6.5, 9, 13]) expect(valueAt(tide, hour * HOUR)).toBeNull()
  })

  it('stays at its ends beyond them, where a stretch is asked', () => {
    const [first] = stretchesOf(tide)
    expect(valueWithin(first!, -HOUR)).toBe(3)
    expect(valueWithin(first!, 1 * HOUR)).toBeCloseTo(3.2, 12)
    expect(valueWithin(first!, 9 * HOUR)).toBe(3.1)
  })

  it('tells the moment at which a level is first reached', () => {
    const [first, second] = stretchesOf(tide)
    // By hand: a quarter of the way from 3.0 to 3.4 in two hours.
    expect(firstReaching(first!, 3.1)).toBeCloseTo(0.5 * HOUR, 9)
    expect(firstReaching(first!, 3.4)).toBe(2 * HOUR)
    expect(firstReaching(first!, 3)).toBe(0)
    expect(firstReaching(second!, 2.8)).toBe(7 * HOUR)
    expect(firstReaching(first!, 3.5)).toBeNull()
  })
})

describe('a series that cannot be used', () => {
  const range = { min: -10, max: 10, unit: 'm' }
  const faultsOf = (series: readonly Reading[], change: Partial<NamedSeries> = {}) =>
    seriesFaults({ series, path: 'levels', field: 'level', range, ...change })

  it('is none where moments rise and values are possible', () => {
    expect(faultsOf(tide)).toEqual([])
    expect(faultsOf(at([0, 1]), { fewest: 1 })).toEqual([])
  })

  it('is too short or too long', () => {
    expect(faultsOf(at([0, 1]))[0]).toMatchObject({ path: 'levels.length', value: 1 })
    const long = Array.from({ length: 100_001 }, (_, time) => ({ time, value: 1 }))
    expect(faultsOf(long)[0]).toMatchObject({ path: 'levels.length', value: 100_001 })
    expect(faultsOf(long.slice(1))).toEqual([])
  })

  it('has the same moment twice, one that goes back, or none', () => {
    const [twice, back] = faultsOf(at([0, 1], [1, 1], [1, 1], [0.5, 1]))
    expect(twice).toMatchObject({ path: 'levels[2].time', value: 3600 })
    expect(twice!.message).toContain('the same moment twice')
    expect(twice!.allowed).toBe('after the reading before it, by rising time (3600 s)')
    expect(back!.message).toContain('levels[3].time: 1800 is not allowed')
    const [nowhen] = faultsOf([{ time: Number.NaN, value: 1 }, ...at([1, 1])])
    expect(nowhen).toMatchObject({ path: 'levels[0].time', allowed: 'a moment' })
  })

  it('has values that cannot be, or none at all', () => {
    expect(faultsOf(at([0, 1], [1, 11]))).toMatchObject([{ path: 'levels[1].level', value: 11 }])
    const [empty] = faultsOf(at([0, null], [1, null]))
    expect(empty!.message).toContain('nothing but empty readings')
  })

  it('tells twenty faults one by one and counts the rest', () => {
    const many = faultsOf(at(...Array.from({ length: 26 }, (_, i) => [i, 99] as const)))
    expect(many).toHaveLength(21)
    expect(many.at(-1)).toMatchObject({ path: 'levels', value: 6 })
    expect(many.at(-1)!.message).toContain('6 further readings')
    expect(faultsOf(at(...Array.from({ length: 20 }, (_, i) => [i, 99] as const)))).toHaveLength(20)
  })
})
