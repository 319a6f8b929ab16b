import { describe, expect, it } from 'vitest'
import { parseNumber } from '../../../src/quick-check/parse-number'

describe('parseNumber', () => {
  it.each([
    ['0.42', 0.42],
    ['0,42', 0.42],
    [' 3 ', 3],
    ['.5', 0.5],
    ['5.', 5],
    ['-0.04', -0.04],
    ['−0,04', -0.04],
    ['+2', 2],
    ['1e-5', 1e-5],
    ['1E3', 1000],
    ['1e309', Infinity],
  ])('reads %s', (typed, value) => {
    expect(parseNumber(typed)).toEqual({ is: 'number', value })
  })

  it.each(['', '   '])('takes "%s" as empty', (typed) => {
    expect(parseNumber(typed)).toEqual({ is: 'empty' })
  })

  it.each(['NaN', 'Infinity', '0.42 m', '1,234.5', '1.234,5', '0x10', '1 000', '--1', 'e5', '-'])(
    'refuses %s',
    (typed) => {
      expect(parseNumber(typed)).toEqual({ is: 'text' })
    },
  )
})
