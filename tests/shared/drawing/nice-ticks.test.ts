import fc from 'fast-check'
import { expect, it } from 'vitest'
import { niceAbove, niceBelow, niceTicks } from '../../../shared/drawing/nice-ticks'

it.each([
  [0.7, 0.5],
  [1, 1],
  [1.99, 1],
  [2, 2],
  [4.9, 2],
  [5, 5],
  [0.05, 0.05],
  [0.02, 0.02],
  [730, 500],
])('rounds %s down to %s', (value, nice) => {
  expect(niceBelow(value)).toBeCloseTo(nice, 12)
})

it('rounds up and down to neighbours around every value', () => {
  fc.assert(
    fc.property(fc.double({ min: 1e-6, max: 1e9, noNaN: true }), (value) => {
      const [below, above] = [niceBelow(value), niceAbove(value)]
      expect(below).toBeLessThanOrEqual(value * (1 + 1e-9))
      expect(above).toBeGreaterThanOrEqual(value * (1 - 1e-9))
      expect(above / below).toBeLessThanOrEqual(2.5 + 1e-9)
    }),
  )
})

it('marks an axis evenly from nothing to its end', () => {
  expect(niceTicks(0.7, 4)).toEqual([0, 0.2, 0.4, 0.6])
  expect(niceTicks(3.75, 4)).toEqual([0, 1, 2, 3])
  expect(niceTicks(1, 10)).toHaveLength(11)
  expect(niceTicks(0, 5)).toEqual([0])
})
