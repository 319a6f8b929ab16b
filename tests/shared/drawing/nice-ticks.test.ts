import fc from 'fast-check'
import { expect, it } from 'vitest'
import {
  niceAbove,
  niceBelow,
  niceShownBelow,
  niceShownTicks,
  niceTicks,
} from '../../../shared/drawing/nice-ticks'
import { formatQuantity } from '../../../shared/units'

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

it('is a round figure in the units that are shown', () => {
  const shown = (value: number, system: 'metric' | 'us') =>
    formatQuantity({ value: niceShownBelow(value, 'pressure', system), kind: 'pressure' }, system)
  expect(shown(2345, 'metric')).toBe('2.0\u00a0kPa')
  expect(shown(2345, 'us')).toBe('20\u00a0psf')
  expect(niceShownBelow(2345, 'pressure', 'us')).toBeLessThan(2345)
})

it('marks an axis in feet at whole parts of a foot', () => {
  // 0.7 m are 2.297 ft; 1 ft is 0.3048 m (exact, NIST SP 811).
  const ticks = niceShownTicks(0.7, 5, 'length', 'us')
  expect(ticks).toHaveLength(5)
  ticks.forEach((tick, index) => expect(tick).toBeCloseTo(index * 0.5 * 0.3048, 12))
})
