import { expect, it } from 'vitest'
import { alignedFigures } from '../../../src/line/aligned-figures'

it('puts the points of a column under each other and leaves all else alone', () => {
  expect(alignedFigures(['44.7', '−1.71', '0', ''])).toEqual(['44.70', '−1.71', '0.00', ''])
  expect(alignedFigures(['10', '20'])).toEqual(['10', '20'])
  expect(alignedFigures(['1e-7', '2.5'])).toEqual(['1e-7', '2.5'])
})
