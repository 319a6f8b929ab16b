import { describe, expect, it } from 'vitest'
import { markedCase } from '@/method/marked-case'

describe('the case that the design chart marks', () => {
  it('is that of the address, with the keys of the Quick check', () => {
    const { origin, present } = markedCase('v=1&depth=0.6&diameter=1&air=9810')
    expect(origin).toBe('address')
    expect(present!.ratio).toBeCloseTo(1, 10)
    expect(present!.depth).toBeCloseTo(0.6, 10)
  })

  it('is the one with which the Quick check opens, where the address carries none', () => {
    const opening = markedCase('')
    expect(opening.origin).toBe('default')
    expect(markedCase('v=1').present).toEqual(opening.present)
  })

  it.each([
    ['a figure out of range', 'v=1&depth=99'],
    ['an entry that the form refuses', 'v=1&depth=0.5&typed.friction=wet'],
    ['a key that means nothing', 'v=1&nonsense=1'],
    ['another version', 'v=9'],
  ])('is none for %s', (_why, search) => {
    expect(markedCase(search)).toEqual({ origin: 'refused', present: null })
  })
})
