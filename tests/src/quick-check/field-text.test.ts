import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import {
  fieldText,
  givenText,
  readTyped,
  shownBounds,
  shownText,
  stepped,
} from '../../../src/quick-check/field-text'

const plain = (text: string) => text.replaceAll('\u00a0', ' ')

describe('text in a field', () => {
  it('stays as it was typed while it stands', () => {
    expect(shownText(readTyped('0,420', 'length', 'metric'), 'length', 'metric')).toBe('0,420')
    expect(readTyped('0,420', 'length', 'metric').value).toBe(0.42)
    expect(readTyped('knee', 'length', 'metric')).toEqual({ typed: 'knee', value: undefined })
    expect(readTyped(' ', 'length', 'metric').value).toBeNull()
  })

  it('carries no digits of binary arithmetic', () => {
    expect(readTyped('15.3', 'pressure', 'metric').value).toBe(15_300)
    expect(fieldText(0.1 + 0.2, 'length', 'metric')).toBe('0.3')
  })

  it('brings a metric value back as it was', () => {
    fc.assert(
      fc.property(fc.integer({ min: -100_000, max: 100_000 }), (millimetres) => {
        const value = millimetres / 1000
        const text = fieldText(value, 'length', 'metric')
        expect(readTyped(text, 'length', 'metric').value).toBe(value)
      }),
    )
  })

  it.each([
    [0.42, 'length', '1.378'],
    [15_000, 'pressure', '313.3'],
    [12, 'temperature', '53.6'],
    [1e-5, 'permeability', '0.00003281'],
  ] as const)('shows %s of %s in US units as %s', (value, kind, text) => {
    expect(fieldText(value, kind, 'us')).toBe(text)
  })

  it.each([
    [0.7, '0.70 m'],
    [1, '1.00 m'],
    [2.2, '2.20 m'],
    [0.125, '0.125 m'],
    [10, '10 m'],
  ])('tells a given length of %s as %s', (value, text) => {
    expect(plain(givenText(value, 'length', 'metric'))).toBe(text)
  })

  it('rounds bounds inwards, so that a bound that is read can be typed', () => {
    const range = { min: 0.2, max: 1.05, unit: 'm' }
    expect(shownBounds(range, 'length', 'metric')).toEqual({ min: 0.2, max: 1.05 })
    const us = shownBounds(range, 'length', 'us')
    expect(us).toEqual({ min: 0.66, max: 3.44 })
    expect(shownBounds({ min: 0, max: Infinity, unit: 'N' }, 'force', 'us').max).toBe(Infinity)
  })

  it('steps by a hundredth, and leaves alone what cannot be stepped', () => {
    expect(stepped({ typed: null, value: 0.42 }, 1, 'length', 'metric')).toBe('0.43')
    expect(stepped({ typed: null, value: 15_000 }, -1, 'pressure', 'metric')).toBe('14.9')
    expect(stepped({ typed: null, value: 1e-5 }, 1, 'permeability', 'metric')).toBeNull()
    expect(stepped({ typed: 'knee', value: undefined }, 1, 'length', 'metric')).toBeNull()
  })
})
